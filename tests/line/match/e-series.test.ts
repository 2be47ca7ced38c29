import { expect, test } from "vitest";
import { e24, e24Around } from "@/lib/line/match/e-series";

test("the E24 series has 24 rising values, each decade within 10 % of the geometric step", () => {
  expect(e24).toHaveLength(24);
  e24.forEach((value, index) => {
    expect(value).toBeGreaterThan(e24[index - 1] ?? 0);
    expect(Math.abs(value / 10 ** (index / 24) - 1)).toBeLessThan(0.06);
  });
});

test.each([
  [350e-9, [330e-9, 360e-9]],
  [132e-12, [130e-12, 150e-12]],
  [9.5e-12, [9.1e-12, 10e-12]],
  [1.04, [1, 1.1]],
  [9.99e-10, [9.1e-10, 1e-9]],
  [470e-12, [470e-12]],
  [1e-6, [1e-6]],
])("e24Around(%s) are the standard values on either side", (value, expected) => {
  expect(e24Around(value)).toEqual(expected);
});

test.each([0, -1, NaN, Infinity])("e24Around refuses %s", (value) => {
  expect(() => e24Around(value)).toThrow(RangeError);
});
