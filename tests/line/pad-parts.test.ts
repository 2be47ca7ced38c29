import fc from "@/tests/support/property";
import { expect, test } from "vitest";
import type { PadElement } from "@/lib/line/element";
import { e24, e24Around } from "@/lib/line/match/e-series";
import { minimumPadLossDb, padResistors, type PadResistors } from "@/lib/line/pad";
import { padFigures, padPowers, standardPad, type PadTopology } from "@/lib/line/pad-parts";
import { returnLossDb } from "@/lib/line/reflection";
import { checks } from "@/tests/support/line-checks";
import { closeTo, type Expected } from "@/tests/support/tolerance";

interface PadInputs {
  form: PadTopology;
  loss_db: number;
  source_side_ohm: number;
  load_side_ohm: number;
  higher_ohm: number;
  lower_ohm: number;
  resistors_from_source_ohm: PadResistors;
  z_ohm: number;
}
const named = (end: string) =>
  checks<PadInputs>("matching-pads")
    .filter(({ name }) => name.endsWith(end))
    .map((check, k) => [`${check.name} ${k + 1}`, check] as const);

test.each(named("minimum-loss pad"))("%s: least loss and both resistors agree with the closed form", (_name, check) => {
  const { higher_ohm: inputOhm, lower_ohm: outputOhm } = check.inputs;
  const lossDb = minimumPadLossDb(inputOhm, outputOhm);
  const [series, shunt] = padResistors({ kind: "pad", lossDb, inputOhm, outputOhm });
  closeTo(lossDb, check.expected.loss_db!, "loss_db");
  closeTo(series, check.expected.series_at_higher_side_ohm!, "series");
  closeTo(shunt, check.expected.shunt_at_lower_side_ohm!, "shunt");
});

test.each([...named("T pad"), ...named("pi pad")])(
  "%s: the resistors agree, and make the pad asked for",
  (_n, check) => {
    const { form, loss_db: lossDb, source_side_ohm: inputOhm, load_side_ohm: outputOhm } = check.inputs;
    const resistors = padResistors({ kind: "pad", topology: form, lossDb, inputOhm, outputOhm });
    closeTo(resistors, check.expected.resistors_from_source_ohm!, "resistors");
    const made = padFigures(form, resistors, inputOhm, outputOhm);
    expect(made.lossDb).toBeCloseTo(lossDb, 10);
    expect(made.inputOhm / inputOhm).toBeCloseTo(1, 12);
    expect(made.outputOhm / outputOhm).toBeCloseTo(1, 12);
  },
);

test.each(named("with stock resistors"))("%s: what stock resistors give agrees with the cascade", (_name, check) => {
  const { form, resistors_from_source_ohm: resistors, z_ohm: ohm } = check.inputs;
  const made = padFigures(form, resistors, ohm, ohm);
  closeTo(made.lossDb, check.expected.transducer_loss_db!, "loss");
  closeTo(returnLossDb(made.inputReflection), check.expected.return_loss_db as Expected, "return loss");
});

test.each(named("below the minimum loss"))("%s is refused", (_name, check) => {
  const { form, loss_db: lossDb, source_side_ohm: inputOhm, load_side_ohm: outputOhm } = check.inputs;
  closeTo(minimumPadLossDb(inputOhm, outputOhm), check.expected.minimum_loss_db!, "least loss");
  expect(() => padResistors({ kind: "pad", topology: form, lossDb, inputOhm, outputOhm })).toThrow(RangeError);
});

const anyPad = fc
  .record({
    inputOhm: fc.double({ min: 5, max: 1200, noNaN: true }),
    outputOhm: fc.double({ min: 5, max: 1200, noNaN: true }),
    more: fc.double({ min: 0.05, max: 40, noNaN: true }),
    topology: fc.constantFrom<PadTopology>("T", "pi"),
  })
  .map(({ inputOhm, outputOhm, more, topology }) => ({
    kind: "pad" as const,
    topology,
    inputOhm,
    outputOhm,
    lossDb: minimumPadLossDb(inputOhm, outputOhm) + more,
  }));

test("padPowers: the resistors and the load together take what goes in, and the load what the loss leaves", () => {
  fc.assert(
    fc.property(anyPad, fc.double({ min: 1e-9, max: 1e4, noNaN: true }), (pad, watts) => {
      const { resistorsW, loadW } = padPowers(pad.topology, padResistors(pad), pad.outputOhm, watts);
      const sum = resistorsW.reduce((all, each) => all + each, loadW);
      expect(Math.abs(sum - watts)).toBeLessThanOrEqual(1e-12 * watts);
      expect(Math.min(...resistorsW)).toBeGreaterThanOrEqual(0);
      expect(Math.abs(loadW - watts * 10 ** (-pad.lossDb / 10))).toBeLessThanOrEqual(1e-11 * watts);
    }),
  );
});

test("padPowers of a 10 dB T between 50 Ω: the first arm takes 51.9 % and the load a tenth", () => {
  const resistors = padResistors({ kind: "pad", topology: "T", lossDb: 10, inputOhm: 50, outputOhm: 50 });
  const { resistorsW, loadW } = padPowers("T", resistors, 50, 100);
  // I1² R1 / (I1² · 50) = R1/50 by hand, and the last arm takes the same share of the load's tenth
  expect(resistorsW[0]).toBeCloseTo((100 * resistors[0]) / 50, 10);
  expect(resistorsW[2]).toBeCloseTo((10 * resistors[2]) / 50, 10);
  expect(loadW).toBeCloseTo(10, 10);
});

test("standardPad takes E24 values only, each beside the exact one, and no neighbouring choice is better", () => {
  const isStandard = (ohm: number) => {
    const mantissa = ohm / 10 ** Math.floor(Math.log10(ohm) + 1e-9);
    return e24.some((value) => Math.abs(mantissa / value - 1) < 1e-9);
  };
  const error = (pad: PadElement & { topology: PadTopology }, resistors: PadResistors) => {
    const made = padFigures(pad.topology, resistors, pad.inputOhm, pad.outputOhm);
    const through = Math.abs(10 ** ((pad.lossDb - made.lossDb) / 20) - 1);
    return Math.hypot(made.inputReflection, made.outputReflection, through);
  };
  fc.assert(
    fc.property(anyPad, (pad) => {
      const exact = padResistors(pad);
      const { resistors } = standardPad(pad);
      const best = error(pad, resistors);
      resistors.forEach((ohm, k) => {
        expect(isStandard(ohm)).toBe(true);
        // the widest step of the series is from 1.3 to 1.5
        expect(Math.abs(ohm / exact[k]! - 1)).toBeLessThan(0.16);
        for (const neighbour of e24Around(exact[k]!)) {
          const other = resistors.map((value, j) => (j === k ? neighbour : value)) as PadResistors;
          expect(error(pad, other)).toBeGreaterThanOrEqual(best);
        }
      });
      expect(best).toBeLessThan(0.15);
    }),
  );
});

test("standardPad of 3 dB between 50 Ω is the T of 8.2, 150 and 8.2 Ω that the check values also give", () => {
  const { resistors, figures } = standardPad({ kind: "pad", topology: "T", lossDb: 3, inputOhm: 50, outputOhm: 50 });
  expect(resistors).toEqual([8.2, 150, 8.2]);
  expect(figures.lossDb).toBeGreaterThan(2.8);
});

test("a pad that needs no resistor keeps none: 0 dB stays 0 Ω in line and nothing across", () => {
  const { resistors, figures } = standardPad({ kind: "pad", topology: "T", lossDb: 0, inputOhm: 50, outputOhm: 50 });
  expect(resistors).toEqual([0, Infinity, 0]);
  expect(figures).toEqual({ lossDb: 0, inputOhm: 50, outputOhm: 50, inputReflection: 0, outputReflection: 0 });
});

test("resistors and resistances out of range are refused by name", () => {
  expect(() => padFigures("T", [8, 150, 8], 0, 50)).toThrow("padFigures: inputOhm must be positive, got 0");
  expect(() => padFigures("T", [8, 0, 8], 50, 50)).toThrow("padFigures: resistor 2 is out of range, got 0");
  expect(() => padFigures("pi", [150, Infinity, 150], 50, 50)).toThrow(/resistor 2/);
  expect(() => padPowers("pi", [150, 39, 150], 50, -1)).toThrow("padPowers: watts must be at least 0, got -1");
});
