import { expect, test } from "vitest";
import { laplaceGrid, mostEdges } from "@/lib/line/time/laplace-grid";
import fc from "@/tests/support/property";

const asked = fc.record({
  windowS: fc.double({ min: 0.001, max: mostEdges, noNaN: true }),
  points: fc.integer({ min: 2, max: 65_536 }),
  edge: fc.constantFrom("sineSquared" as const, "raisedCosine" as const),
});

test("a grid shows twice its window, 16 steps to an edge, in values that fall on those asked", () => {
  fc.assert(
    fc.property(asked, ({ windowS, points, edge }) => {
      const grid = laplaceGrid({ windowS, points }, 1, edge);
      const period = grid.size * grid.stepS;
      expect(Math.log2(grid.size) % 1).toBe(0);
      expect(grid.size).toBeGreaterThanOrEqual(4096);
      expect(period).toBeGreaterThanOrEqual(2 * windowS * (1 - 1e-12));
      expect(grid.stepS).toBeLessThanOrEqual((1 + 1e-12) / 16);
      expect(grid.stepS * grid.every * (points - 1)).toBeCloseTo(windowS, 9);
      expect(Math.exp(-grid.damping * period)).toBeCloseTo(1e-7, 12);
      expect(grid.count).toBeLessThanOrEqual(grid.size / 2 + 1);
      // the spectrum reaches 16π over the edge's time, half the rate of 16 steps an edge, or all there is
      const reach = grid.omega.at(-1)!;
      expect(reach).toBeGreaterThanOrEqual(16 * Math.PI * (1 - 1e-9));
    }),
  );
});

test("refuses a window of more than 2,048 edges, of none, and points that are no whole number of at least 2", () => {
  for (const windowS of [2049, 0, NaN])
    expect(() => laplaceGrid({ windowS, points: 2 }, 1, "sineSquared")).toThrow("laplaceGrid: windowS");
  for (const points of [1, 2.5, NaN])
    expect(() => laplaceGrid({ windowS: 1, points }, 1, "sineSquared")).toThrow("laplaceGrid: points");
});
