import { expect, test } from "vitest";
import { distributions, normalArea, place } from "@/lib/line/distribution";
import { randomStream, scrambled } from "@/lib/line/random";

/** Shares of a normal cut off at two standard deviations, and where they lie; 30 digits of another program. */
const truncatedNormal: [number, number][] = [
  [0.05, -0.736130820516382679],
  [0.25, -0.319555955435636415],
  [0.9, 0.592016233346952597],
];

const take = <T>(count: number, next: () => T) => Array.from({ length: count }, next);

test("the words are those of xoshiro128** from the state 1, 2, 3, 4", () => {
  // worked out from the published recurrence by another program
  expect(take(6, scrambled([1, 2, 3, 4]))).toEqual([11520, 0, 5927040, 70819200, 2031721883, 1637235492]);
});

test("the same seed and stream give the same numbers; another of either gives others", () => {
  const first = take(5, randomStream(7, 2));
  expect(take(5, randomStream(7, 2))).toEqual(first);
  expect(take(5, randomStream(7, 3))).not.toEqual(first);
  expect(take(5, randomStream(8, 2))).not.toEqual(first);
});

test("the numbers are even over 0 to 1: mean, variance, neighbours and streams as far apart as chance allows", () => {
  const n = 100_000;
  const [a, b] = [take(n, randomStream(1, 0)), take(n, randomStream(1, 1))];
  const mean = (list: number[]) => list.reduce((sum, each) => sum + each, 0) / n;
  expect(Math.min(...a)).toBeGreaterThanOrEqual(0);
  expect(Math.max(...a)).toBeLessThan(1);
  // five standard errors of each
  expect(Math.abs(mean(a) - 1 / 2)).toBeLessThan(5 / Math.sqrt(12 * n));
  expect(Math.abs(mean(a.map((u) => u * u)) - 1 / 3)).toBeLessThan(5 * Math.sqrt(4 / 45 / n));
  expect(Math.abs(mean(a.map((u, k) => (u - 0.5) * (a[(k + 1) % n]! - 0.5))))).toBeLessThan(5 / 12 / Math.sqrt(n));
  expect(Math.abs(mean(a.map((u, k) => (u - 0.5) * (b[k]! - 0.5))))).toBeLessThan(5 / 12 / Math.sqrt(n));
});

test.each([-1, 0.5, 2 ** 32, NaN])("a seed of %s is refused", (seed) => {
  expect(() => randomStream(seed)).toThrow(/randomStream: seed/);
  expect(() => randomStream(1, seed)).toThrow(/randomStream: stream/);
});

test("a share of a distribution lies where it must: triangular by its roots, normal by quadrature elsewhere", () => {
  expect(place.uniform(0.05)).toBeCloseTo(-0.9, 14);
  expect(place.triangular(0.125)).toBeCloseTo(-0.5, 14);
  expect(place.triangular(0.875)).toBeCloseTo(0.5, 14);
  for (const [u, x] of truncatedNormal) expect(place.truncatedNormal(u)).toBeCloseTo(x, 13);
  expect(2 * normalArea(2)).toBeCloseTo(0.954499736103642, 14);
});

test.each(distributions)("%s: no draw leaves the limits, the middle is the middle, both halves are alike", (shape) => {
  const at = place[shape];
  expect(at(0)).toBeCloseTo(-1, 13);
  expect(at(0.5)).toBeCloseTo(0, 14);
  let last = -1 - 1e-13;
  for (let u = 0; u <= 1; u += 1 / 512) {
    expect(at(u)).toBeGreaterThanOrEqual(last);
    expect(at(1 - u)).toBeCloseTo(-at(u), 12);
    last = at(u);
  }
  expect(last).toBeLessThanOrEqual(1 + 1e-13);
});
