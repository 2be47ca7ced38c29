import { expect, test } from "vitest";
import { goldenSection } from "@/lib/line/golden-section";

test("goldenSection(value, from, to, steps) finds the crest of sin between 0 and π, to the square root of rounding", () => {
  const { at, value } = goldenSection(Math.sin, 0, Math.PI, 50);
  expect(at).toBeCloseTo(Math.PI / 2, 7);
  expect(value).toBeCloseTo(1, 14);
});

test("a crest at an end is approached from inside, and the value is never above the curve's own", () => {
  const rising = goldenSection((x) => x, 2, 5, 50);
  expect(rising.at).toBeLessThanOrEqual(5);
  expect(rising.value).toBeCloseTo(5, 8);
});

test("fewer steps leave more of the interval: 0.618 each", () => {
  const off = (steps: number) => Math.abs(goldenSection((x) => -((x - 0.3) ** 2), 0, 1, steps).at - 0.3);
  expect(off(10)).toBeLessThan(0.618 ** 10);
  expect(off(25)).toBeLessThan(0.618 ** 25);
});
