import { expect, test } from "vitest";
import { coaxCutoff } from "@/lib/line/coax-cutoff";
import { SPEED_OF_LIGHT } from "@/lib/line/constants";
import { skinDepth } from "@/lib/line/skin-depth";

// Roots kc·a of J1'(k)·Y1'(k·b/a) − J1'(k·b/a)·Y1'(k) = 0, worked out to 12 digits with an independent program.
test.each([
  [1.5, 0.805091559973],
  [2, 0.677336005137],
  [2.5, 0.584712766151],
  [3.3, 0.47826985275],
  [3.5, 0.4571151123],
  [5, 0.341023142845],
  [7, 0.252400293584],
])("coaxCutoff of a bore of %s inner diameters is at most 2.8 %% below the exact mode", (ratio, root) => {
  const exact = (root * SPEED_OF_LIGHT) / (2 * Math.PI * 0.0005);
  const below = 1 - coaxCutoff(0.001, 0.001 * ratio, 1) / exact;
  expect(below).toBeGreaterThan(0);
  expect(below).toBeLessThan(0.028);
});

test("coaxCutoff falls with the square root of the permittivity", () => {
  expect(coaxCutoff(0.001, 0.004, 1) / coaxCutoff(0.001, 0.004, 2.25)).toBeCloseTo(1.5, 12);
});

test("skinDepth of copper is 66 µm at 1 MHz and falls with the root of frequency", () => {
  expect(skinDepth(1e6) * 1e6).toBeCloseTo(66.08, 1);
  expect(skinDepth(1e4) / skinDepth(1e8)).toBeCloseTo(100, 10);
});

test("figures out of range are refused by name", () => {
  expect(() => coaxCutoff(0, 1, 1)).toThrow("coaxCutoff: innerM must be positive, got 0");
  expect(() => coaxCutoff(2, 1, 1)).toThrow("coaxCutoff: boreM must be above 2, got 1");
  expect(() => coaxCutoff(1, 2, 0.5)).toThrow("coaxCutoff: permittivity must be at least 1, got 0.5");
  expect(() => skinDepth(0)).toThrow("skinDepth: frequency must be positive, got 0");
  expect(() => skinDepth(1, -1)).toThrow("skinDepth: resistivity must be positive, got -1");
});
