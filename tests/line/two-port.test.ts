import fc from "@/tests/support/property";
import { expect, test } from "vitest";
import { abs, subtract, type Complex } from "@/lib/line/complex";
import { modelFromNominal } from "@/lib/line/cable";
import { elementTwoPort } from "@/lib/line/element-two-port";
import type { Element } from "@/lib/line/element";
import { cascade, chainMatrix, THROUGH, throughTwoPort, type TwoPort } from "@/lib/line/two-port";
import { terminationPort } from "@/lib/line/termination";
import { anyCable, anyElement, anyFrequency, anyModel } from "@/tests/support/arbitrary-run";

const axis = (frequency: number): Complex => ({ re: 0, im: 2 * Math.PI * frequency });
const parts = (twoPort: TwoPort) => [twoPort.a, twoPort.b, twoPort.c, twoPort.d] as const;

/** Largest difference of two chain matrices, each part against the size its own matrix gives it at 50 Ω. */
function distance(one: TwoPort, other: TwoPort): number {
  const size = Math.max(abs(one.a), abs(one.b) / 50, abs(one.c) * 50, abs(one.d));
  const weights = [1, 1 / 50, 50, 1];
  const factor = Math.exp(other.logScale - one.logScale);
  return Math.max(
    ...parts(one).map((part, k) => {
      const there = parts(other)[k]!;
      return (abs(subtract(part, { re: there.re * factor, im: there.im * factor })) * weights[k]!) / size;
    }),
  );
}

test("every element is reciprocal: a·d − b·c = 1", () => {
  fc.assert(
    fc.property(anyElement, anyFrequency, (element, frequency) => {
      const { a, b, c, d, logScale } = elementTwoPort(element, axis(frequency), { jointReferenceOhm: 50 });
      const ad = { re: a.re * d.re - a.im * d.im, im: a.re * d.im + a.im * d.re };
      const bc = { re: b.re * c.re - b.im * c.im, im: b.re * c.im + b.im * c.re };
      const wanted = Math.exp(-2 * logScale);
      // a·d and b·c are what rounding is relative to; on a lossy line they cancel to nothing
      const allowed = 1e-12 * (abs(ad) + abs(bc));
      expect(Math.hypot(ad.re - bc.re - wanted, ad.im - bc.im)).toBeLessThanOrEqual(allowed);
    }),
    { numRuns: 400 },
  );
});

test("a cable cut anywhere is the product of its two pieces", () => {
  fc.assert(
    fc.property(anyCable, fc.double({ min: 0, max: 1, noNaN: true }), anyFrequency, (element, part, frequency) => {
      const cable = element as Extract<Element, { kind: "cable" }>;
      const s = axis(frequency);
      const whole = elementTwoPort(cable, s);
      const near = elementTwoPort({ ...cable, lengthM: cable.lengthM * part }, s);
      const far = elementTwoPort({ ...cable, lengthM: cable.lengthM * (1 - part) }, s);
      // phases of up to thousands of turns are each rounded to their own last digit
      const turns = frequency * cable.lengthM * 1e-8;
      expect(distance(whole, cascade(near, far))).toBeLessThanOrEqual(1e-13 * (10 + turns * 10));
    }),
    { numRuns: 300 },
  );
});

test("the product of elements does not depend on which are multiplied first", () => {
  fc.assert(
    fc.property(anyElement, anyElement, anyElement, anyFrequency, (first, second, third, frequency) => {
      const [one, two, three] = [first, second, third].map((element) =>
        elementTwoPort(element, axis(frequency), { jointReferenceOhm: 50 }),
      ) as [TwoPort, TwoPort, TwoPort];
      const left = cascade(cascade(one, two), three);
      const right = cascade(one, cascade(two, three));
      // products may cancel: what is compared is held against the product of the sizes
      const size = [one, two, three].reduce(
        (product, each) => product * Math.max(abs(each.a), abs(each.b) / 50, abs(each.c) * 50, abs(each.d), 1),
        1,
      );
      const own = Math.max(abs(left.a), abs(left.b) / 50, abs(left.c) * 50, abs(left.d));
      expect(distance(left, right) * own).toBeLessThanOrEqual(1e-13 * size * 16);
    }),
    { numRuns: 300 },
  );
});

test("what changes nothing is exactly the identity: no length, no loss, no turns ratio", () => {
  const model = modelFromNominal({
    z0: 50,
    velocityFactor: 0.66,
    lossTangent: 0.01,
    conductors: [{ form: "round", r0OhmPerM: 0.1, skinCornerRadPerS: 1e5 }],
  });
  const nothing: Element[] = [
    { kind: "cable", line: { model }, lengthM: 0 },
    { kind: "joint", referenceOhm: 50 },
    { kind: "pad", lossDb: 0, inputOhm: 50, outputOhm: 50 },
    { kind: "transformer", turnsRatio: 1 },
    { kind: "shunt", termination: { kind: "open" } },
    { kind: "part", connection: "series", rOhm: 0 },
    { kind: "part", connection: "series", lH: 0 },
  ];
  for (const element of nothing) {
    const { a, b, c, d } = chainMatrix(elementTwoPort(element, axis(1e9)));
    for (const [got, value] of [
      [a, 1],
      [b, 0],
      [c, 0],
      [d, 1],
    ] as const) {
      expect(got.re, element.kind).toBe(value);
      expect(got.im, element.kind).toBeCloseTo(0, 15);
    }
  }
});

test("a very short length is its series impedance and shunt admittance, to the last digits", () => {
  const model = modelFromNominal({ z0: 50, velocityFactor: 0.66, conductors: [{ form: "constant", r0OhmPerM: 0.1 }] });
  const { b, c } = chainMatrix(elementTwoPort({ kind: "cable", line: { model }, lengthM: 1e-9 }, axis(1e6)));
  expect(b.re / 1e-10).toBeCloseTo(1, 14);
  expect(b.im / (2e6 * Math.PI * model.lInfHPerM * 1e-9)).toBeCloseTo(1, 14);
  expect(c.im / (2e6 * Math.PI * model.cFPerM * 1e-9)).toBeCloseTo(1, 14);
});

test("a lossless line repeats every half wavelength, and turns every sign at a quarter more", () => {
  const frequency = 1e8;
  const model = modelFromNominal({ z0: 60, velocityFactor: 0.7 });
  const half = (299_792_458 * 0.7) / frequency / 2;
  fc.assert(
    fc.property(fc.double({ min: 0, max: 5, noNaN: true }), fc.integer({ min: 1, max: 20 }), (lengthM, halves) => {
      const short = elementTwoPort({ kind: "cable", line: { model }, lengthM }, axis(frequency));
      const long = elementTwoPort(
        { kind: "cable", line: { model }, lengthM: lengthM + halves * half },
        axis(frequency),
      );
      const sign = halves % 2 === 0 ? 1 : -1;
      for (const key of ["a", "b", "c", "d"] as const) {
        const weight = { a: 1, b: 1 / 60, c: 60, d: 1 }[key];
        expect(abs(subtract(long[key], { re: sign * short[key].re, im: sign * short[key].im })) * weight).toBeLessThan(
          1e-11,
        );
      }
    }),
  );
});

test("any number of identical cables in parallel is the same whether counted or listed side by side", () => {
  fc.assert(
    fc.property(
      anyModel,
      fc.integer({ min: 1, max: 4 }),
      fc.double({ min: 0.1, max: 30, noNaN: true }),
      anyFrequency,
      (model, count, lengthM, frequency) => {
        const counted = elementTwoPort({ kind: "cable", line: { model }, lengthM, paralleled: count }, axis(frequency));
        const listed = elementTwoPort(
          { kind: "parallel", branches: Array.from({ length: count }, () => ({ line: { model }, lengthM })) },
          axis(frequency),
        );
        // a listed line is the quotient of two admittances; at resonance both are large
        expect(distance(counted, listed)).toBeLessThan(1e-9);
      },
    ),
    { numRuns: 300 },
  );
});

test("derivatives by s are those a difference shows, for every kind of element", () => {
  fc.assert(
    fc.property(anyElement, fc.double({ min: 5, max: 7, noNaN: true }), (element, decade) => {
      const s = axis(10 ** decade);
      const h = s.im * 1e-5;
      const [up, at, down] = [s.im + h, s.im, s.im - h].map((im) => elementTwoPort(element, { re: 0, im })) as [
        TwoPort,
        TwoPort,
        TwoPort,
      ];
      const weight = { a: 1, b: 1 / 50, c: 50, d: 1 };
      for (const key of ["a", "b", "c", "d"] as const) {
        const plus = Math.exp(up.logScale - at.logScale);
        const minus = Math.exp(down.logScale - at.logScale);
        const difference = {
          re: (up[key].im * plus - down[key].im * minus) / (2 * h),
          im: -(up[key].re * plus - down[key].re * minus) / (2 * h),
        };
        const error = Math.hypot(difference.re - at[key].slopeRe, difference.im - at[key].slopeIm) * weight[key] * s.im;
        // second order: what a difference of this step misses grows with the cube of the electrical length
        const turns = Math.hypot(at[key].slopeRe, at[key].slopeIm) * weight[key] * s.im;
        const size = Math.max(...(["a", "b", "c", "d"] as const).map((each) => abs(at[each]) * weight[each]), 1);
        expect(error).toBeLessThanOrEqual(1e-5 * (turns + size + turns ** 3 / size ** 2));
      }
    }),
    { numRuns: 300 },
  );
});

test("what lets nothing through still shows its own short or open toward the source", () => {
  const short = elementTwoPort({ kind: "shunt", termination: { kind: "short" } }, axis(1e6));
  const open = elementTwoPort({ kind: "part", connection: "series", cF: 0 }, axis(1e6));
  for (const load of ["open", "short"] as const) {
    const behindShort = throughTwoPort(short, terminationPort({ kind: load }, axis(1e6)));
    expect([abs(behindShort.v), abs(behindShort.i)]).toEqual([0, 1]);
    const behindOpen = throughTwoPort(open, terminationPort({ kind: load }, axis(1e6)));
    expect([abs(behindOpen.v), abs(behindOpen.i)]).toEqual([1, 0]);
  }
  expect(throughTwoPort(THROUGH, terminationPort({ kind: "open" }, axis(1e6)))).toEqual(
    terminationPort({ kind: "open" }, axis(1e6)),
  );
});
