import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { fitLossTable, type LossRow } from "@/lib/line/loss-table";
import { checks } from "@/tests/support/line-checks";
import { closeTo } from "@/tests/support/tolerance";

interface FitInputs {
  frequency_hz: number[];
  attenuation_db_per_100m: number[];
}

const fits = checks<FitInputs>("datasheet-fit").filter(({ name }) => name.startsWith("fit table"));
const rowsOf = ({ frequency_hz, attenuation_db_per_100m }: FitInputs): LossRow[] =>
  frequency_hz.map((frequency, i) => ({ frequency, lossDbPerM: attenuation_db_per_100m[i]! / 100 }));

describe("fitLossTable agrees with an independent fit of the same tables", () => {
  test("and all three of them are there", () => expect(fits).toHaveLength(3));

  test.each(fits)("$name", ({ inputs, expected }) => {
    const fit = fitLossTable(rowsOf(inputs))!;
    closeTo(fit.k1, expected.k1_db_per_m_per_sqrt_hz!, "k1");
    closeTo(fit.k2, expected.k2_db_per_m_per_hz!, "k2");
    closeTo(
      fit.rows.map(({ fittedDbPerM }) => fittedDbPerM * 100),
      expected.fitted_db_per_100m!,
      "fitted",
    );
    closeTo(fit.worstPercent / 100, expected.max_relative_residual!, "worst");
  });
});

const frequency = fc.double({ min: 1e4, max: 1e10, noNaN: true });
const part = fc.double({ min: 0.1, max: 10, noNaN: true });

test("fitLossTable finds both parts of a table that was made of them, and no error in it", () => {
  fc.assert(
    fc.property(part, part, fc.uniqueArray(frequency, { minLength: 2, maxLength: 9 }), (a, b, frequencies) => {
      // apart enough for two parts to be told from each other in double precision
      fc.pre(Math.max(...frequencies) > 4 * Math.min(...frequencies));
      const [k1, k2] = [a * 1e-5, b * 1e-10];
      const fit = fitLossTable(frequencies.map((f) => ({ frequency: f, lossDbPerM: k1 * Math.sqrt(f) + k2 * f })))!;
      expect(fit.worstPercent).toBeLessThan(1e-4);
      expect(fit.range).toEqual([Math.min(...frequencies), Math.max(...frequencies)]);
    }),
  );
});

test("fitLossTable counts a row of weight 2 like two equal rows", () => {
  const [first, second, third] = [1e6, 1e7, 1e8].map((f, i) => ({ frequency: f, lossDbPerM: 0.01 * (i + 1) ** 2 }));
  const once = fitLossTable([first!, second!, second!, third!])!;
  const weighted = fitLossTable([first!, { ...second!, weight: 2 }, third!])!;
  expect(weighted.k1).toBeCloseTo(once.k1, 15);
  expect(weighted.k2).toBeCloseTo(once.k2, 20);
});

test("fitLossTable puts a table of one frequency down to the conductors", () => {
  const fit = fitLossTable([{ frequency: 1e8, lossDbPerM: 0.04 }])!;
  expect([fit.k1 * 1e4, fit.k2]).toEqual([0.04, 0]);
});

test("fitLossTable of no rows is undefined", () => expect(fitLossTable([])).toBeUndefined());

test.each([
  [{ frequency: 0, lossDbPerM: 1 }, "frequency must be positive, got 0"],
  [{ frequency: 1e6, lossDbPerM: NaN }, "lossDbPerM must be positive, got NaN"],
  [{ frequency: 1e6, lossDbPerM: 1, weight: -1 }, "weight must be positive, got -1"],
])("fitLossTable refuses %o", (row, message) => {
  expect(() => fitLossTable([row])).toThrow(new RangeError(`fitLossTable: ${message}`));
});
