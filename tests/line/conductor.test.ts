import { describe, expect, test } from "vitest";
import { conductorImpedance } from "@/lib/line/conductor";
import { MU0 } from "@/lib/line/constants";
import type { Conductor, ConductorForm } from "@/lib/line/element";
import { checks } from "@/tests/support/line-checks";
import { closeTo } from "@/tests/support/tolerance";

const omegaOf = (frequency: number) => 2 * Math.PI * frequency;

function swept(terms: Conductor[], frequencies: number[]): { r: number[]; l: number[] } {
  const z = frequencies.map((frequency) => {
    const parts = terms.map((term) => conductorImpedance(term, { re: 0, im: omegaOf(frequency) }));
    return { re: parts.reduce((sum, each) => sum + each.re, 0), im: parts.reduce((sum, each) => sum + each.im, 0) };
  });
  return { r: z.map(({ re }) => re), l: z.map(({ im }, k) => im / omegaOf(frequencies[k]!)) };
}

/** Largest |got/exact − 1|. */
function worst(got: number[], exact: number[]): number {
  return Math.max(...got.map((each, k) => Math.abs(each / exact[k]! - 1)));
}

interface Wire {
  wire_diameter_m: number;
  resistivity_ohm_m: number;
  frequency_hz: number[];
}

test.each(checks<Wire>("internal-impedance"))(
  "a round wire's forms agree with outside, and the exact solution within bounds: $name",
  ({ inputs, expected, bounds }) => {
    const radius = inputs.wire_diameter_m / 2;
    const r0OhmPerM = inputs.resistivity_ohm_m / (Math.PI * radius * radius);
    const skinCornerRadPerS = (4 * inputs.resistivity_ohm_m) / (MU0 * radius * radius);
    closeTo(r0OhmPerM, expected.r0_ohm_per_m!, "r0");
    closeTo(skinCornerRadPerS, expected.skin_corner_rad_per_s!, "corner");
    for (const form of ["round", "sqrt"] as const) {
      const got = swept([{ form, r0OhmPerM, skinCornerRadPerS }], inputs.frequency_hz);
      closeTo(got.r, expected[`${form}_form_r_ohm_per_m`]!, form);
      closeTo(got.l, expected[`${form}_form_internal_l_h_per_m`]!, form);
      const exactR = expected.exact_r_ohm_per_m!.value as number[];
      const exactL = expected.exact_internal_l_h_per_m!.value as number[];
      expect(worst(got.r, exactR)).toBeLessThanOrEqual(bounds![`${form}_form_max_rel_error_r`]!);
      expect(worst(got.l, exactL)).toBeLessThanOrEqual(bounds![`${form}_form_max_rel_error_l`]!);
    }
  },
);

interface Coax {
  inner_diameter_m: number;
  outer_bore_diameter_m: number;
  shield_wall_m: number;
  resistivity_ohm_m: number;
  frequency_hz: number[];
}

test.each(checks<Coax>("coax-conductor-impedance"))(
  "a coax of round and sheet agrees with outside, and the exact tube within bounds: $name",
  ({ inputs, expected, bounds }) => {
    const rho = inputs.resistivity_ohm_m;
    const a = inputs.inner_diameter_m / 2;
    const b = inputs.outer_bore_diameter_m / 2;
    const outerR0 = rho / (Math.PI * ((b + inputs.shield_wall_m) ** 2 - b * b));
    const inner: Conductor = {
      form: "round",
      r0OhmPerM: rho / (Math.PI * a * a),
      skinCornerRadPerS: (4 * rho) / (MU0 * a * a),
    };
    const outer: Conductor = {
      form: "sheet",
      r0OhmPerM: outerR0,
      skinCornerRadPerS: (outerR0 * 2 * Math.PI * b) ** 2 / (MU0 * rho),
    };
    closeTo(inner.r0OhmPerM, expected.inner_r0_ohm_per_m!);
    closeTo(outer.r0OhmPerM, expected.outer_r0_ohm_per_m!);
    closeTo(inner.skinCornerRadPerS!, expected.inner_skin_corner_rad_per_s!);
    closeTo(outer.skinCornerRadPerS!, expected.outer_skin_corner_rad_per_s!);
    const got = swept([inner, outer], inputs.frequency_hz);
    closeTo(got.r, expected.two_conductor_r_ohm_per_m!, "r");
    closeTo(got.l, expected.two_conductor_internal_l_h_per_m!, "l");
    expect(worst(got.r, expected.exact_r_ohm_per_m!.value as number[])).toBeLessThanOrEqual(
      bounds!.two_conductor_max_rel_error_r!,
    );
    expect(worst(got.l, expected.exact_internal_l_h_per_m!.value as number[])).toBeLessThanOrEqual(
      bounds!.two_conductor_max_rel_error_internal_l!,
    );
  },
);

const forms: ConductorForm[] = ["round", "sheet", "sqrt", "constant"];
const term = (form: ConductorForm): Conductor => ({ form, r0OhmPerM: 0.05, skinCornerRadPerS: 4e5 });

describe.each(forms)("the form %s", (form) => {
  test("is its dc resistance at s = 0", () => {
    const { re, im } = conductorImpedance(term(form), { re: 0, im: 0 });
    expect(re).toBe(0.05);
    expect(im).toBe(0);
  });

  test("has the internal inductance of its limit at dc as its derivative there", () => {
    const limit = { round: 0.05 / 8e5, sqrt: 0.05 / 8e5, sheet: 0.05 / 12e5, constant: 0 }[form];
    const { slopeRe, slopeIm } = conductorImpedance(term(form), { re: 0, im: 0 });
    expect(slopeRe).toBeCloseTo(limit, 18);
    expect(slopeIm).toBe(0);
  });

  test("has a resistance of at least that at dc all over the right half plane", () => {
    for (const re of [0, 1e2, 1e5, 1e8])
      for (const im of [-1e9, -1e5, 0, 1e3, 1e5, 1e9]) {
        const z = conductorImpedance(term(form), { re, im });
        expect(z.re).toBeGreaterThanOrEqual(0.05 * (1 - 1e-12));
      }
  });

  test("has the derivative that a difference shows, on the axis and off it", () => {
    for (const s of [
      { re: 0, im: 1e3 },
      { re: 0, im: 4e5 },
      { re: 2e5, im: 1e6 },
      { re: 1e4, im: -3e8 },
      { re: 3e4, im: 0 },
    ]) {
      const h = 1e-5 * Math.hypot(s.re, s.im);
      const up = conductorImpedance(term(form), { re: s.re + h, im: s.im });
      const down = conductorImpedance(term(form), { re: s.re - h, im: s.im });
      const { slopeRe, slopeIm } = conductorImpedance(term(form), s);
      const size = Math.hypot(slopeRe, slopeIm);
      expect(
        Math.hypot((up.re - down.re) / (2 * h) - slopeRe, (up.im - down.im) / (2 * h) - slopeIm),
      ).toBeLessThanOrEqual(2e-6 * size);
    }
  });
});

test("far above the corner every form but the constant one has R0·√(ω/2ωs)", () => {
  const omega = 4e5 * 1e8;
  for (const form of ["round", "sheet", "sqrt"] as const) {
    const { re } = conductorImpedance(term(form), { re: 0, im: omega });
    expect(re / (0.05 * Math.sqrt(omega / 8e5))).toBeCloseTo(1, 3);
  }
});

test("a conductor without resistance is no impedance, whatever its form", () => {
  expect(conductorImpedance({ form: "round", r0OhmPerM: 0 }, { re: 0, im: 1e6 }).re).toBe(0);
});

test("a form that needs a skin corner is refused without one", () => {
  expect(() => conductorImpedance({ form: "round", r0OhmPerM: 1 }, { re: 0, im: 1 })).toThrow(
    /conductorImpedance: skinCornerRadPerS.*undefined/,
  );
  expect(() => conductorImpedance({ form: "sqrt", r0OhmPerM: 1, skinCornerRadPerS: NaN }, { re: 0, im: 1 })).toThrow(
    RangeError,
  );
});
