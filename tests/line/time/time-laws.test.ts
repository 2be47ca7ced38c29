/** What every signal of a passive run obeys. */
import { expect, test } from "vitest";
import { modelFromNominal, nominalFigures } from "@/lib/line/cable";
import type { Circuit, Element, Termination } from "@/lib/line/element";
import { finalEmf, type Drive } from "@/lib/line/time/drive";
import { settledLevels } from "@/lib/line/time/settled";
import { valueAt } from "@/lib/line/time/signal";
import { timeResponse } from "@/lib/line/time/time-response";
import { anyModel } from "@/tests/support/arbitrary-run";
import fc from "@/tests/support/property";
import { closeTo } from "@/tests/support/tolerance";

const ohm = (reOhm: number): Termination => ({ kind: "constant", reOhm, imOhm: 0 });
const cable = (model = rope, lengthM = 20): Element => ({ kind: "cable", line: { model }, lengthM });
const rope = modelFromNominal({
  z0: 100,
  velocityFactor: 0.67,
  lossTangent: 8e-4,
  conductors: [{ form: "round", r0OhmPerM: 0.168, skinCornerRadPerS: 8.4e5 }],
});
const between = (min: number, max: number) => fc.double({ min, max, noNaN: true });

const anyCable = fc.record({ model: anyModel, lengthM: between(1, 100) });
const resistance = fc.oneof(fc.constant(0), between(5, 500));
const anyEnd: fc.Arbitrary<Termination> = fc.oneof(
  between(5, 500).map(ohm),
  fc.constant<Termination>({ kind: "open" }),
  between(5, 500).map((rOhm): Termination => ({ kind: "network", topology: "parallel", rOhm, cF: 1e-9 })),
  between(5, 500).map((rOhm): Termination => ({ kind: "network", topology: "series", rOhm, lH: 1e-6 })),
);
const anyStub = fc
  .record({ model: anyModel, lengthM: between(0.5, 5), end: anyEnd })
  .map(({ model, lengthM, end }): Element => ({ kind: "stub", connection: "shunt", end, line: { model }, lengthM }));
const anyChain = fc
  .record({
    source: resistance.map(ohm),
    load: anyEnd,
    cables: fc.array(anyCable, { minLength: 1, maxLength: 3 }),
    between: fc.array(anyStub, { maxLength: 2 }),
  })
  .map(({ source, load, cables, between }): Circuit => ({
    source,
    load,
    elements: cables.flatMap(({ model, lengthM }, n) => [cable(model, lengthM), ...between.slice(n, n + 1)]),
  }));

/** Nominal delay along the main path, second. */
const delayOf = ({ elements }: Circuit) =>
  elements.reduce(
    (sum, each) => (each.kind === "cable" ? sum + nominalFigures(each.line.model).delay * each.lengthM : sum),
    0,
  );

const step = (riseS: number, edge: Drive["edge"] = "sineSquared"): Drive => ({
  kind: "step",
  amplitudeV: 1,
  riseS,
  edge: edge!,
});

test("nothing arrives before its time: below 2·10⁻⁴ per volt before 0.85 of the delay", () => {
  fc.assert(
    fc.property(anyChain, fc.constantFrom("sineSquared" as const, "raisedCosine" as const), (circuit, edge) => {
      const delay = delayOf(circuit);
      const { planes } = timeResponse(circuit, step(delay / 20, edge), { windowS: 4 * delay, points: 401 });
      const early = planes[1]!.values.filter((_, n) => n * planes[1]!.stepS < 0.85 * delay);
      expect(early.length).toBeGreaterThan(100);
      for (const value of early) expect(Math.abs(value)).toBeLessThan(2e-4);
    }),
    { numRuns: 60 },
  );
});

test("a pulse of a resistive source never gives more energy to the load than the source has to give", () => {
  fc.assert(
    fc.property(anyChain, between(20, 300), between(20, 300), (circuit, rs, rl) => {
      const ends = { ...circuit, source: ohm(rs), load: ohm(rl) };
      const delay = delayOf(ends);
      const riseS = delay / 10;
      const pulse: Drive = { kind: "pulse", amplitudeV: 1, riseS, widthS: 2 * riseS };
      const { stepS, planes } = timeResponse(ends, pulse, { windowS: 30 * delay, points: 2 });
      const [near, far] = planes.map(({ values }) => values);
      const absorbed = far!.reduce((sum, v) => sum + (v * v * stepS) / rl, 0);
      // ∫ e²/4R of the e.m.f. itself, by its own signal with nothing behind the source
      const alone = timeResponse({ source: ohm(0), elements: [], load: ohm(1) }, pulse, {
        windowS: 30 * delay,
        points: 2,
      });
      const available = alone.planes[0]!.values.reduce((sum, e) => sum + (e * e * alone.stepS) / (4 * rs), 0);
      expect(absorbed).toBeLessThanOrEqual(available * (1 + 1e-6) + 1e-12 * alone.stepS);
      expect(near!.every(Number.isFinite)).toBe(true);
    }),
    { numRuns: 40 },
  );
});

test("a resistive run of lossless cables comes to rest at its dc divider", () => {
  const lossless = fc.record({ z0: between(40, 150), velocityFactor: between(0.5, 1) }).map(modelFromNominal);
  const chain = fc.record({
    cables: fc.array(fc.record({ model: lossless, lengthM: between(1, 10) }), { minLength: 1, maxLength: 3 }),
    rs: between(30, 200),
    rl: between(30, 200),
    tap: between(100, 1000),
  });
  fc.assert(
    fc.property(chain, ({ cables, rs, rl, tap }) => {
      const node: Element = { kind: "shunt", termination: ohm(tap) };
      const circuit = {
        source: ohm(rs),
        elements: [...cables.map((c) => cable(c.model, c.lengthM)), node],
        load: ohm(rl),
      };
      const delay = delayOf(circuit);
      const { planes } = timeResponse(circuit, step(delay / 2), { windowS: 200 * delay, points: 2 });
      const parallel = 1 / (1 / rl + 1 / tap);
      const divider = parallel / (parallel + rs);
      closeTo(settledLevels(circuit, [0, 1])[0]!, { value: divider, rel_tolerance: 1e-9, abs_tolerance: 0 });
      closeTo(planes[1]!.values.at(-1)!, { value: divider, rel_tolerance: 0, abs_tolerance: 2e-4 });
    }),
    { numRuns: 60 },
  );
});

const circuit: Circuit = {
  source: ohm(50),
  elements: [cable(), { kind: "stub", connection: "shunt", end: "open", line: { model: rope }, lengthM: 3 }, cable()],
  load: { kind: "network", topology: "parallel", rOhm: 120, cF: 5e-10 },
};
const shown = { windowS: 2e-6, points: 401 };

test("signals add: bits are the sum of their edges, and twice the amplitude gives twice the signal", () => {
  const shared = { amplitudeV: 1, riseS: 20e-9 } as const;
  const one = timeResponse(circuit, { kind: "step", ...shared }, shown).planes[1]!;
  const bits = timeResponse(circuit, { kind: "bits", ...shared, amplitudeV: 2, bits: "0101", bitS: 300e-9 }, shown);
  bits.planes[1]!.values.forEach((value, n) => {
    const t = n * bits.stepS;
    const later = (delay: number) => (t < delay ? 0 : valueAt(one, t - delay));
    closeTo(value, {
      value: 2 * (later(300e-9) - later(600e-9) + later(900e-9)),
      rel_tolerance: 0,
      abs_tolerance: 1e-5,
    });
  });
  expect(finalEmf({ kind: "bits", ...shared, bits: "0101", bitS: 1 })).toBe(1);
});

test("a cable cut anywhere carries the same signal, and a stub of no length is no tap", () => {
  const whole = timeResponse({ ...circuit, elements: [cable(rope, 40)] }, step(20e-9), shown);
  const none: Element = { kind: "stub", connection: "shunt", end: "open", line: { model: rope }, lengthM: 0 };
  const cut = timeResponse({ ...circuit, elements: [cable(rope, 13), none, cable(rope, 27)] }, step(20e-9), shown);
  cut.planes.forEach(({ values }, n) =>
    closeTo(values, { value: [...whole.planes[n]!.values], rel_tolerance: 0, abs_tolerance: 1e-9 }),
  );
});

test("a signal does not depend on how much of it is shown, or in how many points", () => {
  const long = timeResponse(circuit, step(20e-9), { windowS: 10e-6, points: 1001 }).planes[1]!;
  const short = timeResponse(circuit, step(20e-9), { windowS: 1e-6, points: 77 }).planes[1]!;
  for (let t = 0; t < 1e-6; t += 13e-9)
    closeTo(valueAt(short, t), { value: valueAt(long, t), rel_tolerance: 0, abs_tolerance: 2e-5 }, `at ${t}`);
});

test("the source alone shows its edge, even against a short window", () => {
  for (const windowS of [1e-12, 1e-10, 5e-9, 1e-8])
    for (const edge of ["sineSquared", "raisedCosine"] as const) {
      const { planes } = timeResponse({ source: ohm(0), elements: [], load: ohm(1) }, step(1e-8, edge), {
        windowS,
        points: 3,
      });
      const part = windowS / 1e-8;
      const value =
        edge === "raisedCosine"
          ? (1 - Math.cos(Math.PI * part)) / 2
          : part - Math.sin(2 * Math.PI * part) / (2 * Math.PI);
      closeTo(planes[0]!.values.at(-1)!, { value, rel_tolerance: 0, abs_tolerance: 1e-4 }, `${edge} ${windowS}`);
    }
});
