import { describe, expect, test } from "vitest";
import { modelFromNominal } from "@/lib/line/cable";
import type { Circuit, Element, Termination } from "@/lib/line/element";
import type { Drive } from "@/lib/line/time/drive";
import { lattice, mostFronts } from "@/lib/line/time/lattice";
import { settledLevels } from "@/lib/line/time/settled";
import { timeResponse } from "@/lib/line/time/time-response";
import fc from "@/tests/support/property";
import { number, published } from "@/tests/support/published";
import { closeTo } from "@/tests/support/tolerance";

const ohm = (reOhm: number): Termination => ({ kind: "constant", reOhm, imOhm: 0 });
/** 5 ns/m */
const model = (z0: number) => modelFromNominal({ z0, velocityFactor: 1 / (5e-9 * 299_792_458) });
const cable = (z0: number, lengthM: number): Element => ({ kind: "cable", line: { model: model(z0) }, lengthM });
const stub = (z0: number, lengthM: number, end: "open" | "short" | Termination): Element => ({
  kind: "stub",
  connection: "shunt",
  end,
  line: { model: model(z0) },
  lengthM,
});
const run = (elements: Element[], load: Termination, source: Termination): Circuit => ({ source, elements, load });
const step: Drive = { kind: "step", amplitudeV: 1, riseS: 1e-9 };
const sumAt = (fronts: { node: string; amplitudeV: number; timeS: number }[], node: string, until = Infinity) =>
  fronts.reduce((sum, front) => (front.node === node && front.timeS <= until ? sum + front.amplitudeV : sum), 0);

describe("one line", () => {
  test("10 Ω into an open 50 Ω line peaks at 5/3 and then stands at 5/9", () => {
    const [check] = published((id) => id === "D105-open-line-ringing", "published-steps");
    const { fronts } = lattice(run([cable(50, 10)], { kind: "open" }, ohm(10)), step, 320e-9);
    expect(sumAt(fronts, "load", 60e-9)).toBeCloseTo(number(check!.expected, "first_peak_V"), 6);
    expect(sumAt(fronts, "load", 160e-9)).toBeCloseTo(number(check!.expected, "second_level_V"), 6);
  });

  test("a printed lattice of a pulse on 75 Ω between 25 and 100 Ω has our currents", () => {
    const [check] = published((id) => id === "D102-sadiku-11.9", "published-steps");
    const { inputs, expected, tolerance } = check!;
    const line: Element = {
      kind: "cable",
      line: { model: modelFromNominal({ z0: 75, velocityFactor: 0.5 }) },
      lengthM: 2e-6 * 0.5 * 299_792_458,
    };
    const pulse: Drive = { kind: "pulse", amplitudeV: number(inputs, "Vg_V"), riseS: 1e-9, widthS: 5e-6 };
    const { fronts } = lattice(run([line], ohm(100), ohm(25)), pulse, 14e-6);
    const emf = (t: number) => (t < 5e-6 - 1e-12 ? 4 : 0);
    const soon = 1e-9;
    (expected.t_us_send as number[]).forEach((t, k) => {
      const volt = sumAt(fronts, "source", t * 1e-6 + soon);
      const milliamp = ((emf(t * 1e-6) - volt) / 25) * 1e3;
      expect(Math.abs(milliamp - (expected.I_send_mA as number[])[k]!)).toBeLessThanOrEqual(tolerance.abs!);
    });
    (expected.t_us_load as number[]).forEach((t, k) => {
      const milliamp = (sumAt(fronts, "load", t * 1e-6 + soon) / 100) * 1e3;
      expect(Math.abs(milliamp - (expected.I_load_mA as number[])[k]!)).toBeLessThanOrEqual(tolerance.abs!);
    });
  });

  test("a matched end hears the front once", () => {
    const { fronts, omitted } = lattice(run([cable(50, 10)], ohm(50), ohm(50)), step, 1e-3);
    expect(fronts.map(({ node, timeS, amplitudeV }) => [node, timeS, amplitudeV])).toEqual([
      ["source", 0, 0.5],
      ["load", expect.closeTo(50e-9, 15), 0.5],
    ]);
    expect(omitted).toBe(0);
  });

  test("a capacitor across the end is a short to the front, a coil an opening, one in the line stops it", () => {
    const end = (load: Termination) =>
      lattice(run([cable(50, 10)], load, ohm(50)), step, 60e-9).fronts.filter(({ node }) => node === "load");
    expect(end({ kind: "network", topology: "parallel", rOhm: 50, cF: 1e-12 })).toEqual([]);
    expect(end({ kind: "network", topology: "series", rOhm: 50, lH: 1e-9 })[0]!.amplitudeV).toBeCloseTo(1, 12);
    const coil: Element = { kind: "part", connection: "series", lH: 1e-9 };
    expect(
      lattice(run([cable(50, 10), coil, cable(50, 10)], ohm(50), ohm(50)), step, 1e-6).fronts.map(({ node }) => node),
    ).toEqual(["source", "source"]);
  });
});

test("fronts of a stub come back in its round trip, and the path says where they have been", () => {
  const { fronts } = lattice(run([cable(50, 10), stub(50, 3, "open"), cable(50, 10)], ohm(50), ohm(50)), step, 135e-9);
  const atLoad = fronts.filter(({ node }) => node === "load");
  expect(atLoad.map(({ path }) => path)).toEqual([
    ["source", "beforeElement.1", "load"],
    ["source", "beforeElement.1", "elements.1.end", "beforeElement.1", "load"],
  ]);
  expect(atLoad.map(({ timeS }) => timeS)).toEqual([100e-9, 130e-9].map((t) => expect.closeTo(t, 15)));
  expect(atLoad.map(({ amplitudeV }) => amplitudeV)).toEqual([1 / 3, 2 / 9].map((v) => expect.closeTo(v, 12)));
  expect(fronts.filter(({ node }) => node === "taps.0")[0]!.amplitudeV).toBeCloseTo(1 / 3, 12);
});

test("fronts that arrive together are one, with the sum of their jumps", () => {
  const { fronts } = lattice(run([stub(50, 10, "short"), cable(50, 10)], { kind: "short" }, ohm(50)), step, 110e-9);
  const back = fronts.filter(({ node, timeS }) => node === "source" && timeS > 0);
  expect(back).toHaveLength(1);
  // both branches come back turned over: −1/3 each meets 2/3
  expect(back[0]!.amplitudeV).toBeCloseTo(2 * (-1 / 3) * (2 / 3), 12);
});

const resistances = fc.double({ min: 20, max: 300, noNaN: true });
const lengths = fc.double({ min: 1, max: 10, noNaN: true });
const anyElement: fc.Arbitrary<Element> = fc.oneof(
  fc.tuple(resistances, lengths).map(([z, l]) => cable(z, l)),
  fc.tuple(resistances, lengths, resistances).map(([z, l, r]) => stub(z, l, ohm(r))),
  fc.constant<Element>({ kind: "pad", lossDb: 3, inputOhm: 75, outputOhm: 75 }),
  fc.double({ min: 0.5, max: 2, noNaN: true }).map((turnsRatio): Element => ({ kind: "transformer", turnsRatio })),
  fc.record({ kind: fc.constant("joint" as const), lossDb: fc.constant(0.5), referenceOhm: resistances }),
  resistances.map((rOhm): Element => ({ kind: "part", connection: "series", rOhm })),
  resistances.map((r): Element => ({ kind: "shunt", termination: ohm(r) })),
  fc.tuple(resistances, lengths, resistances, lengths).map(([z1, l1, z2, l2]): Element => ({
    kind: "parallel",
    branches: [
      { line: { model: model(z1) }, lengthM: l1 },
      { line: { model: model(z2) }, lengthM: l2 },
    ],
  })),
  fc
    .tuple(resistances, lengths, resistances)
    .map(([z, l, r]): Element => ({ ...(stub(z, l, ohm(r)) as object), connection: "series" }) as Element),
);
const anyRun = fc.record({
  source: resistances.map(ohm),
  load: resistances.map(ohm),
  elements: fc
    .tuple(fc.array(anyElement, { minLength: 1, maxLength: 3 }), lengths)
    .map(([some, l]) => [...some, cable(75, l)]),
});

test("all fronts together are the settled level, wherever all can be listed", () => {
  let complete = 0;
  fc.assert(
    fc.property(anyRun, (circuit) => {
      const end = circuit.elements.length;
      const { fronts, omitted } = lattice(circuit, step, 8e-6);
      const [source, load] = settledLevels(circuit, [0, end]);
      if (omitted + fronts.length > mostFronts) return;
      complete++;
      closeTo(sumAt(fronts, "source"), { value: source!, rel_tolerance: 0, abs_tolerance: 2e-3 });
      closeTo(sumAt(fronts, "load"), { value: load!, rel_tolerance: 0, abs_tolerance: 2e-3 });
    }),
    { numRuns: 60 },
  );
  expect(complete).toBeGreaterThan(20);
});

test("fronts are what the signal of a lossless run is made of, moment by moment", () => {
  let compared = 0;
  fc.assert(
    fc.property(anyRun, (circuit) => {
      const windowS = 200e-9;
      const { fronts, omitted } = lattice(circuit, { ...step, riseS: 1e-10 }, windowS);
      const { planes } = timeResponse(circuit, { ...step, riseS: 1e-10 }, { windowS, points: 2 });
      if (omitted > 0) return;
      for (const [n, node] of ["source", "load"].entries()) {
        const { stepS, values } = planes[n]!;
        for (let k = 0; k < values.length; k += 97) {
          const t = k * stepS;
          if (fronts.some(({ timeS }) => t > timeS - 1e-12 && t < timeS + 1.01e-10)) continue;
          compared++;
          closeTo(
            values[k]!,
            { value: sumAt(fronts, node, t), rel_tolerance: 0, abs_tolerance: 1e-3 },
            `${node} at ${t}`,
          );
        }
      }
    }),
    { numRuns: 12 },
  );
  expect(compared).toBeGreaterThan(1000);
});

test("a run whose fronts never end is cut off at the largest 2,000, the rest counted", () => {
  const pieces = Array.from({ length: 12 }, (_, n) => [
    cable(50 + 20 * (n % 2), 1 + n / 7),
    stub(60, 0.5 + n / 11, "open"),
  ]).flat();
  const { fronts, omitted } = lattice(run(pieces, { kind: "open" }, ohm(0)), step, 5e-6);
  expect(fronts).toHaveLength(mostFronts);
  expect(omitted).toBeGreaterThan(0);
  const times = fronts.map(({ timeS }) => timeS);
  expect(times).toEqual([...times].sort((a, b) => a - b));
  for (const { path } of fronts) expect(path.length).toBeLessThanOrEqual(64);
});

test("refuses what has no front", () => {
  const coil: Element = { kind: "part", connection: "series", lH: 1e-6, q: 10 };
  expect(() => lattice(run([coil], ohm(50), ohm(50)), step, 1)).toThrow("Q that holds at every frequency");
  expect(() => lattice(run([], ohm(50), { kind: "constant", reOhm: 1, imOhm: 1 }), step, 1)).toThrow("imOhm");
});
