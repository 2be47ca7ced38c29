import { expect, test } from "vitest";
import { percentileCurves } from "@/lib/line/order-statistics";
import fc from "@/tests/support/property";

/** Definition 7 the plain way: sort, then between neighbours. */
function sorted(values: readonly number[], share: number): number {
  const order = [...values].sort((a, b) => a - b);
  const rank = share * (order.length - 1);
  const [low, high] = [order[Math.floor(rank)]!, order[Math.ceil(rank)]!];
  return low === high ? low : low + (rank - Math.floor(rank)) * (high - low);
}

test("one to five give the shares that a table of definition 7 gives", () => {
  const { min, p05, median, p95, max } = percentileCurves(Float64Array.of(5, 2, 3, 1, 4), 1);
  expect([min[0], p05[0], median[0], p95[0], max[0]]).toEqual([1, 1.2, 3, 4.8, 5]);
});

test("every share is that of sorting, whatever the values, ties and infinities among them", () => {
  const value = fc.oneof(
    fc.integer({ min: -3, max: 3 }),
    fc.double({ noNaN: true, min: -1e3, max: 1e3 }),
    fc.constant(Infinity),
  );
  fc.assert(
    fc.property(
      fc.integer({ min: 1, max: 12 }),
      fc.integer({ min: 1, max: 60 }),
      fc.infiniteStream(value),
      (width, curves, stream) => {
        const values = Float64Array.from({ length: width * curves }, () => stream.next().value);
        const found = percentileCurves(values, width);
        for (let k = 0; k < width; k++) {
          const column = Array.from({ length: curves }, (_, n) => values[n * width + k]!);
          for (const [name, share] of [
            ["min", 0],
            ["p05", 0.05],
            ["median", 0.5],
            ["p95", 0.95],
            ["max", 1],
          ] as const)
            expect(found[name][k] === sorted(column, share), `${name} of ${column.join()}`).toBe(true);
        }
      },
    ),
  );
});

test("the same holds for many curves, whose ranks are looked for in buckets, and for a few far away", () => {
  const value = fc.oneof(
    { weight: 9, arbitrary: fc.double({ min: 0, max: 1, noNaN: true }) },
    { weight: 1, arbitrary: fc.constantFrom(0.5, -1e6, 1e6) },
  );
  fc.assert(
    fc.property(fc.array(value, { minLength: 256, maxLength: 700 }), (column) => {
      const found = percentileCurves(Float64Array.from(column), 1);
      for (const [name, share] of [
        ["p05", 0.05],
        ["median", 0.5],
        ["p95", 0.95],
      ] as const)
        expect(found[name][0] === sorted(column, share), `${name} of ${column.length}`).toBe(true);
    }),
  );
});

test("a point at which one curve is not defined has no shares, and leaves its neighbours alone", () => {
  const { min, median } = percentileCurves(Float64Array.of(1, NaN, 3, 4), 2);
  expect([min[0], median[0]]).toEqual([1, 2]);
  expect(min[1]).toBeNaN();
  expect(median[1]).toBeNaN();
});
