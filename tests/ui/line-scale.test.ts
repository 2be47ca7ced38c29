import fc from "fast-check";
import { expect, test } from "vitest";
import { lineScale, type Extent } from "@/components/line/line-scale";

const laid = (lengthM: number | null): Extent => ({ lengthM, symbolPx: 0 });
const symbol = (symbolPx: number): Extent => ({ symbolPx });

test("pieces long enough to be seen are drawn in proportion and fill the line from end to end", () => {
  const { places, totalM } = lineScale([laid(10), symbol(7), laid(30)], 100, 1300);
  expect(totalM).toBe(40);
  expect(places[0]).toEqual({ fromX: 100, toX: 400, isBroken: false });
  expect(places[2]).toEqual({ fromX: 400, toX: 1300, isBroken: false });
});

test("a piece narrower than 20 px is widened to 20 px, says so, and the rest stays in proportion", () => {
  const { places } = lineScale([laid(0.1), laid(40), laid(20)], 0, 1220);
  expect(places[0]).toEqual({ fromX: 0, toX: 20, isBroken: true });
  expect(places[1]?.toX).toBeCloseTo(820, 9);
  expect(places.slice(1).every(({ isBroken }) => !isBroken)).toBe(true);
});

test("a joint stands centred on the boundary it joins, and at an end it stays inside the line", () => {
  const { places } = lineScale([symbol(8), laid(10), symbol(8), laid(10)], 0, 400);
  expect(places[0]).toMatchObject({ fromX: 0, toX: 8 });
  expect(places[2]).toMatchObject({ fromX: 196, toX: 204 });
});

test("neighbours without length stand side by side, none over another", () => {
  const { places } = lineScale([laid(10), symbol(7), symbol(14), symbol(7), laid(10)], 0, 400);
  const [, first, second, third] = places;
  expect(second?.fromX).toBeGreaterThanOrEqual(first?.toX ?? Infinity);
  expect(third?.fromX).toBeGreaterThanOrEqual(second?.toX ?? Infinity);
});

test("a wide part takes room of its own: distances before it end where it begins, distances behind it start where it ends", () => {
  const scale = lineScale([laid(10), symbol(60), laid(10)], 0, 460);
  expect(scale.xBefore(10)).toBe(200);
  expect(scale.x(10)).toBe(260);
});

test("a piece of unknown length keeps room and adds no metres", () => {
  const scale = lineScale([laid(20), laid(null)], 0, 510);
  expect(scale.totalM).toBe(20);
  expect(scale.places[1]?.toX).toBe(510);
  expect((scale.places[1]?.toX ?? 0) - (scale.places[1]?.fromX ?? 0)).toBe(110);
});

const anyExtent = fc.oneof(
  fc.double({ min: 0, max: 1e5, noNaN: true }).map(laid),
  fc.constant(laid(null)),
  fc.integer({ min: 5, max: 62 }).map(symbol),
);

test("whatever the pieces are, none runs backwards or leaves the line, and those with room fill it", () => {
  fc.assert(
    fc.property(fc.array(anyExtent, { minLength: 1, maxLength: 60 }), (extents) => {
      const { places } = lineScale(extents, 68, 1302);
      for (const { fromX, toX } of places) {
        expect(toX).toBeGreaterThanOrEqual(fromX);
        expect(Number.isFinite(fromX) && Number.isFinite(toX)).toBe(true);
      }
      const laidPlaces = places.filter((_, i) => extents[i]?.lengthM !== undefined);
      if (laidPlaces.length > 0 && extents.every((e) => e.lengthM !== undefined)) {
        expect(laidPlaces[0]?.fromX).toBe(68);
        expect(laidPlaces.at(-1)?.toX).toBeCloseTo(1302, 6);
      }
    }),
  );
});

test("going from a distance to the screen and back leads to the same distance", () => {
  const scale = lineScale([laid(3), laid(0.01), laid(50), laid(7)], 68, 1302);
  for (const m of [0, 1.5, 3, 3.005, 20, 53.01, 60]) expect(scale.m(scale.x(m))).toBeCloseTo(m, 9);
});
