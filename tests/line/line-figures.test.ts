import { expect, test } from "vitest";
import { lineFigures } from "@/lib/line/line-figures";
import { atTemperature } from "@/lib/line/temperature";
import { bothForms, modelOf, type CheckCable } from "@/tests/support/line-checks";
import { closeTo, type Expected } from "@/tests/support/tolerance";

interface Inputs {
  cable: CheckCable;
  frequency_hz: number[];
}

function compare(inputs: Inputs, expected: Record<string, Expected>) {
  const figures = lineFigures(modelOf(inputs.cable), inputs.frequency_hz, inputs.cable.temperature_c);
  const got: Record<string, ArrayLike<number>> = {
    r_ohm_per_m: figures.rOhmPerM,
    l_h_per_m: figures.lHPerM,
    g_s_per_m: figures.gSPerM,
    c_f_per_m: figures.cFPerM,
    alpha_db_per_m: figures.attenuationDbPerM,
    beta_rad_per_m: figures.phaseRadPerM,
    zc_re_ohm: figures.zcOhm.re,
    zc_im_ohm: figures.zcOhm.im,
    phase_velocity_m_per_s: figures.phaseVelocityMPerS,
    // the check's delay is that of the phase: β/ω
    delay_ns_per_m: figures.phaseVelocityMPerS.map((velocity) => 1e9 / velocity),
    velocity_factor: figures.velocityFactor,
  };
  for (const [key, value] of Object.entries(expected)) closeTo(got[key]!, value, key);
}

test.each(bothForms<Inputs>("secondary-parameters"))(
  "secondary parameters agree with the outside values: $name",
  ({ inputs, expected }) => {
    compare(inputs, expected);
  },
);

test.each(bothForms<Inputs>("temperature"))(
  "temperature moves resistance, inductance, loss and impedance as outside: $name",
  ({ inputs, expected }) => {
    const { resistivity_ratio, ...figures } = expected;
    closeTo(atTemperature(modelOf(inputs.cable), inputs.cable.temperature_c).resistivityRatio, resistivity_ratio!);
    compare(inputs, figures);
  },
);

test("group delay per metre is the derivative of the phase constant", () => {
  for (const { inputs } of bothForms<Inputs>("secondary-parameters")) {
    const step = 1e-4;
    for (const frequency of [1e4, 1e6, 1e8]) {
      const { phaseRadPerM, groupDelaySPerM } = lineFigures(modelOf(inputs.cable), [
        frequency * (1 - step),
        frequency,
        frequency * (1 + step),
      ]);
      const difference = (phaseRadPerM[2]! - phaseRadPerM[0]!) / (4 * Math.PI * frequency * step);
      // a central difference of relative step 1e-4 is itself off by about its square
      expect(groupDelaySPerM[1]! / difference).toBeCloseTo(1, 7);
    }
  }
});

test("a frequency that is not positive is refused by name", () => {
  const model = modelOf(bothForms<Inputs>("temperature")[0]!.inputs.cable);
  for (const frequency of [0, -1, NaN])
    expect(() => lineFigures(model, [1e6, frequency])).toThrow(/lineFigures: frequencies.*positive/);
});
