import { expect, test } from "vitest";
import { attenuations } from "@/lib/line/attenuation";
import { DB_PER_NEPER } from "@/lib/line/constants";
import { propagation } from "@/lib/line/cable";
import { anyFrequency, anyModel } from "@/tests/support/arbitrary-run";
import { bothForms, modelOf, type CheckCable } from "@/tests/support/line-checks";
import fc from "@/tests/support/property";
import { closeTo } from "@/tests/support/tolerance";
import { rope } from "@/tests/support/lossy-run";

test("many lines at once are each line alone", () => {
  fc.assert(
    fc.property(
      fc.array(anyModel, { minLength: 1, maxLength: 5 }),
      fc.array(anyFrequency, { minLength: 1, maxLength: 4 }),
      (models, frequencies) => {
        const found = attenuations(models, frequencies);
        models.forEach((model, n) =>
          frequencies.forEach((frequency, k) => {
            const { gamma } = propagation(model, { re: 0, im: 2 * Math.PI * frequency });
            // a loss far below the phase is a small difference in one of the two forms
            const allowed = 1e-12 * gamma.re + 1e-15 * gamma.im;
            expect(Math.abs(found[n * frequencies.length + k]! - gamma.re)).toBeLessThanOrEqual(allowed);
          }),
        );
      },
    ),
  );
});

interface Secondary {
  cable: CheckCable;
  frequency_hz: number[];
}

test.each(bothForms<Secondary>("secondary-parameters"))(
  "$name: the attenuation of the check",
  ({ inputs, expected }) => {
    const alphas = attenuations([modelOf(inputs.cable)], inputs.frequency_hz);
    closeTo(
      alphas.map((alpha) => alpha * DB_PER_NEPER),
      expected.alpha_db_per_m!,
      "attenuation",
    );
  },
);

test("a lossless line loses nothing; no line, no answer; a frequency of 0 is refused", () => {
  const lossless = { ...rope, conductors: [{ form: "constant" as const, r0OhmPerM: 0 }], lossTangent: 0 };
  expect([...attenuations([lossless], [1e6, 1e9])]).toEqual([0, 0]);
  expect(attenuations([], [1e6])).toHaveLength(0);
  expect(() => attenuations([rope], [0])).toThrow(/frequencies must be positive/);
});
