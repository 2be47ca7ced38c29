import { expect, test } from "vitest";
import { modelFromNominal, nominalFigures, propagation } from "@/lib/line/cable";
import { DB_PER_NEPER, SPEED_OF_LIGHT } from "@/lib/line/constants";
import type { Complex } from "@/lib/line/complex";
import type { LineModel } from "@/lib/line/element";
import { agrees, number, published, type PublishedCheck } from "@/tests/support/published";

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

test.each(each((_id, topic) => topic === "parametric pair model" || topic.startsWith("24 AWG PIC")))(
  "a telephone pair's primary constants give its impedance and loss: %s",
  (_name, check) => {
    const values = { ...check.inputs, ...check.expected };
    const { gamma, zc } = at(
      constantLine(
        number(values, "R_ohm_per_km"),
        number(values, "L_uH_per_km") * 1e-6,
        number(values, "G_uS_per_km") * 1e-6,
        number(values, "C_nF_per_km") * 1e-9,
      ),
      number(values, "f_Hz"),
    );
    const { Zc, atten_dB_per_km, beta_rad_per_km } = check.expected;
    const expected = { Zc: Zc!, atten_dB_per_km: atten_dB_per_km!, beta_rad_per_km: beta_rad_per_km! };
    agrees({ ...check, expected }, { Zc: zc, atten_dB_per_km: gamma.re * DB_PER_NEPER, beta_rad_per_km: gamma.im });
  },
);

test.each(each((_id, topic) => topic === "G.9701-type pair model"))(
  "a data pair's constants give its impedance and loss: %s",
  (_name, check) => {
    const { inputs, expected } = check;
    const frequency = number(inputs, "f_Hz");
    const c = number(expected, "C_pF_per_m") * 1e-12;
    // the form's dielectric has the constant loss angle phi
    const g = 2 * Math.PI * frequency * c * Math.tan((inputs.params as Record<string, number>).phi!);
    const { gamma, zc } = at(
      constantLine(number(expected, "R_ohm_per_m"), number(expected, "L_nH_per_m") * 1e-9, g, c),
      frequency,
    );
    const { Zc, atten_dB_per_100m } = expected;
    agrees(
      { ...check, expected: { Zc: Zc!, atten_dB_per_100m: atten_dB_per_100m! } },
      { Zc: zc, atten_dB_per_100m: gamma.re * DB_PER_NEPER * 100 },
    );
  },
);

test.each(each((_id, topic) => topic.startsWith("Z0 consistency") || topic === "Z0 from velocity and capacitance"))(
  "velocity factor and capacitance give the nominal impedance: %s",
  (_name, check) => {
    const { inputs } = check;
    const velocityFactor = "VF" in inputs ? number(inputs, "VF") : number(inputs, "VP_percent") / 100;
    const capacitance = (number(inputs, "C_pF_per_ft") * 1e-12) / 0.3048;
    const inductance = 1 / (capacitance * (SPEED_OF_LIGHT * velocityFactor) ** 2);
    const { z0 } = nominalFigures(constantLine(0, inductance, 0, capacitance));
    const back = modelFromNominal({ z0, velocityFactor });
    expect(back.cFPerM / capacitance).toBeCloseTo(1, 12);
    const key = "nominal_Z0_ohm" in check.expected ? "nominal_Z0_ohm" : "Z0_ohm";
    agrees({ ...check, expected: { [key]: check.expected[key]! } }, { [key]: z0 });
  },
);
