import fc from "@/tests/support/property";
import { describe, expect, test } from "vitest";
import { modelFromNominal } from "@/lib/line/cable";
import type { Circuit } from "@/lib/line/element";
import { lineFigures } from "@/lib/line/line-figures";
import { sweep } from "@/lib/line/run";
import { standingWave } from "@/lib/line/standing-wave";
import { anyFrequency, anyRun } from "@/tests/support/arbitrary-run";
import { bothForms, modelOf, terminationOf, type CheckCable, type CheckTermination } from "@/tests/support/line-checks";
import { closeTo, type Expected } from "@/tests/support/tolerance";

interface Inputs {
  cable: CheckCable;
  length_m: number;
  source: CheckTermination;
  load: CheckTermination;
  frequency_hz: number;
  source_emf_v_rms: number;
  position_from_source_m: number[];
}

/** Magnitude of a complex expectation, off by at most what its parts may be off. */
function magnitude(re: Expected, im: Expected): Expected {
  const value = (re.value as number[]).map((each, k) => Math.hypot(each, (im.value as number[])[k]!));
  return { value, rel_tolerance: re.rel_tolerance * 2, abs_tolerance: re.abs_tolerance * 2 };
}

test.each(bothForms<Inputs>("standing-wave-profile"))(
  "voltage and current along a cable agree with outside: $name",
  ({ inputs, expected }) => {
    const circuit: Circuit = {
      source: terminationOf(inputs.source),
      elements: [
        {
          kind: "cable",
          line: { model: modelOf(inputs.cable) },
          lengthM: inputs.length_m,
          temperatureC: inputs.cable.temperature_c,
        },
      ],
      load: terminationOf(inputs.load),
    };
    const available = inputs.source_emf_v_rms ** 2 / (4 * inputs.source.re_ohm!);
    const got = standingWave(circuit, inputs.frequency_hz, available, {
      pointsPerElement: inputs.position_from_source_m.length,
    });
    closeTo(
      got.positionM,
      { value: inputs.position_from_source_m, rel_tolerance: 1e-12, abs_tolerance: 1e-12 },
      "position",
    );
    closeTo(got.voltageV, magnitude(expected.voltage_re_v!, expected.voltage_im_v!), "voltage");
    closeTo(got.currentA, magnitude(expected.current_re_a!, expected.current_im_a!), "current");
    closeTo(got.maxVoltageV, expected.voltage_peak_v!, "highest voltage");
    closeTo(got.maxVoltageAtM, expected.voltage_peak_position_m!, "where");
    closeTo(got.maxCurrentA, expected.current_peak_a!, "highest current");
    closeTo(got.inputPowerW, expected.power_into_cable_w!, "power into the cable");
    closeTo(got.loadPowerW, expected.power_into_load_w!, "power into the load");
    const dense = standingWave(circuit, inputs.frequency_hz, available, { pointsPerElement: 4001 });
    closeTo(Math.min(...dense.voltageV), expected.voltage_trough_v!, "lowest voltage");
  },
);

const rope = modelFromNominal({
  z0: 50,
  velocityFactor: 0.66,
  lossTangent: 3e-4,
  conductors: [{ form: "round", r0OhmPerM: 0.05, skinCornerRadPerS: 2.4e5 }],
});

function run(elements: Circuit["elements"], reOhm = 22, imOhm = -35): Circuit {
  return { source: { kind: "constant", reOhm: 50, imOhm: 0 }, elements, load: { kind: "constant", reOhm, imOhm } };
}

const cable = (lengthM: number) => ({ kind: "cable" as const, line: { model: rope }, lengthM });

describe("energy", () => {
  test("power into the run is what the elements and the load take, for any run", () => {
    fc.assert(
      fc.property(anyRun, anyFrequency, (circuit, frequency) => {
        const got = standingWave(circuit, frequency, 10, { pointsPerElement: 2 });
        const spent = got.elements.reduce((sum, { dissipatedW }) => sum + dissipatedW, got.loadPowerW);
        expect(Math.abs(got.inputPowerW - spent)).toBeLessThanOrEqual(1e-12 * got.inputPowerW);
        for (const { dissipatedW } of got.elements) expect(dissipatedW).toBeGreaterThanOrEqual(0);
        expect(got.inputPowerW).toBeLessThanOrEqual(10 * (1 + 1e-9));
      }),
      { numRuns: 200 },
    );
  });

  test("the powers are those the sweep's losses say, for any run", () => {
    fc.assert(
      fc.property(anyRun, anyFrequency, (circuit, frequency) => {
        const wave = standingWave(circuit, frequency, 10, { pointsPerElement: 2 });
        const swept = sweep(circuit, [frequency]);
        const relative = (power: number, lossDb: number) => Math.abs(power - 10 * 10 ** (-lossDb / 10));
        expect(relative(wave.inputPowerW, swept.mismatchLossDb[0]!)).toBeLessThanOrEqual(1e-9 * 10);
        expect(relative(wave.loadPowerW, swept.transducerLossDb[0]!)).toBeLessThanOrEqual(
          1e-9 * wave.loadPowerW + 1e-300,
        );
      }),
      { numRuns: 200 },
    );
  });

  test("what a cable dissipates is what its resistance and leakage take along it", () => {
    const frequency = 27.2e6;
    const got = standingWave(run([cable(36)]), frequency, 200, { pointsPerElement: 20_001 });
    const { rOhmPerM, gSPerM } = lineConstants(frequency);
    const density = got.positionM.map((_, k) => rOhmPerM * got.currentA[k]! ** 2 + gSPerM * got.voltageV[k]! ** 2);
    const step = 36 / 20_000;
    const summed = density.reduce((sum, each) => sum + each, 0) * step - ((density[0]! + density[20_000]!) / 2) * step;
    expect(summed / got.elements[0]!.dissipatedW).toBeCloseTo(1, 6);
  });
});

function lineConstants(frequency: number) {
  const swept = lineFigures(rope, [frequency]);
  return { rOhmPerM: swept.rOhmPerM[0]!, gSPerM: swept.gSPerM[0]! };
}

describe("maxima", () => {
  test("no sampled point is above the maxima, and they lie where they say", () => {
    fc.assert(
      fc.property(anyRun, anyFrequency, (circuit, frequency) => {
        const got = standingWave(circuit, frequency, 1, { pointsPerElement: 300 });
        for (const [max, at, values] of [
          [got.maxVoltageV, got.maxVoltageAtM, got.voltageV],
          [got.maxCurrentA, got.maxCurrentAtM, got.currentA],
        ] as const) {
          expect(Math.max(...values)).toBeLessThanOrEqual(max * (1 + 1e-9));
          expect(at).toBeGreaterThanOrEqual(0);
          expect(at).toBeLessThanOrEqual(got.positionM[got.positionM.length - 1]! * (1 + 1e-12));
        }
      }),
      { numRuns: 200 },
    );
  });

  test("are found between coarse points", () => {
    const coarse = standingWave(run([cable(36)]), 27.2e6, 200, { pointsPerElement: 2 });
    const fine = standingWave(run([cable(36)]), 27.2e6, 200, { pointsPerElement: 50_001 });
    expect(coarse.maxVoltageV).toBe(fine.maxVoltageV);
    const highest = Math.max(...fine.voltageV);
    expect(highest / coarse.maxVoltageV).toBeCloseTo(1, 7);
    expect(Math.max(...fine.currentA) / coarse.maxCurrentA).toBeCloseTo(1, 7);
    expect(Math.abs(coarse.maxVoltageAtM - fine.positionM[fine.voltageV.indexOf(highest)]!)).toBeLessThan(2e-3);
  });

  test("are found in a moment on a line of a million wavelengths", () => {
    const got = standingWave(
      {
        ...run([{ kind: "cable", line: { model: modelFromNominal({ z0: 50, velocityFactor: 1 }) }, lengthM: 1e6 }]),
        load: { kind: "constant", reOhm: 100, imOhm: 0 },
      },
      299_792_458,
      50,
      { pointsPerElement: 3 },
    );
    // Z0 = 50, VSWR 2: √(P·Z0·S) of the delivered 44.4 W
    expect(got.maxVoltageV).toBeCloseTo(Math.sqrt(50 * (8 / 9) * 100), 4);
  });
});
