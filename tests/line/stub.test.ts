import fc from "@/tests/support/property";
import { expect, test } from "vitest";
import { modelFromNominal } from "@/lib/line/cable";
import { SPEED_OF_LIGHT } from "@/lib/line/constants";
import type { LineModel } from "@/lib/line/element";
import { elementTwoPort } from "@/lib/line/element-two-port";
import { portImpedance, terminationPort } from "@/lib/line/termination";
import { throughTwoPort } from "@/lib/line/two-port";
import { spotFigures } from "@/lib/line/spot-figures";
import { greatestReactance, shuntLossDb, stubImpedance, stubLengths, type StubEnd } from "@/lib/line/stub";

/** Made-up coaxial cable of 50 Ω and 0.85, about 4 dB/100 m at 100 MHz. */
const coax = modelFromNominal({
  z0: 50,
  velocityFactor: 0.85,
  conductors: [{ form: "sqrt", r0OhmPerM: 0.0086, skinCornerRadPerS: 2 * Math.PI * 18e3 }],
  lossTangent: 1.5e-4,
});
const lossless = modelFromNominal({ z0: 50, velocityFactor: 1 });
const ends = fc.constantFrom<StubEnd>("open", "short");

test.each([
  ["short", 1 / 8, 50],
  ["open", 1 / 8, -50],
  ["short", 3 / 8, -50],
  ["open", 3 / 8, 50],
  ["short", 1 / 2, 0],
  ["open", 1 / 4, 0],
] as const)("a lossless %s stub of %s wavelengths of a 50 Ω line is j%s Ω", (end, wavelengths, ohm) => {
  const line = spotFigures(lossless, SPEED_OF_LIGHT);
  const { re, im } = stubImpedance(line, wavelengths, end);
  expect(Math.abs(re)).toBeLessThan(1e-9);
  expect(im).toBeCloseTo(ohm, 9);
});

test("stubImpedance is what the engine's stub shows, losses and all", () => {
  fc.assert(
    fc.property(
      ends,
      fc.double({ min: 1e-3, max: 20, noNaN: true }),
      fc.double({ min: 1e5, max: 1e9 }),
      (end, l, f) => {
        const s = { re: 0, im: 2 * Math.PI * f };
        const twoPort = elementTwoPort({ kind: "cable", line: { model: coax }, lengthM: l }, s);
        const seen = portImpedance(throughTwoPort(twoPort, terminationPort({ kind: end }, s)));
        const got = stubImpedance(spotFigures(coax, f), l, end);
        const size = Math.hypot(seen.re, seen.im);
        expect(Math.hypot(got.re - seen.re, got.im - seen.im) / size).toBeLessThan(1e-8);
      },
    ),
  );
});

test("every length that stubLengths gives has the reactance wanted; they are half a wavelength apart", () => {
  fc.assert(
    fc.property(
      ends,
      fc.double({ min: -100, max: 100, noNaN: true }),
      fc.double({ min: 1e6, max: 1e9 }),
      (end, x, f) => {
        const line = spotFigures(coax, f);
        const [first, second] = stubLengths(line, x, end);
        expect(first).toBeGreaterThan(0);
        expect(first).toBeLessThan(line.wavelengthM * 0.51);
        for (const length of [first!, second!]) {
          expect(Math.abs(stubImpedance(line, length, end).im - x)).toBeLessThan(1e-6 * Math.max(50, Math.abs(x)));
        }
        // loss shifts each a little: at 1 MHz a wavelength of this cable already loses 1 dB
        expect(Math.abs((second! - first!) / line.wavelengthM - 0.5)).toBeLessThan(0.05);
      },
    ),
  );
});

test("without loss any reactance is reached, at the length of the arc tangent", () => {
  fc.assert(
    fc.property(fc.double({ min: 1e-3, max: 1e6, noNaN: true }), fc.constantFrom(1, -1), (size, sign) => {
      const x = size * sign;
      const line = spotFigures(lossless, SPEED_OF_LIGHT);
      const turn = Math.atan(x / 50) / (2 * Math.PI);
      const expected = { short: turn > 0 ? turn : turn + 0.5, open: turn + 0.25 };
      for (const end of ["short", "open"] as const)
        expect(stubLengths(line, x, end, 1)[0]).toBeCloseTo(expected[end], 8);
    }),
  );
});

test("what loss keeps a stub from reaching is not found, and greatestReactance says where that begins", () => {
  const model: LineModel = { ...coax, conductors: [{ form: "constant", r0OhmPerM: 20 }] };
  const line = spotFigures(model, 100e6);
  for (const end of ["open", "short"] as const) {
    const { capacitive, inductive } = greatestReactance(line, end);
    expect(stubLengths(line, inductive * 0.999, end, 1)).toHaveLength(1);
    expect(stubLengths(line, capacitive * (end === "open" && capacitive < -1e6 ? 1e-3 : 0.999), end, 1)).toHaveLength(
      1,
    );
    expect(stubLengths(line, inductive * 1.001, end, 1)).toHaveLength(0);
  }
  // near the quarter wave a low-loss shorted stub reaches about Zc/sinh 2αl
  const { inductive } = greatestReactance(line, "short");
  const estimate = line.zc.re / Math.sinh((2 * line.gamma.re * line.wavelengthM) / 4);
  expect(inductive / estimate).toBeCloseTo(1, 1);
});

test("an open stub of no length is open, a shorted one a short", () => {
  const line = spotFigures(coax, 1e8);
  expect(stubImpedance(line, 0, "open").re).toBe(Infinity);
  expect(stubImpedance(line, 0, "short")).toEqual({ re: 0, im: 0 });
});

test("shuntLossDb: a quarter-wave open stub notches by 20·log((R + Z0/2)/R), 44.3 dB for 0.153 Ω", () => {
  expect(shuntLossDb({ re: 0.153, im: 0 }, 50)).toBeCloseTo(44.3, 1);
  expect(shuntLossDb({ re: Infinity, im: NaN }, 50)).toBe(0);
  expect(shuntLossDb({ re: 0, im: 0 }, 50)).toBe(Infinity);
  // a matched load across a line: it sees half of what it sends
  expect(shuntLossDb({ re: 50, im: 0 }, 50)).toBeCloseTo(20 * Math.log10(1.5), 12);
});

test("figures out of range are refused by name", () => {
  const line = spotFigures(coax, 1e8);
  expect(() => stubImpedance(line, -1, "open")).toThrow("stubImpedance: length must be at least 0, got -1");
  expect(() => shuntLossDb({ re: 1, im: 0 }, 0)).toThrow("shuntLossDb: referenceOhm must be positive, got 0");
});
