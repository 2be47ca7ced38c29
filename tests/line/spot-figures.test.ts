import fc from "@/tests/support/property";
import { expect, test } from "vitest";
import { modelFromNominal } from "@/lib/line/cable";
import { SPEED_OF_LIGHT } from "@/lib/line/constants";
import { lineFigures } from "@/lib/line/line-figures";
import { partOfReactance, reactanceOfPart } from "@/lib/line/reactance";
import { frequencyPerLength, spotFigures } from "@/lib/line/spot-figures";

const coax = modelFromNominal({
  z0: 50,
  velocityFactor: 0.85,
  conductors: [{ form: "sqrt", r0OhmPerM: 0.0086, skinCornerRadPerS: 2 * Math.PI * 18e3 }],
  lossTangent: 1.5e-4,
});
const frequencies = fc.double({ min: 1e3, max: 5e9, noNaN: true });

test("spotFigures are the figures of a sweep at that one frequency", () => {
  fc.assert(
    fc.property(frequencies, fc.double({ min: -40, max: 90, noNaN: true }), (f, temperatureC) => {
      const [spot, swept] = [spotFigures(coax, f, temperatureC), lineFigures(coax, [f], temperatureC)];
      expect(spot.attenuationDbPerM).toBe(swept.attenuationDbPerM[0]);
      expect(spot.phaseRadPerM).toBe(swept.phaseRadPerM[0]);
      expect(spot.groupDelaySPerM).toBe(swept.groupDelaySPerM[0]);
      expect(spot.velocityFactor).toBe(swept.velocityFactor[0]);
      expect(spot.resistanceOhmPerM).toBe(swept.rOhmPerM[0]);
      expect([spot.zc.re, spot.zc.im]).toEqual([swept.zcOhm.re[0], swept.zcOhm.im[0]]);
      expect(spot.wavelengthM * f * spot.phaseDelaySPerM).toBeCloseTo(1, 12);
    }),
  );
});

test("dc resistance follows resistivity, 0.393 % a kelvin for copper", () => {
  expect(spotFigures(coax, 1e6).dcResistanceOhmPerM).toBeCloseTo(0.0086, 12);
  expect(spotFigures(coax, 1e6, 45).dcResistanceOhmPerM / 0.0086).toBeCloseTo(1.09825, 12);
});

test("frequencyPerLength is how the frequency of one electrical length moves, by actually making it longer", () => {
  fc.assert(
    fc.property(frequencies, fc.double({ min: 0.01, max: 100, noNaN: true }), (f, length) => {
      const slope = frequencyPerLength(spotFigures(coax, f), length);
      const longer = length * 1e-6;
      const moved = spotFigures(coax, f + slope * longer);
      const phase = (at: typeof moved, l: number) => at.phaseRadPerM * l;
      expect(phase(moved, length + longer) / phase(spotFigures(coax, f), length)).toBeCloseTo(1, 10);
      expect(slope).toBeLessThan(0);
    }),
  );
});

test("on a line without dispersion the frequency falls by the same share as the length grows", () => {
  const line = spotFigures(modelFromNominal({ z0: 50, velocityFactor: 0.66 }), 1e8);
  expect((frequencyPerLength(line, 2) * 2) / 1e8).toBeCloseTo(-1, 12);
  expect(line.wavelengthM / ((0.66 * SPEED_OF_LIGHT) / 1e8)).toBeCloseTo(1, 12);
});

test("a reactance and its part come back to each other: coil above 0, capacitor below", () => {
  fc.assert(
    fc.property(fc.double({ min: 1e-3, max: 1e6, noNaN: true }), frequencies, (x, f) => {
      const [coil, capacitor] = [partOfReactance(x, f)!, partOfReactance(-x, f)!];
      expect("lH" in coil && "cF" in capacitor).toBe(true);
      expect(reactanceOfPart(coil, f) / x).toBeCloseTo(1, 12);
      expect(reactanceOfPart(capacitor, f) / -x).toBeCloseTo(1, 12);
    }),
  );
  expect(partOfReactance(0, 1e6)).toBeUndefined();
  expect(partOfReactance(Infinity, 1e6)).toBeUndefined();
});

test.each([0, -1, NaN, Infinity])("a frequency of %s is refused by name", (f) => {
  expect(() => spotFigures(coax, f)).toThrow(`spotFigures: frequency must be positive, got ${f}`);
  expect(() => partOfReactance(1, f)).toThrow(`partOfReactance: frequency must be positive, got ${f}`);
});
