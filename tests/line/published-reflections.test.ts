import { expect, test } from "vitest";
import { modelFromNominal } from "@/lib/line/cable";
import { abs, arg, complex, multiply, polar, reciprocal, scale, type Complex } from "@/lib/line/complex";
import { SPEED_OF_LIGHT } from "@/lib/line/constants";
import type { Circuit } from "@/lib/line/element";
import { impedanceOfReflection, magnitudeOfVswr, reflection, returnLossDb, vswr } from "@/lib/line/reflection";
import { sweep } from "@/lib/line/run";
import { standingWave } from "@/lib/line/standing-wave";
import { agrees, complexOf, number, published, type PublishedCheck } from "@/tests/support/published";

type Inputs = PublishedCheck["inputs"];
type Got = Parameters<typeof agrees>[1];

const each = (choose: (id: string, topic: string) => boolean) =>
  published(choose).map((check) => [`${check.id}: ${check.source}`, check] as [string, PublishedCheck]);

/** A lossless run of one line and a load, at a frequency where a metre is `wavelengths` long. */
function lossless(z0: number, load: Complex, length: number, source = z0): Circuit {
  return {
    source: { kind: "constant", reOhm: source, imOhm: 0 },
    elements: [{ kind: "cable", line: { model: modelFromNominal({ z0, velocityFactor: 1 }) }, lengthM: length }],
    load: { kind: "constant", reOhm: load.re, imOhm: load.im },
  };
}

/** Frequency at which a line of velocity factor 1 has a wavelength of 1 m. */
const oneMetreWave = SPEED_OF_LIGHT;

function losslessInput(z0: number, load: Complex, wavelengths: number) {
  const { inputImpedance } = sweep(lossless(z0, load, wavelengths), [oneMetreWave]);
  return { re: inputImpedance.re[0]!, im: inputImpedance.im[0]! };
}

test.each(each((_id, topic) => topic === "reflection, VSWR, return loss"))(
  "reflection, VSWR and return loss of a load agree with print: %s",
  (_name, check) => {
    const gamma = reflection(complexOf(check.inputs.ZL), complex(number(check.inputs, "Z0_ohm")));
    const got = { gamma, gamma_rect: gamma, vswr: vswr(abs(gamma)), return_loss_dB: returnLossDb(abs(gamma)) };
    agrees(check, Object.fromEntries(Object.entries(got).filter(([key]) => key in check.expected)));
  },
);

test.each(each((_id, topic) => topic === "voltage maximum on a mismatched line"))(
  "the highest voltage and current of a standing wave agree with the derivation: %s",
  (_name, check) => {
    const { inputs } = check;
    const [z0, ratio, delivered] = [number(inputs, "Z0_ohm"), number(inputs, "vswr"), number(inputs, "P_W")];
    // a load of z0/VSWR at the end of 1.3 wavelengths; the source gives what leaves the wanted power in the load
    const available = delivered / (1 - magnitudeOfVswr(ratio) ** 2);
    const wave = standingWave(lossless(z0, { re: z0 / ratio, im: 0 }, 1.3), oneMetreWave, available, {
      pointsPerElement: 5,
    });
    expect(wave.loadPowerW / delivered).toBeCloseTo(1, 12);
    agrees(
      { ...check, tolerance: { rel: 1e-6 } },
      {
        Vmax_rms_V: wave.maxVoltageV,
        Vmax_peak_V: wave.maxVoltageV * Math.SQRT2,
        Imax_rms_A: wave.maxCurrentA,
        // mean of I² over the squared current of a matched line, over whole half waves: (S + 1/S)/2
        mean_I2R_factor: meanSquareFactor(z0, ratio, delivered),
      },
    );
  },
);

/** Mean of I²·z0 over one half wave, relative to the delivered power, by summing over equal steps. */
function meanSquareFactor(z0: number, ratio: number, delivered: number): number {
  const available = delivered / (1 - magnitudeOfVswr(ratio) ** 2);
  const { currentA } = standingWave(lossless(z0, { re: z0 / ratio, im: 0 }, 0.5), oneMetreWave, available, {
    pointsPerElement: 65,
  });
  // the ends are the same place of the pattern: one of them counts
  return currentA.slice(1).reduce((sum, current) => sum + current * current, 0) / 64 / (delivered / z0);
}

const single: Record<string, (inputs: Inputs) => Got> = {
  "D37-sadiku-11.4": (inputs) =>
    ofLossless(inputs, (number(inputs, "length_m") * number(inputs, "f_Hz")) / number(inputs, "v_m_per_s")),
  "D38-sadiku-11.5": (inputs) => ({
    ...ofLossless(inputs, number(inputs, "length_wavelengths")),
    YL_mS: scale(reciprocal(complexOf(inputs.ZL)), 1000),
  }),
  "D39-misra-3.11": (inputs) => {
    const wavelengths = (number(inputs, "length_m") * number(inputs, "f_Hz")) / number(inputs, "v_m_per_s");
    const circuit = lossless(number(inputs, "Z0_ohm"), complexOf(inputs.ZL), wavelengths, number(inputs, "Zg_ohm"));
    const { inputImpedance, loadVoltage } = sweep(circuit, [oneMetreWave]);
    const input = complex(inputImpedance.re[0]!, inputImpedance.im[0]!);
    const emf = number(inputs, "Vg_V");
    const atInput = scale(multiply(input, reciprocal(complex(input.re + number(inputs, "Zg_ohm"), input.im))), emf);
    const atLoad = complex(loadVoltage.re[0]! * emf, loadVoltage.im[0]! * emf);
    // the print's 80.13° is a slip by a half turn, as the check notes
    expect((arg(atLoad) * 180) / Math.PI).toBeCloseTo(-99.8699, 3);
    return {
      beta_rad_per_m: (2 * Math.PI * wavelengths) / number(inputs, "length_m"),
      Zin: input,
      VA: atInput,
      VL_mag: abs(atLoad),
    };
  },
  "D48-bird-44.18": (inputs) => ({
    reflected_mW: number(inputs, "incident_mW") * magnitudeOfVswr(number(inputs, "vswr")) ** 2,
  }),
  "D50-blake-14.20": (inputs) => ({
    vswr: vswr(Math.sqrt(number(inputs, "reflected_W") / number(inputs, "forward_W"))),
  }),
  "D53-frenzel-13.5": (inputs) => {
    const ratio = number(inputs, "Vmax") / number(inputs, "Vmin");
    const magnitude = magnitudeOfVswr(ratio);
    const resistance = (sign: number) => impedanceOfReflection(complex(sign * magnitude), number(inputs, "Z0_ohm")).re;
    return { vswr: vswr(magnitude), gamma_mag: magnitude, RL_high_ohm: resistance(1), RL_low_ohm: resistance(-1) };
  },
  "D54-frenzel-13.6": (inputs) => ({
    load_W: number(inputs, "forward_W") * (1 - magnitudeOfVswr(number(inputs, "vswr")) ** 2),
  }),
  "D56-beasley-12.7": (inputs) => {
    const magnitude = abs(reflection(complex(number(inputs, "ZL_ohm")), complex(number(inputs, "Z0_ohm"))));
    const wavelengths = (number(inputs, "length_m") * number(inputs, "f_Hz")) / number(inputs, "v_m_per_s");
    return {
      gamma: magnitude,
      length_wavelengths: wavelengths,
      vswr: vswr(magnitude),
      load_W: number(inputs, "forward_W") * (1 - magnitude ** 2),
    };
  },
  "D57-roddy-13.11.1": (inputs) => ({
    Xin_ohm: losslessInput(number(inputs, "Z0_ohm"), complex(0), number(inputs, "length_wavelengths")).im,
  }),
  "D58-roddy-13.17.2": (inputs) => ({
    Zin: losslessInput(
      number(inputs, "Z0_ohm"),
      complexOf(inputs.ZL),
      number(inputs, "length_m") / number(inputs, "lambda_m"),
    ),
  }),
  "D60-pozar-2.4": (inputs) => {
    const gamma = fromMinimum(number(inputs, "vswr"), number(inputs, "lmin_cm") / number(inputs, "lambda_cm"));
    return { gamma, ZL: impedanceOfReflection(gamma, number(inputs, "Z0_ohm")) };
  },
  "D64-liao-3.5.2": (inputs) => ({
    ZL: impedanceOfReflection(
      fromMinimum(number(inputs, "vswr"), number(inputs, "lmin_wavelengths")),
      number(inputs, "Z0_ohm"),
    ),
  }),
  "D65-liao-3.5.1": (inputs) => {
    // the highest voltage is where a wave of one metre says, on a line that ends at the load
    const circuit = lossless(50, scale(complexOf(inputs.zL), 50), 0.45);
    const { maxVoltageAtM, maxCurrentAtM } = standingWave(circuit, oneMetreWave, 1, { pointsPerElement: 3 });
    return {
      dmax_wavelengths: 0.45 - maxVoltageAtM,
      dmin_wavelengths: 0.45 - maxCurrentAtM,
      vswr: vswr(abs(reflection(complexOf(inputs.zL), complex(1)))),
    };
  },
};

/** Reflection at a load whose first voltage minimum stands so many wavelengths before it. */
function fromMinimum(ratio: number, wavelengths: number) {
  return polar(magnitudeOfVswr(ratio), Math.PI + 4 * Math.PI * wavelengths);
}

function ofLossless(inputs: Inputs, wavelengths: number): Got {
  const gamma = reflection(complexOf(inputs.ZL), complex(number(inputs, "Z0_ohm")));
  return {
    gamma,
    vswr: vswr(abs(gamma)),
    Zin: losslessInput(number(inputs, "Z0_ohm"), complexOf(inputs.ZL), wavelengths),
  };
}

test.each(each((id) => id in single))("a mismatched line agrees with print: %s", (_name, check) => {
  agrees(check, single[check.id]!(check.inputs));
});
