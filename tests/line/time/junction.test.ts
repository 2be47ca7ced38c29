import { describe, expect, test } from "vitest";
import { scatter, type Junction, type Link } from "@/lib/line/time/junction";
import fc from "@/tests/support/property";

const between = (min: number, max: number) => fc.double({ min, max, noNaN: true });
const plain = (links: Link[], left: Junction["left"], right: Junction["right"]): Junction => ({
  place: "here",
  left,
  links,
  right,
});
const series = (ohm: number): Link => ({ kind: "matrix", a: 1, b: ohm, c: 0, d: 1 });
const shunt = (ohm: number): Link => ({ kind: "matrix", a: 1, b: 0, c: 1 / ohm, d: 1 });
const node: Link = { kind: "node", name: "here" };
const voltOn = (of: ReturnType<typeof scatter>, end: number) => of.waves.find((wave) => wave.end === end)!.volt;

describe("known junctions", () => {
  test.each([
    [50, 75, 0.2, 1.2],
    [75, 50, -0.2, 0.8],
    [50, 50, 0, 1],
  ])("a line of %d Ω into one of %d Ω reflects %d and lets %d through", (z1, z2, back, on) => {
    const of = scatter(plain([node], { ends: [1] }, { ends: [2] }), (end) => (end === 1 ? z1 : z2), 1);
    expect(voltOn(of, 1)).toBeCloseTo(back, 12);
    expect(voltOn(of, 2)).toBeCloseTo(on, 12);
    expect(of.nodes).toEqual([{ name: "here", volt: expect.closeTo(on, 12) as number }]);
  });

  test("ends: an open one doubles, a short turns over, a resistor does (R − Z)/(R + Z)", () => {
    const against = (v: number, i: number) =>
      voltOn(
        scatter(plain([], { ends: [1] }, { v, i }), () => 50, 1),
        1,
      );
    expect(against(1, 0)).toBeCloseTo(1, 12);
    expect(against(0, 1)).toBeCloseTo(-1, 12);
    expect(against(150, 1)).toBeCloseTo(0.5, 12);
  });

  test("a tap of the line's own impedance takes a third", () => {
    const of = scatter(plain([node, { kind: "shuntLine", end: 4 }], { ends: [1] }, { ends: [2] }), () => 120, 1);
    expect(of.nodes[0]!.volt).toBeCloseTo(2 / 3, 12);
    expect([voltOn(of, 1), voltOn(of, 2), voltOn(of, 4)]).toEqual(
      [-1 / 3, 2 / 3, 2 / 3].map((v) => expect.closeTo(v, 12)),
    );
  });

  test("a stub in the line shares the voltage with what follows", () => {
    const of = scatter(plain([{ kind: "seriesLine", end: 4 }], { ends: [1] }, { ends: [2] }), () => 50, 1);
    expect([voltOn(of, 1), voltOn(of, 2), voltOn(of, 4)]).toEqual(
      [1 / 3, 2 / 3, 2 / 3].map((v) => expect.closeTo(v, 12)),
    );
  });

  test("a source divides its e.m.f. with the line, one without resistance gives it all", () => {
    const launched = (v: number) =>
      voltOn(
        scatter(plain([], { v, i: 1, isDriven: true }, { ends: [0] }), () => 50, "source"),
        0,
      );
    expect(launched(150)).toBeCloseTo(0.25, 12);
    expect(launched(0)).toBeCloseTo(1, 12);
    const open = scatter(plain([node], { v: 1, i: 0, isDriven: true }, { ends: [0] }), () => 50, "source");
    expect(open.nodes[0]!.volt).toBeCloseTo(0, 12);
  });

  test("a transformer turns 200 Ω into 50 Ω", () => {
    const half: Link = { kind: "matrix", a: 0.5, b: 0, c: 0, d: 2 };
    const of = scatter(plain([half], { ends: [1] }, { ends: [2] }), (end) => (end === 1 ? 50 : 200), 1);
    expect(voltOn(of, 1)).toBeCloseTo(0, 12);
    expect(voltOn(of, 2)).toBeCloseTo(2, 12);
  });

  test("a short across a source without resistance leaves no voltage", () => {
    const of = scatter(plain([node], { v: 0, i: 1, isDriven: true }, { v: 0, i: 1 }), () => 50, "source");
    expect(of.nodes[0]!.volt).toBe(0);
  });
});

test("no junction gives out more power than comes in, and one without resistors gives out all", () => {
  const resistor = fc.oneof(between(1, 500).map(series), between(1, 500).map(shunt));
  const lossless = fc.oneof(
    between(0.2, 5).map((n): Link => ({ kind: "matrix", a: n, b: 0, c: 0, d: 1 / n })),
    fc.constant<Link>({ kind: "shuntLine", end: 6 }),
    fc.constant<Link>({ kind: "seriesLine", end: 8 }),
  );
  const z = fc.array(between(10, 300), { minLength: 10, maxLength: 10 });
  fc.assert(
    fc.property(
      fc.uniqueArray(lossless, { selector: (l) => JSON.stringify(l) }),
      fc.array(resistor),
      z,
      (free, lossy, z) => {
        const impedance = (end: number) => z[end]!;
        for (const links of [free, [...free, ...lossy]]) {
          const junction = plain(links, { ends: [1, 3] }, { ends: [2, 4] });
          for (const from of [1, 2, 3, 4]) {
            const of = scatter(junction, impedance, from);
            const out = of.waves.reduce((sum, wave) => sum + wave.volt ** 2 / impedance(wave.end), 0);
            const into = 1 / impedance(from);
            if (links === free) expect(out / into).toBeCloseTo(1, 9);
            else expect(out / into).toBeLessThanOrEqual(1 + 1e-9);
          }
        }
      },
    ),
  );
});
