import fc from "@/tests/support/property";
import { expect, test } from "vitest";
import { modelFromNominal, nominalFigures, perMetre, propagation } from "@/lib/line/cable";
import { abs, multiply, sqrt } from "@/lib/line/complex";
import type { LineModel } from "@/lib/line/element";
import { lineFigures } from "@/lib/line/line-figures";
import { bothForms, modelOf, type CheckCable } from "@/tests/support/line-checks";
import { closeTo } from "@/tests/support/tolerance";

interface Limits {
  cable: CheckCable;
  high_frequency_hz: number;
  low_frequency_hz: number;
}

test.each(bothForms<Limits>("model-limits"))(
  "the model meets its low and high frequency limits: $name",
  ({ inputs, expected }) => {
    const model = modelOf(inputs.cable);
    const high = lineFigures(model, [inputs.high_frequency_hz]);
    const low = lineFigures(model, [inputs.low_frequency_hz]);
    const got: Record<string, number> = {
      high_frequency_r_ohm_per_m: high.rOhmPerM[0]!,
      high_frequency_r_asymptote_ohm_per_m: high.rOhmPerM[0]!,
      low_frequency_r_ohm_per_m: low.rOhmPerM[0]!,
      low_frequency_l_h_per_m: low.lHPerM[0]!,
      low_frequency_internal_l_h_per_m: low.lHPerM[0]! - model.lInfHPerM,
      low_frequency_zc_re_ohm: low.zcOhm.re[0]!,
      low_frequency_zc_im_ohm: low.zcOhm.im[0]!,
    };
    for (const [key, value] of Object.entries(expected)) closeTo(got[key]!, value, key);
  },
);

const lossy: LineModel = {
  conductors: [
    { form: "round", r0OhmPerM: 0.03, skinCornerRadPerS: 3e5 },
    { form: "sheet", r0OhmPerM: 0.02, skinCornerRadPerS: 1e6 },
  ],
  lInfHPerM: 2.5e-7,
  cFPerM: 1e-10,
  lossTangent: 0.01,
  g0SPerM: 1e-9,
};

test("γ² is Z·Y and Zc·γ is Z all over the right half plane, with real parts of at least 0", () => {
  fc.assert(
    fc.property(
      fc.double({ min: 0, max: 9, noNaN: true }),
      fc.double({ min: -9.9, max: 9.9, noNaN: true }),
      (damping, order) => {
        const s = { re: damping === 0 ? 0 : 10 ** damping, im: Math.sign(order) * 10 ** Math.abs(order) };
        const { z, y, gamma, zc } = propagation(lossy, s);
        const square = multiply(gamma, gamma);
        const zy = multiply(z, y);
        expect(abs({ re: square.re - zy.re, im: square.im - zy.im })).toBeLessThanOrEqual(1e-13 * abs(zy));
        const back = multiply(zc, gamma);
        expect(abs({ re: back.re - z.re, im: back.im - z.im })).toBeLessThanOrEqual(1e-13 * abs(z));
        expect(gamma.re).toBeGreaterThanOrEqual(0);
        expect(zc.re).toBeGreaterThanOrEqual(0);
        // the root of the product is the product of the roots
        const roots = multiply(sqrt(z), sqrt(y));
        expect(abs({ re: roots.re - gamma.re, im: roots.im - gamma.im })).toBeLessThanOrEqual(1e-13 * abs(gamma));
      },
    ),
  );
});

test("impedance and admittance per metre carry the derivative that a difference shows", () => {
  for (const s of [
    { re: 0, im: 1e5 },
    { re: 1e6, im: 2e6 },
    { re: 0, im: 6e9 },
    { re: 1e4, im: -1e7 },
  ]) {
    const h = 1e-5 * abs(s);
    const up = perMetre(lossy, { re: s.re, im: s.im + h });
    const down = perMetre(lossy, { re: s.re, im: s.im - h });
    const at = perMetre(lossy, s);
    for (const key of ["z", "y"] as const) {
      // d/ds along the imaginary axis: a step j·h in s
      const re = (up[key].im - down[key].im) / (2 * h);
      const im = -(up[key].re - down[key].re) / (2 * h);
      const size = Math.hypot(at[key].slopeRe, at[key].slopeIm);
      expect(Math.hypot(re - at[key].slopeRe, im - at[key].slopeIm)).toBeLessThanOrEqual(1e-7 * size);
    }
  }
});

test("at 1 MHz the capacitance is the one stated and its loss angle the loss tangent, at any loss", () => {
  for (const lossTangent of [0, 1e-4, 0.02, 0.3]) {
    const { y } = perMetre({ ...lossy, lossTangent, g0SPerM: 0 }, { re: 0, im: 2e6 * Math.PI });
    expect(y.im / (2e6 * Math.PI)).toBeCloseTo(1e-10, 22);
    expect(y.re / y.im).toBeCloseTo(lossTangent, 13);
  }
});

test("a lossless line has no attenuation at all and a real impedance", () => {
  const { gamma, zc } = propagation(modelFromNominal({ z0: 75, velocityFactor: 0.66 }), { re: 0, im: 3.3e8 });
  expect(gamma.re).toBe(0);
  expect(zc.im).toBe(0);
  expect(zc.re).toBeCloseTo(75, 12);
});

test("a model from nominal figures gives those figures back, and keeps what else is known", () => {
  fc.assert(
    fc.property(
      fc.double({ min: 1, max: 1000, noNaN: true }),
      fc.double({ min: 0.05, max: 1.2, noNaN: true }),
      (z0, velocityFactor) => {
        const model = modelFromNominal({ z0, velocityFactor, lossTangent: 0.002, conductors: lossy.conductors });
        const figures = nominalFigures(model);
        expect(figures.z0 / z0).toBeCloseTo(1, 13);
        expect(figures.velocityFactor / velocityFactor).toBeCloseTo(1, 13);
        expect(figures.delay * 299_792_458 * velocityFactor).toBeCloseTo(1, 13);
        expect(model.lossTangent).toBe(0.002);
        expect(model.conductors).toBe(lossy.conductors);
      },
    ),
  );
});

test("nominal figures that are not positive are refused by name", () => {
  expect(() => modelFromNominal({ z0: 0, velocityFactor: 0.66 })).toThrow(
    "modelFromNominal: z0 must be positive, got 0",
  );
  expect(() => modelFromNominal({ z0: 50, velocityFactor: NaN })).toThrow(
    "modelFromNominal: velocityFactor must be positive, got NaN",
  );
});
