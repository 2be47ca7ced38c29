import { test } from "vitest";
import { complex, multiply, reciprocal, scale, type Complex } from "@/lib/line/complex";
import { DB_PER_NEPER } from "@/lib/line/constants";
import type { Circuit, LineModel } from "@/lib/line/element";
import { portImpedance } from "@/lib/line/termination";
import { portAt, prepareRun, walk } from "@/lib/line/walk";
import { agrees, complexOf, number, published, type PublishedCheck } from "@/tests/support/published";

type Inputs = PublishedCheck["inputs"];
type Got = Parameters<typeof agrees>[1];

const each = (choose: (id: string, topic: string) => boolean) =>
  published(choose).map((check) => [`${check.id}: ${check.source}`, check] as [string, PublishedCheck]);

/** A line of given impedance and propagation at one frequency, made of constants. */
function lineOf(zc: Complex, gamma: Complex, frequency: number): LineModel {
  const omega = 2 * Math.PI * frequency;
  const z = multiply(gamma, zc);
  const y = multiply(gamma, reciprocal(zc));
  return {
    conductors: [{ form: "constant", r0OhmPerM: z.re }],
    lInfHPerM: z.im / omega,
    g0SPerM: y.re,
    cFPerM: y.im / omega,
  };
}

/** Voltages and currents at the ends of the lengths of such a line, for an e.m.f. behind a resistance. */
function driven(zc: Complex, gamma: Complex, lengths: number[], load: Complex, emf: number, source = 0) {
  const frequency = 1e6;
  const line = { model: lineOf(zc, gamma, frequency) };
  const circuit: Circuit = {
    source: { kind: "constant", reOhm: source, imOhm: 0 },
    elements: lengths.map((lengthM) => ({ kind: "cable", line, lengthM })),
    load: { kind: "constant", reOhm: load.re, imOhm: load.im },
  };
  const at = walk(prepareRun(circuit), { re: 0, im: 2 * Math.PI * frequency });
  const { scales, drive } = at;
  const planes = Array.from({ length: lengths.length + 1 }, (_, k) => portAt(at, k));
  const unit = (k: number) =>
    scale(reciprocal(drive), emf * Math.exp(-scales.slice(0, k).reduce((sum, each) => sum + each, 0)));
  return {
    input: portImpedance(planes[0]!),
    voltages: planes.map(({ v }, k) => multiply(v, unit(k))),
    currents: planes.map(({ i }, k) => multiply(i, unit(k))),
  };
}

const single: Record<string, (inputs: Inputs) => Got> = {
  "D28-bird-44.3": (inputs) => {
    const gamma = complex(number(inputs, "alpha_Np_per_km"), number(inputs, "beta_rad_per_km"));
    const { voltages } = driven(
      complex(50),
      gamma,
      [number(inputs, "length_km")],
      complex(50),
      number(inputs, "V_send"),
    );
    return { V_recv: voltages[1]! };
  },
  "D29-bird-44.4": (inputs) => {
    const zc = complexOf(inputs.Z0_ohm);
    const gamma = complex(number(inputs, "alpha_times_length_Np"), number(inputs, "beta_times_length_rad"));
    return { I_recv_mA: scale(driven(zc, gamma, [1], zc, number(inputs, "V_send")).currents[1]!, 1000) };
  },
  "D36-sadiku-11.3": (inputs) => {
    const gamma = complex(number(inputs, "alpha_dB_per_m") / DB_PER_NEPER, number(inputs, "beta_rad_per_m"));
    const half = number(inputs, "length_m") / 2;
    const source = number(inputs, "Zg_ohm");
    const { input, currents } = driven(
      complexOf(inputs.Zc),
      gamma,
      [half, half],
      complexOf(inputs.ZL),
      number(inputs, "Vg_V"),
      source,
    );
    return { Zin: input, Is_mA: scale(currents[0]!, 1000), Imid_mA: scale(currents[1]!, 1000) };
  },
};

test.each(each((id) => id in single))("a line with loss agrees with print: %s", (_name, check) => {
  agrees(check, single[check.id]!(check.inputs));
});
