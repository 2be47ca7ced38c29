import { expect, test } from "vitest";
import { coaxRatio, pairRatio } from "@/lib/line/proportions";

test("coaxRatio undoes Z0 = 59.96·VF·ln(D/d), pairRatio Z0 = 119.9·VF·acosh(s/d)", () => {
  for (const [z0, velocityFactor] of [
    [50, 0.66],
    [75, 0.83],
    [120, 0.72],
  ] as const) {
    expect((59.9585 * velocityFactor * Math.log(coaxRatio(z0, velocityFactor))) / z0).toBeCloseTo(1, 6);
    expect((119.917 * velocityFactor * Math.acosh(pairRatio(z0, velocityFactor))) / z0).toBeCloseTo(1, 6);
  }
});

test("50 Ω in solid polyethylene is the usual proportion of 3.5", () => {
  expect(coaxRatio(50, 0.659)).toBeCloseTo(3.545, 2);
});

test("figures that are not positive are refused by name", () => {
  expect(() => coaxRatio(0, 0.66)).toThrow("coaxRatio: z0 must be positive, got 0");
  expect(() => pairRatio(50, NaN)).toThrow("pairRatio: velocityFactor must be positive, got NaN");
});
