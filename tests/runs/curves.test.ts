import { expect, test } from "vitest";
import { plotted, returnLossDomain, thinned } from "@/lib/runs/curves";

test("returnLossDomain(curves, limit) holds the limit and most of the curve, and lets a perfect match leave the frame", () => {
  const flat = Array.from({ length: 100 }, () => 17.4);
  expect(returnLossDomain([flat], 14)).toEqual([12, 20]);
  const peaked = [...Array.from({ length: 95 }, (_, i) => 6 + i / 10), 60, 80, 120, 200, 300];
  const [bottom, top] = returnLossDomain([peaked], 14);
  expect(bottom).toBe(4);
  expect(top).toBeGreaterThan(16);
  expect(top).toBeLessThan(30);
  const high = Array.from({ length: 100 }, (_, i) => 35 + (i % 25));
  expect(returnLossDomain([high], 15)[1]).toBeGreaterThan(55);
});

test("curves without a finite value still have an axis", () => {
  expect(returnLossDomain([[null, null]], null)).toEqual([0, 30]);
  expect(plotted([1, Infinity, NaN])).toEqual([1, null, null]);
});

test("thinned(list, most) keeps the first and the last", () => {
  const list = Array.from({ length: 1001 }, (_, i) => i);
  const few = thinned(list, 120);
  expect(few.length).toBeLessThanOrEqual(122);
  expect([few[0], few.at(-1)]).toEqual([0, 1000]);
});
