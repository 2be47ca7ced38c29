import fc from "@/tests/support/property";
import { expect, test } from "vitest";
import { elementTwoPort } from "@/lib/line/element-two-port";
import type { Element, PadElement } from "@/lib/line/element";
import { minimumPadLossDb, padResistors, padTwoPort } from "@/lib/line/pad";
import { cascade, chainMatrix, THROUGH, type TwoPort } from "@/lib/line/two-port";
import { agrees, number, published, type PublishedCheck } from "@/tests/support/published";

const s = { re: 0, im: 1e7 };
const named = (topic: string) =>
  published((_id, each) => each === topic).map(
    (check) => [`${check.id}: ${check.source}`, check] as [string, PublishedCheck],
  );
const part = (connection: "shunt" | "series", rOhm: number): Element => ({ kind: "part", connection, rOhm });
const inARow = (elements: Element[]) => elements.map((element) => elementTwoPort(element, s)).reduce(cascade, THROUGH);

/** A pad as the three resistors that `padResistors` names. */
function soldered(pad: PadElement): TwoPort {
  const [first, second, third] = padResistors(pad);
  const arms =
    pad.topology === "pi" ? (["shunt", "series", "shunt"] as const) : (["series", "shunt", "series"] as const);
  return inARow(
    [part(arms[0], first), part(arms[1], second), part(arms[2], third)].filter(
      (each) => !("rOhm" in each && each.rOhm === Infinity),
    ),
  );
}

test.each(named("minimum-loss pad"))(
  "the least loss of a pad and its two resistors agree with print: %s",
  (_name, check) => {
    const [inputOhm, outputOhm] = [number(check.inputs, "R_high_ohm"), number(check.inputs, "R_low_ohm")];
    const lossDb = minimumPadLossDb(inputOhm, outputOhm);
    const [series, shunt, gone] = padResistors({ kind: "pad", lossDb, inputOhm, outputOhm });
    // the arm at the lower side vanishes but for rounding
    expect(gone).toBeLessThan(1e-6 * outputOhm);
    agrees(check, { series_ohm: series, shunt_ohm: shunt, loss_dB: lossDb });
  },
);

test.each(named("T pad"))("a T pad's resistors agree with print: %s", (_name, check) => {
  const ohm = number(check.inputs, "R0_ohm");
  const [series, shunt] = padResistors({
    kind: "pad",
    topology: "T",
    lossDb: number(check.inputs, "loss_dB"),
    inputOhm: ohm,
    outputOhm: ohm,
  });
  agrees(check, { series_ohm: series, shunt_ohm: shunt });
});

test.each(named("pi pad"))("a pi pad's resistors agree with print: %s", (_name, check) => {
  const ohm = number(check.inputs, "R0_ohm");
  const [shunt, series] = padResistors({
    kind: "pad",
    topology: "pi",
    lossDb: number(check.inputs, "loss_dB"),
    inputOhm: ohm,
    outputOhm: ohm,
  });
  agrees(check, { series_ohm: series, shunt_ohm: shunt });
});

test.each(named("image and iterative impedance"))(
  "image and iterative impedances of three resistors agree with print: %s",
  (_name, check) => {
    const { inputs } = check;
    const { a, b, c, d } = chainMatrix(
      inARow([
        part("series", number(inputs, "T_series1_ohm")),
        part("shunt", number(inputs, "T_shunt_ohm")),
        part("series", number(inputs, "T_series2_ohm")),
      ]),
    );
    const iterative = (first: number, second: number) =>
      (first - second + Math.sqrt((first - second) ** 2 + 4 * b.re * c.re)) / (2 * c.re);
    agrees(check, {
      image_ohm: [Math.sqrt((a.re * b.re) / (c.re * d.re)), Math.sqrt((d.re * b.re) / (c.re * a.re))],
      iterative_ohm: [iterative(a.re, d.re), iterative(d.re, a.re)],
    });
  },
);

const anyPad = fc
  .record({
    inputOhm: fc.double({ min: 5, max: 600, noNaN: true }),
    outputOhm: fc.double({ min: 5, max: 600, noNaN: true }),
    more: fc.double({ min: 0.01, max: 60, noNaN: true }),
    topology: fc.constantFrom("T" as const, "pi" as const),
  })
  .map(({ inputOhm, outputOhm, more, topology }): PadElement => ({
    kind: "pad",
    topology,
    inputOhm,
    outputOhm,
    lossDb: minimumPadLossDb(inputOhm, outputOhm) + more,
  }));

test("a pad is the three resistors it is made of, T or pi", () => {
  fc.assert(
    fc.property(anyPad, (pad) => {
      const [ideal, real] = [chainMatrix(padTwoPort(pad)), chainMatrix(soldered(pad))];
      for (const key of ["a", "b", "c", "d"] as const) expect(real[key].re / ideal[key].re).toBeCloseTo(1, 8);
    }),
  );
});

test("a pad between its own impedances loses what it says and reflects nothing at either side", () => {
  fc.assert(
    fc.property(anyPad, (pad) => {
      const { a, b, c, d } = chainMatrix(padTwoPort(pad));
      const { inputOhm, outputOhm } = pad;
      expect((a.re * outputOhm + b.re) / (c.re * outputOhm + d.re) / inputOhm).toBeCloseTo(1, 10);
      expect((d.re * inputOhm + b.re) / (c.re * inputOhm + a.re) / outputOhm).toBeCloseTo(1, 10);
      const ratio = ((a.re * outputOhm + b.re) * (c.re * outputOhm + d.re)) / outputOhm;
      expect(10 * Math.log10(ratio)).toBeCloseTo(pad.lossDb, 9);
    }),
  );
});

test("a pad of no loss needs no resistors", () => {
  const none = { kind: "pad", lossDb: 0, inputOhm: 50, outputOhm: 50 } as const;
  expect(padResistors({ ...none, topology: "T" })).toEqual([0, Infinity, 0]);
  expect(padResistors({ ...none, topology: "pi" })).toEqual([Infinity, 0, Infinity]);
});

test("a pad below its least loss, or without impedance, is refused by name", () => {
  const pad = { kind: "pad", inputOhm: 75, outputOhm: 50 } as const;
  expect(() => padTwoPort({ ...pad, lossDb: 5.7 })).toThrow(
    /^padTwoPort: lossDb must be at least 5\.71947\d* between 75 and 50 ohm, got 5\.7$/,
  );
  expect(() => padTwoPort({ ...pad, lossDb: NaN })).toThrow(RangeError);
  expect(() => padResistors({ ...pad, lossDb: 10, inputOhm: 0 })).toThrow(
    "padResistors: inputOhm must be positive, got 0",
  );
  expect(() => padTwoPort({ ...pad, lossDb: 10, outputOhm: -50 })).toThrow(
    "padTwoPort: outputOhm must be positive, got -50",
  );
  // at the least loss itself it is not refused for rounding
  expect(() => padTwoPort({ ...pad, lossDb: minimumPadLossDb(75, 50) })).not.toThrow();
});

test("published D100 (J. Bird, Electrical Circuit Theory and Technology, 2nd ed. 2003, problem 17 of chapter 41): four T pads of 450 Ω and a ratio of 8 have arms of 350 and 114.3 Ω and lose 72.25 dB", () => {
  const pad: PadElement = { kind: "pad", lossDb: 20 * Math.log10(8), inputOhm: 450, outputOhm: 450 };
  const [series, shunt] = padResistors(pad);
  expect(Math.abs(series - 350)).toBeLessThan(0.001 * 350);
  expect(Math.abs(shunt - 114.3)).toBeLessThan(0.001 * 114.3);
  const { a } = chainMatrix([pad, pad, pad, pad].map((each) => padTwoPort(each)).reduce(cascade, THROUGH));
  // e^{4θ}/2 + e^{−4θ}/2
  expect(20 * Math.log10(a.re + Math.sqrt(a.re * a.re - 1))).toBeCloseTo(72.25, 2);
});
