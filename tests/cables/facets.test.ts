import fc from "fast-check";
import { expect, test } from "vitest";
import { histogram } from "@/lib/cables/facets";

test("histogram(range, counted) has edges beside the round numbers, so that what is nominally one value stays together", () => {
  const impedances = [49.99, 50.01, 74.96, 75.03, 119.99, 120.02];
  expect(histogram(impedances, impedances).map(({ from, to, count }) => [from, to, count])).toEqual([
    [42.5, 52.5, 2],
    [52.5, 62.5, 0],
    [62.5, 72.5, 0],
    [72.5, 82.5, 2],
    [82.5, 92.5, 0],
    [92.5, 102.5, 0],
    [102.5, 112.5, 0],
    [112.5, 122.5, 2],
  ]);
});

test("histogram(range, counted) has no edge below 0", () => {
  expect(histogram([0.1, 100], [])[0]).toMatchObject({ from: 0, to: 2.5 });
});

test("histogram(range, counted) keeps its bins while fewer values are counted", () => {
  const edges = (bins: { from: number }[]) => bins.map(({ from }) => from);
  expect(edges(histogram([0.66, 0.85], [0.7]))).toEqual(edges(histogram([0.66, 0.85], [])));
});

test("histogram of one value, or of values that differ by rounding only, has one bin with all inside", () => {
  expect(histogram([50], [50])).toMatchObject([{ count: 1 }]);
  expect(histogram([50, 50.00000000000001], [50, 50.00000000000001])).toMatchObject([{ count: 2 }]);
  expect(histogram([0], [0])).toMatchObject([{ from: 0, count: 1 }]);
});

test("histogram of nothing is empty", () => {
  expect(histogram([], [])).toEqual([]);
});

test("histogram(values, values) counts every value once, in at most 15 bins, and covers them all", () => {
  const value = fc.double({ min: 1e-6, max: 1e6, noNaN: true });
  fc.assert(
    fc.property(fc.array(value, { minLength: 1, maxLength: 60 }), (values) => {
      const bins = histogram(values, values);
      expect(bins.reduce((sum, { count }) => sum + count, 0)).toBe(values.length);
      expect(bins.length).toBeLessThanOrEqual(15);
      const width = (bins[0]?.to ?? 0) - (bins[0]?.from ?? 0);
      expect(bins[0]?.from).toBeLessThanOrEqual(Math.min(...values) + width * 1e-9);
      expect(bins.at(-1)?.to).toBeGreaterThanOrEqual(Math.max(...values) - width * 1e-9);
    }),
  );
});
