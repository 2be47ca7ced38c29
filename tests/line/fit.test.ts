import { describe, expect, test } from "vitest";
import { lossTangentOf, modelFromLoss, skinCornerOf } from "@/lib/line/closed-mapping";
import type { ConductorForm } from "@/lib/line/element";
import { fitModel, type FitRequest } from "@/lib/line/fit";
import { coaxGeometry } from "@/lib/line/geometry";
import { leaveOneOut } from "@/lib/line/leave-one-out";
import { fitLossTable, type LossRow } from "@/lib/line/loss-table";
import { lossOf } from "@/lib/line/refit";
import { checks } from "@/tests/support/line-checks";
import fc from "@/tests/support/property";
import { closeTo } from "@/tests/support/tolerance";

interface Inputs {
  nominal_z0_ohm: number;
  velocity_factor: number;
  r0_ohm_per_m: number;
  k1_db_per_m_per_sqrt_hz: number;
  k2_db_per_m_per_hz: number;
  frequency_hz: number[];
  attenuation_db_per_100m: number[];
  skin_form: ConductorForm;
}
const of = (kind: string) => checks<Inputs>("datasheet-fit").filter(({ name }) => name.startsWith(kind));
const knownOf = (inputs: Inputs) => ({
  z0: inputs.nominal_z0_ohm,
  velocityFactor: inputs.velocity_factor,
  r0: inputs.r0_ohm_per_m,
});
const rowsOf = ({ frequency_hz, attenuation_db_per_100m }: Inputs): LossRow[] =>
  frequency_hz.map((frequency, n) => ({ frequency, lossDbPerM: attenuation_db_per_100m[n]! / 100 }));

test("the checks of mapping and refit are all there", () => {
  expect([of("mapping").length, of("model refit").length]).toEqual([3, 2]);
});

test.each(of("mapping"))(
  "the closed mapping gives corner and loss tangent as evaluated independently: $name",
  ({ inputs, expected }) => {
    const { k1_db_per_m_per_sqrt_hz: k1, k2_db_per_m_per_hz: k2 } = inputs;
    const model = modelFromLoss(knownOf(inputs), k1, k2);
    closeTo(model.cFPerM, expected.cr_f_per_m!, "C");
    closeTo(model.lInfHPerM, expected.linf_h_per_m!, "L");
    closeTo(model.conductors[0]!.skinCornerRadPerS!, expected.skin_corner_rad_per_s!, "corner");
    closeTo(model.lossTangent!, expected.tan_delta!, "loss tangent");
  },
);

test.each(of("model refit"))("the refit finds the model a table was made of: $name", ({ inputs, expected }) => {
  const { refit } = fitModel({ ...knownOf(inputs), rows: rowsOf(inputs), form: inputs.skin_form });
  closeTo(refit.model.conductors[0]!.skinCornerRadPerS!, expected.skin_corner_rad_per_s!, "corner");
  closeTo(refit.model.lossTangent!, expected.tan_delta!, "loss tangent");
  expect(refit.rmsPercent).toBeLessThan(1e-8);
});

/** A data sheet whose row at 450 MHz has two digits the wrong way round: 11.92 for 13.72 dB/100 m. */
const mhz = [5, 10, 50, 100, 200, 450, 900, 1500, 3000];
const printed = [1.37, 1.94, 4.4, 6.28, 8.98, 11.92, 19.85, 26.18, 38.48];
const rows: LossRow[] = mhz.map((f, n) => ({ frequency: f * 1e6, lossDbPerM: printed[n]! / 100 }));
const sheet: FitRequest = { z0: 75, velocityFactor: 0.83, r0: 0.03005, rows };

describe("A data sheet with one mistyped row", () => {
  const { table, leftOut, warnings, dcFloorDbPerM } = fitModel(sheet);

  test("shows it 12.8 % off, all others 1.4 to 2.1 %", () => {
    const errors = table.rows.map(({ errorPercent }) => errorPercent);
    expect(errors[5]).toBeCloseTo(-12.8, 1);
    for (const error of errors.toSpliced(5, 1)) expect(error).toBeGreaterThan(1.3);
    for (const error of errors.toSpliced(5, 1)) expect(error).toBeLessThan(2.15);
  });

  test("is told what the row should be: 13.70, by k1 0.6097 and k2 0.00171 per 100 m and MHz", () => {
    const { predictedDbPerM, k1, k2, errorPercent } = leftOut[5]!;
    expect(100 * predictedDbPerM).toBeCloseTo(13.7, 2);
    expect(100 * k1 * 1e3).toBeCloseTo(0.6097, 4);
    expect(100 * k2 * 1e6).toBeCloseTo(0.00171, 5);
    expect(errorPercent).toBeCloseTo((100 * (11.92 - 13.7037)) / 11.92, 2);
    expect(lossTangentOf(0.83, k2)).toBeCloseTo(1.56e-4, 6);
  });

  test("names the row and nothing else", () => {
    expect(warnings.map(({ warning }) => warning)).toEqual(["oddRow"]);
    expect(warnings[0]).toMatchObject({ row: 5, frequency: 450e6 });
  });

  test("has a dc floor of 0.174 dB/100 m, well below 0.61 at 1 MHz", () => {
    expect(100 * dcFloorDbPerM).toBeCloseTo(0.174, 3);
    expect(100 * dcFloorDbPerM).toBeLessThan(0.61);
  });

  test("has conductors of 1.06 times the loss of smooth ones, once the row is out", () => {
    const coax = coaxGeometry({ inner: 1.02e-3, bore: 4.6e-3, permittivity: 1.45 });
    const smoothResistance = coax.highFrequencyResistance(1);
    const others = fitModel({ ...sheet, rows: rows.toSpliced(5, 1), smoothResistance });
    expect(others.k1OverSmooth).toBeCloseTo(1.06, 2);
    expect(others.warnings).toEqual([]);
    expect(others.table.worstPercent).toBeLessThan(0.3);
  });
});

const between = (min: number, max: number) => fc.double({ min, max, noNaN: true });
const decades = (min: number, max: number) => between(Math.log10(min), Math.log10(max)).map((power) => 10 ** power);
const frequencies = [1e6, 4e6, 1e7, 3e7, 1e8, 3e8, 1e9];

test("the refit of a model's own table is the model, whatever the form and the temperature", () => {
  const form = fc.constantFrom<ConductorForm>("round", "sheet", "sqrt");
  fc.assert(
    fc.property(
      form,
      between(30, 150),
      between(0.6, 0.9),
      decades(5e-3, 0.3),
      decades(3e4, 3e6),
      decades(5e-5, 0.01),
      between(-20, 60),
      (conductor, z0, velocityFactor, r0, corner, lossTangent, temperatureC) => {
        const model = {
          ...modelFromLoss({ z0, velocityFactor, r0 }, 1e-5, 0, conductor),
          conductors: [{ form: conductor, r0OhmPerM: r0, skinCornerRadPerS: corner }],
          lossTangent,
        };
        const table = lossOf(model, frequencies, temperatureC).map((lossDbPerM, n) => ({
          frequency: frequencies[n]!,
          lossDbPerM,
        }));
        const { refit } = fitModel({ z0, velocityFactor, r0, rows: table, form: conductor, temperatureC });
        expect(refit.rmsPercent).toBeLessThan(1e-6);
        expect(refit.model.conductors[0]!.skinCornerRadPerS! / corner).toBeCloseTo(1, 5);
        expect(refit.model.lossTangent! / lossTangent).toBeCloseTo(1, 3);
      },
    ),
  );
}, 30_000);

test("far above the corner the closed mapping is the refit, and below it the refit is never worse", () => {
  const known = { z0: 50, velocityFactor: 0.85, r0: 0.0086 };
  const far = [1e10, 3e10, 1e11].map((frequency) => ({
    frequency,
    lossDbPerM: 1e-6 * Math.sqrt(frequency) + 1e-12 * frequency,
  }));
  const fit = fitModel({ ...known, rows: far });
  expect(fit.refit.model.conductors[0]!.skinCornerRadPerS! / fit.model.conductors[0]!.skinCornerRadPerS!).toBeCloseTo(
    1,
    2,
  );
  fc.assert(
    fc.property(fc.array(between(0.9, 1.1), { minLength: 7, maxLength: 7 }), between(5e-7, 5e-5), (noise, k1) => {
      const noisy = frequencies.map((frequency, n) => ({
        frequency,
        lossDbPerM: noise[n]! * (k1 * Math.sqrt(frequency) + 1e-11 * frequency),
      }));
      const { model, refit } = fitModel({ ...known, rows: noisy });
      const closed = lossOf(model, frequencies, 20);
      const rms = Math.sqrt(noisy.reduce((sum, { lossDbPerM }, n) => sum + (1 - closed[n]! / lossDbPerM) ** 2, 0) / 7);
      expect(refit.rmsPercent).toBeLessThanOrEqual(100 * rms * (1 + 1e-9));
    }),
  );
});

test("the closed mapping of a table at a temperature is at 20 °C: corner and resistance have gone with resistivity", () => {
  const far = [1e10, 1e11].map((frequency) => ({ frequency, lossDbPerM: 1e-6 * Math.sqrt(frequency) }));
  const [cold, warm] = [20, 60].map((temperatureC) =>
    fitModel({ z0: 50, velocityFactor: 0.8, r0: 0.01, rows: far, temperatureC }),
  );
  const corner = (fit: typeof cold) => fit!.model.conductors[0]!.skinCornerRadPerS!;
  expect(corner(warm) / corner(cold)).toBeCloseTo(1 + 0.00393 * 40, 10);
  expect(warm!.table.k1).toBe(cold!.table.k1);
});

test("a row left out is predicted by the others alone, as if it had never been there", () => {
  const row = fc.record({ frequency: decades(1e5, 1e10), lossDbPerM: decades(1e-4, 10), weight: between(0.1, 10) });
  fc.assert(
    fc.property(
      fc.uniqueArray(row, { minLength: 3, maxLength: 12, selector: ({ frequency }) => frequency }),
      (table) => {
        leaveOneOut(table).forEach(({ predictedDbPerM }, n) => {
          const { k1, k2 } = fitLossTable(table.toSpliced(n, 1))!;
          const f = table[n]!.frequency;
          expect(predictedDbPerM / (k1 * Math.sqrt(f) + k2 * f)).toBeCloseTo(1, 6);
        });
      },
    ),
  );
});

test("a table of two rows, or of one frequency, says nothing about one of its rows", () => {
  expect(leaveOneOut(rows.slice(0, 2)).every(({ errorPercent }) => Number.isNaN(errorPercent))).toBe(true);
  const one = Array.from({ length: 3 }, () => ({ frequency: 1e6, lossDbPerM: 0.01 }));
  expect(leaveOneOut(one).every(({ errorPercent }) => Number.isNaN(errorPercent))).toBe(true);
});

test.each<[string, Partial<FitRequest>, string[]]>([
  ["a loss below the dc resistance's own", { r0: 0.5 }, ["belowDcFloor"]],
  ["a velocity above light's", { velocityFactor: 1.2 }, ["fasterThanLight"]],
  ["no dc resistance", { r0: 0 }, ["noResistance"]],
  ["conductors smoother than smooth", { smoothResistance: 2e-4 }, ["belowSmooth"]],
  ["one frequency", { rows: rows.slice(0, 1).concat(rows.slice(0, 1)) }, ["oneFrequency"]],
  ["a narrow table", { rows: rows.slice(0, 2) }, ["narrowRange"]],
  [
    "a loss in proportion to frequency",
    { rows: mhz.map((f) => ({ frequency: f * 1e6, lossDbPerM: f * 1e-3 })) },
    ["noConductorLoss"],
  ],
  [
    "a loss that no insulation has",
    { rows: mhz.map((f) => ({ frequency: f * 1e6, lossDbPerM: f * 0.1 })) },
    ["atBound"],
  ],
  [
    "a dielectric of high loss",
    { rows: mhz.map((f) => ({ frequency: f * 1e6, lossDbPerM: 6e-4 * Math.sqrt(f) + f * 2e-3 })) },
    ["lossyDielectric"],
  ],
])("fitModel warns of %s", (_, off, expected) => {
  const names = fitModel({ ...sheet, rows: rows.toSpliced(5, 1), ...off }).warnings.map(({ warning }) => warning);
  for (const name of expected) expect(names).toContain(name);
});

test("a model without loss in √f is one of constant resistance", () => {
  expect(skinCornerOf({ z0: 50, r0: 0.01 }, 0)).toBe(Infinity);
  expect(modelFromLoss({ z0: 50, velocityFactor: 0.8, r0: 0.01 }, 0, 1e-11).conductors).toEqual([
    { form: "constant", r0OhmPerM: 0.01 },
  ]);
});

test.each<[Partial<FitRequest>, RegExp]>([
  [{ z0: 0 }, /z0 must be positive/],
  [{ velocityFactor: NaN }, /velocityFactor must be positive/],
  [{ r0: -1 }, /r0 must be at least 0/],
  [{ rows: [] }, /at least one row/],
  [{ rows: [{ frequency: 0, lossDbPerM: 1 }] }, /frequency must be positive/],
  [{ temperatureC: -300 }, /no positive resistivity/],
])("fitModel refuses %o", (off, words) => {
  expect(() => fitModel({ ...sheet, ...off })).toThrow(RangeError);
  expect(() => fitModel({ ...sheet, ...off })).toThrow(words);
});
