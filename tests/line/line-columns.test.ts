import { expect, test } from "vitest";
import { propagation } from "@/lib/line/cable";
import { coldRatios, frequencyColumns, lineColumns, setLine, warmRatios } from "@/lib/line/line-columns";
import { atTemperature } from "@/lib/line/temperature";
import { anyFrequency, anyModel } from "@/tests/support/arbitrary-run";
import fc from "@/tests/support/property";
import { rope } from "@/tests/support/lossy-run";

const relative = (got: number, value: number, size: number) => Math.abs(got - value) / size;

test("columns are what the readable form gives, for any model, temperature and frequency", () => {
  const slopes = [{ fromC: 20, toC: 60, perK: 0.004 }];
  fc.assert(
    fc.property(
      anyModel,
      fc.boolean(),
      fc.double({ min: -40, max: 80, noNaN: true }),
      anyFrequency,
      (plain, isSloped, temperatureC, frequency) => {
        const model = isSloped ? { ...plain, lossSlopes: slopes } : plain;
        const warm = atTemperature(model, temperatureC);
        const columns = lineColumns(frequencyColumns([frequency]));
        setLine(columns, model, warmRatios(warm));
        const { gamma, zc } = propagation(warm.model, { re: 0, im: 2 * Math.PI * frequency });
        const size = Math.hypot(gamma.re, gamma.im);
        expect(relative(columns.gammaRe[0]!, gamma.re, size)).toBeLessThan(1e-12);
        expect(relative(columns.gammaIm[0]!, gamma.im, size)).toBeLessThan(1e-12);
        expect(relative(columns.zcRe[0]!, zc.re, Math.hypot(zc.re, zc.im))).toBeLessThan(1e-12);
        expect(relative(columns.zcIm[0]!, zc.im, Math.hypot(zc.re, zc.im))).toBeLessThan(1e-12);
        const product = columns.zcRe[0]! * columns.ycRe[0]! - columns.zcIm[0]! * columns.ycIm[0]!;
        expect(product).toBeCloseTo(1, 11);
      },
    ),
  );
});

test("columns brought from one model to another are those made for it at once", () => {
  fc.assert(
    fc.property(anyModel, anyModel, (first, second) => {
      // always of the same forms: only figures move
      const next = {
        ...second,
        conductors: first.conductors.map((term) => ({ ...term, r0OhmPerM: term.r0OhmPerM * 1.1 })),
      };
      const frequencies = frequencyColumns([1e4, 1e6, 1e9]);
      const [kept, fresh] = [lineColumns(frequencies), lineColumns(frequencies)];
      setLine(kept, first, coldRatios);
      setLine(kept, next, coldRatios);
      setLine(fresh, next, coldRatios);
      expect(kept).toEqual(fresh);
    }),
  );
});

test("a frequency that is not positive, and a form without its corner, are refused", () => {
  expect(() => frequencyColumns([1e6, 0])).toThrow(/frequencyColumns: frequencies must be positive, got 0/);
  const columns = lineColumns(frequencyColumns([1e6]));
  const model = { ...rope, conductors: [{ form: "round" as const, r0OhmPerM: 0.1 }] };
  expect(() => setLine(columns, model, coldRatios)).toThrow(/skinCornerRadPerS must be positive for round/);
});
