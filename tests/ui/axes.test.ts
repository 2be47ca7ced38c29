import { expect, test } from "vitest";
import { axisScale, logTicks, roundedFromZero } from "@/components/plot/axes";
import { nearestIndex, polyline } from "@/components/plot/curve";
import { separate } from "@/components/plot/series";

test("an axis from zero ends at a round figure that holds the greatest value", () => {
  expect(roundedFromZero([12, 40.2, null])).toEqual([0, 50]);
  expect(roundedFromZero([0.9])).toEqual([0, 1]);
});

test("an axis without values still has two ends", () => {
  expect(roundedFromZero([null, null])).toEqual([0, 1]);
  expect(roundedFromZero([])).toEqual([0, 1]);
});

test("a log axis over decades is ticked at the decades, over one decade also at 2 and 5", () => {
  expect(logTicks([1e3, 1e9])).toEqual([1e3, 1e4, 1e5, 1e6, 1e7, 1e8, 1e9]);
  expect(logTicks([1e6, 1e7])).toEqual([1e6, 2e6, 5e6, 1e7]);
});

test("a log axis places equal ratios at equal distances", () => {
  const x = axisScale("log", [1, 100], [0, 200]);
  expect([x(1), x(10), x(100)]).toEqual([0, 100, 200]);
});

test("a value that could not be computed leaves a gap in its line", () => {
  const path = polyline([{ x: 0, y: 1 }, { x: 1, y: 1 }, null, { x: 3, y: NaN }, { x: 4, y: 2 }, { x: 5, y: 2 }]);
  expect(path).toBe("M0.0 1.0L1.0 1.0M4.0 2.0L5.0 2.0");
});

test("nearestIndex(places, at) is the nearest place, also before the first and behind the last", () => {
  const places = [0, 1, 4, 9];
  expect([-5, 0.4, 0.6, 2.6, 6, 100].map((at) => nearestIndex(places, at))).toEqual([0, 0, 1, 2, 2, 3]);
  expect(nearestIndex([], 3)).toBe(-1);
});

test("labels at the ends of lines keep their order and their distance inside the frame", () => {
  const placed = separate([100, 101, 99, 250], 13, 10, 240);
  const sorted = [...placed].sort((a, b) => a - b);
  expect(placed[2]).toBeLessThan(placed[0] ?? 0);
  expect(placed[0]).toBeLessThan(placed[1] ?? 0);
  sorted.slice(1).forEach((y, i) => expect(y - (sorted[i] ?? 0)).toBeGreaterThanOrEqual(13 - 1e-9));
  expect(Math.max(...placed)).toBeLessThanOrEqual(240);
});
