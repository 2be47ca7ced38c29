import { expect, test } from "vitest";
import { modelFromNominal, nominalFigures, propagation } from "@/lib/line/cable";
import { COPPER_RESISTIVITY, COPPER_TEMPERATURE_COEFFICIENT, DB_PER_NEPER, SPEED_OF_LIGHT } from "@/lib/line/constants";
import { conductorImpedance } from "@/lib/line/conductor";
import { divide, multiply, sqrt, subtract, type Complex } from "@/lib/line/complex";
import type { LineModel } from "@/lib/line/element";
import { lineFigures } from "@/lib/line/line-figures";
import { agrees, complexOf, number, published, type PublishedCheck } from "@/tests/support/published";

/** A line of constant R, L, G, C, each per the same length. */
function constantLine(r: number, l: number, g: number, c: number): LineModel {
  return { conductors: [{ form: "constant", r0OhmPerM: r }], lInfHPerM: l, cFPerM: c, g0SPerM: g };
}

function at(model: LineModel, frequency: number) {
  const { gamma, zc } = propagation(model, { re: 0, im: 2 * Math.PI * frequency });
  return { gamma: { re: gamma.re, im: gamma.im } as Complex, zc };
}

const each = (choose: (id: string, topic: string) => boolean) =>
  published(choose).map((check) => [`${check.id}: ${check.source}`, check] as [string, PublishedCheck]);

test.each(each((_id, topic) => topic === "RLGC to Zc and gamma"))(
  "R, L, G, C give impedance and propagation constant as printed: %s",
  (_name, check) => {
    const { inputs, expected } = check;
    const { gamma, zc } = at(
      constantLine(number(inputs, "R"), number(inputs, "L"), number(inputs, "G"), number(inputs, "C")),
      number(inputs, "f_Hz"),
    );
    const got = { Zc: zc, Zc_rect: zc, gamma, alpha_Np: gamma.re, beta_rad: gamma.im };
    agrees(check, Object.fromEntries(Object.entries(got).filter(([key]) => key in expected)));
  },
);

/** Checks that stand alone; each answers with what its `expected` holds. */
const single: Record<string, (inputs: PublishedCheck["inputs"]) => Parameters<typeof agrees>[1]> = {
  "D01-blake-14.1": (inputs) => {
    const z0 = number(inputs, "Z0_ohm");
    const velocityFactor = 1 / (z0 * number(inputs, "C_F_per_m") * SPEED_OF_LIGHT);
    return { L_H_per_m: modelFromNominal({ z0, velocityFactor }).lInfHPerM };
  },
  "D06-stanley-14.4": (inputs) => {
    const { z0, delay } = nominalFigures(constantLine(0, number(inputs, "L_H_per_m"), 0, number(inputs, "C_F_per_m")));
    return { Z0_ohm: z0, v_m_per_s: 1 / delay };
  },
  "D09-beasley-12.1": (inputs) => ({
    Z0_ohm: nominalFigures(
      constantLine(0, number(inputs, "L_nH_per_ft") * 1e-9, 0, number(inputs, "C_pF_per_ft") * 1e-12),
    ).z0,
  }),
  "D27-bird-44.8": (inputs) => {
    const model = constantLine(0, number(inputs, "L_H_per_km"), 0, number(inputs, "C_F_per_km"));
    const { gamma, zc } = at(model, number(inputs, "f_Hz"));
    const wavelength = (2 * Math.PI) / gamma.im;
    return {
      Z0_ohm: zc.re,
      beta_rad_per_km: gamma.im,
      lambda_m: wavelength * 1000,
      v_km_per_s: wavelength * number(inputs, "f_Hz"),
    };
  },
  "D31-bird-44.12": (inputs) => {
    const [r, g, c] = [number(inputs, "R"), number(inputs, "G"), number(inputs, "C")];
    const l = (r * c) / g;
    const { gamma } = at(constantLine(r, l, g, c), number(inputs, "f_Hz"));
    const wavelength = (2 * Math.PI) / gamma.im;
    return {
      L_H: l,
      alpha_Np: gamma.re,
      beta_rad: gamma.im,
      v_km_per_s: wavelength * number(inputs, "f_Hz"),
      lambda_km: wavelength,
    };
  },
  "D32-bird-44.6": (inputs) => ({ Zc: sqrt(multiply(complexOf(inputs.Zoc), complexOf(inputs.Zsc))) }),
  "D33-misra-3.9": (inputs) => {
    const [open, short, input] = [complexOf(inputs.Zoc), complexOf(inputs.Zsc), complexOf(inputs.Zin)];
    // from Zin = (ZL + Zsc)·Zoc / (ZL + Zoc): the far end seen through the line
    const load = divide(multiply(open, subtract(input, short)), subtract(open, input));
    return { Z0_ohm: sqrt(multiply(open, short)).re, ZL: load };
  },
  "D35-roddy-13.5.2": (inputs) => ({ alpha_dB_per_m: number(inputs, "alpha_Np_per_m") * DB_PER_NEPER }),
  "A-johnson-graham": (inputs) => {
    const z0 = number(inputs, "Z0_ohm");
    const r = number(inputs, "R0_ohm_per_m_10MHz") * Math.sqrt(number(inputs, "f_MHz") / 10);
    const model = modelFromNominal({ z0, velocityFactor: 0.7, conductors: [{ form: "constant", r0OhmPerM: r }] });
    return { loss_dB_per_100m: 100 * lineFigures(model, [number(inputs, "f_MHz") * 1e6]).attenuationDbPerM[0]! };
  },
  "B-copper": () => ({ rho_20C: COPPER_RESISTIVITY }),
};

test.each(each((id) => id in single))("a line's figures agree with print: %s", (_name, check) => {
  agrees(check, single[check.id]!(check.inputs));
});

test.each(
  each((id, topic) => topic === "distortionless line" || id === "D19-misra-3.8").filter(
    ([name]) => !name.startsWith("D31"),
  ),
)(
  "printed constants of a distortionless line give back its attenuation, impedance and velocity: %s",
  (_name, { inputs, expected, tolerance }) => {
    const c = "C_pF_per_m" in expected ? number(expected, "C_pF_per_m") * 1e-12 : number(inputs, "C_F_per_m");
    const model = constantLine(
      number(expected, "R_ohm_per_m"),
      number(expected, "L_nH_per_m") * 1e-9,
      number(expected, "G_uS_per_m") * 1e-6,
      c,
    );
    for (const frequency of [1e6, 1e8]) {
      const { gamma, zc } = at(model, frequency);
      expect(Math.abs(gamma.re / number(inputs, "alpha_Np_per_m") - 1)).toBeLessThan(tolerance.rel!);
      expect(Math.abs(zc.re / number(inputs, "Z0_ohm") - 1)).toBeLessThan(tolerance.rel!);
      const velocity = "v_over_c" in inputs ? number(inputs, "v_over_c") * 3e8 : number(expected, "v_m_per_s");
      expect(Math.abs((2 * Math.PI * frequency) / gamma.im / velocity - 1)).toBeLessThan(tolerance.rel!);
    }
  },
);

test.each(each((_id, topic) => topic === "loading for minimum distortion"))(
  "with the printed loading a line loses √(RG) at every frequency: %s",
  (_name, { inputs, expected, tolerance }) => {
    const [r, g] = [number(inputs, "R_ohm_per_km"), number(inputs, "G_uS_per_km") * 1e-6];
    const l = (number(inputs, "L_mH_per_km") + number(expected, "added_L_mH_per_km")) * 1e-3;
    const model = constantLine(r, l, g, number(inputs, "C_uF_per_km") * 1e-6);
    for (const frequency of [300, 3400])
      expect(Math.abs(at(model, frequency).gamma.re / Math.sqrt(r * g) - 1)).toBeLessThan(tolerance.rel!);
  },
);

test.each(each((id) => id === "C-round-wire"))(
  "the √ form is off from the exact round wire by what is published: %s",
  (_name, { inputs, expected, tolerance }) => {
    const relative = (ratio: number) =>
      conductorImpedance({ form: "sqrt", r0OhmPerM: 1, skinCornerRadPerS: 1 }, { re: 0, im: ratio ** 2 / 2 });
    (inputs.a_over_delta as number[]).forEach((ratio, k) => {
      const published = (expected.R_over_R0_sqrt_model as number[])[k]!;
      expect(Math.abs(relative(ratio).re / published - 1)).toBeLessThan(tolerance.rel!);
      // and the round form stays within its own bounds of the exact values
      const round = conductorImpedance(
        { form: "round", r0OhmPerM: 1, skinCornerRadPerS: 1 },
        { re: 0, im: ratio ** 2 / 2 },
      );
      expect(Math.abs(round.re / (expected.R_over_R0_exact as number[])[k]! - 1)).toBeLessThan(0.0131);
      expect(Math.abs(round.im / (expected.Xint_over_R0_exact as number[])[k]! - 1)).toBeLessThan(0.0197);
    });
  },
);

test.each(each((id) => id === "C-model-gap"))(
  "the √ form lies above the fourth-root form by what is published: %s",
  (_name, { expected, tolerance }) => {
    const corner = number(expected, "ws_rad_per_s");
    const { re } = conductorImpedance(
      { form: "sqrt", r0OhmPerM: 1, skinCornerRadPerS: corner },
      { re: 0, im: 2 * Math.PI * number(expected, "at_f_Hz") },
    );
    // R = (R0⁴ + a·f²)^¼ with the same limits has a·f² = (ω/2ωs)²
    const fourthRoot = (1 + ((2 * Math.PI * number(expected, "at_f_Hz")) / (2 * corner)) ** 2) ** 0.25;
    expect(Math.abs((re / fourthRoot - 1) * 100 - number(expected, "max_excess_percent"))).toBeLessThan(
      tolerance.rel! * 100,
    );
  },
);

test("the copper constants are the published ones at every temperature", () => {
  const check = published((id) => id === "B-copper")[0]!;
  const ratios = (check.inputs.T_C as number[]).map((celsius) => 1 + COPPER_TEMPERATURE_COEFFICIENT * (celsius - 20));
  expect(ratios[0]! * COPPER_RESISTIVITY).toBeCloseTo(1.588586e-8, 14);
  expect(Math.sqrt(ratios[3]!)).toBeCloseTo(1.075732, 6);
});
