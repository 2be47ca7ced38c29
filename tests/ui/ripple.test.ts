import { expect, test } from "vitest";
import { envelope, isTooDense, rippleCount } from "@/components/plot/ripple";

const wave = (ripples: number, samples = 4000) =>
  Array.from({ length: samples }, (_, i) => 30 + 5 * Math.cos((2 * Math.PI * ripples * i) / (samples - 1) + 1));

test("ripples are counted one for one", () => {
  for (const ripples of [1, 5, 54, 175]) expect(rippleCount(wave(ripples))).toBe(ripples);
});

test("a level line and a line without values have no ripples", () => {
  expect(rippleCount([3, 3, 3, 3])).toBe(0);
  expect(rippleCount([null, null])).toBe(0);
});

test("roughness below 1 % of the swing is not taken for ripples", () => {
  const rough = wave(5).map((value, i) => value + (i % 2 === 0 ? 0.02 : -0.02));
  expect(rippleCount(rough)).toBe(5);
});

test("80 ripples are drawn whole, 81 as the curves that hold them", () => {
  expect(isTooDense(wave(80), 1234)).toBe(false);
  expect(isTooDense(wave(81), 1234)).toBe(true);
});

test("ripples finer than 5 px are drawn as the curves that hold them however few they are", () => {
  expect(isTooDense(wave(54), 1234)).toBe(false);
  expect(isTooDense(wave(54), 208)).toBe(true);
});

test("the two curves hold the wave between its crests and troughs and reach both ends", () => {
  const values = wave(100);
  const { upper, lower } = envelope(values);
  for (const { valueIndex } of upper) expect(values[valueIndex]).toBeGreaterThan(34.9);
  for (const { valueIndex } of lower) expect(values[valueIndex]).toBeLessThan(25.1);
  for (const curve of [upper, lower])
    expect([curve[0]?.atIndex, curve.at(-1)?.atIndex]).toEqual([0, values.length - 1]);
});
