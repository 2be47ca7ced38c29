import fc from "fast-check";
import { expect, test } from "vitest";
import { histogram } from "@/lib/cables/facets";

test("histogram(range, counted) has round edges that follow one another", () => {
  expect(histogram([50, 75, 120], [50, 75, 120]).map(({ from, to, count }) => [from, to, count])).toEqual([
    [50, 60, 1],
    [60, 70, 0],
    [70, 80, 1],
    [80, 90, 0],
    [90, 100, 0],
    [100, 110, 0],
    [110, 120, 0],
    [120, 130, 1],
  ]);
});

test("histogram(range, counted) keeps its bins while fewer values are counted", () => {
  const edges = (bins: { from: number }[]) => bins.map(({ from }) => from);
  expect(edges(histogram([0.66, 0.85], [0.7]))).toEqual(edges(histogram([0.66, 0.85], [])));
});

test("histogram of one value has one bin with it inside", () => {
  expect(histogram([50], [50])).toEqual([{ from: 50, to: 55, count: 1 }]);
  expect(histogram([0], [0])).toHaveLength(1);
});

test("histogram of nothing is empty", () => {
  expect(histogram([], [])).toEqual([]);
});

test("histogram(values, values) counts every value once, in at most 13 bins, and covers them all", () => {
  const value = fc.double({ min: 1e-6, max: 1e6, noNaN: true });
  fc.assert(
    fc.property(fc.array(value, { minLength: 1, maxLength: 60 }), (values) => {
      const bins = histogram(values, values);
      expect(bins.reduce((sum, { count }) => sum + count, 0)).toBe(values.length);
      expect(bins.length).toBeLessThanOrEqual(13);
      const width = (bins[0]?.to ?? 0) - (bins[0]?.from ?? 0);
      expect(bins[0]?.from).toBeLessThanOrEqual(Math.min(...values) + width * 1e-9);
      expect(bins.at(-1)?.to).toBeGreaterThanOrEqual(Math.max(...values) - width * 1e-9);
    }),
  );
});
