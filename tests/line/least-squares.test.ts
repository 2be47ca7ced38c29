import { expect, test } from "vitest";
import { leastSquares, type Unknown } from "@/lib/line/least-squares";
import fc from "@/tests/support/property";

const free = (start: number): Unknown => ({ start, low: -1e6, high: 1e6 });

test("a straight line through noise is that of the normal equations", () => {
  const [x, y] = [
    [0, 1, 2, 3, 4],
    [1.1, 2.9, 5.2, 6.8, 9.1],
  ];
  const { at, sum } = leastSquares(
    ([a = 0, b = 0], into) => x.forEach((each, k) => (into[k] = a + b * each - y[k]!)),
    5,
    [free(0), free(0)],
  );
  expect(at[1]).toBeCloseTo(1.99, 9);
  expect(at[0]).toBeCloseTo(1.04, 9);
  expect(sum).toBeCloseTo(0.107, 9);
});

test("the valley of Rosenbrock is followed to its end", () => {
  const { at } = leastSquares(([a = 0, b = 0], into) => into.set([10 * (b - a * a), 1 - a]), 2, [
    { start: -1.2, low: -5, high: 5 },
    { start: 1, low: -5, high: 5 },
  ]);
  expect(at[0]).toBeCloseTo(1, 9);
  expect(at[1]).toBeCloseTo(1, 9);
});

test("an unknown that would leave its bounds stays at them, and the others are best with it there", () => {
  fc.assert(
    fc.property(fc.double({ min: -3, max: 3, noNaN: true }), fc.double({ min: -3, max: 3, noNaN: true }), (p, q) => {
      // least of (a − p)² + (a + b − q)² with a from 0 to 1
      const bounded: Unknown = { start: 0.5, low: 0, high: 1 };
      const { at, isAtBound } = leastSquares(([a = 0, b = 0], into) => into.set([a - p, a + b - q]), 2, [
        bounded,
        free(0),
      ]);
      expect(at[0]).toBeCloseTo(Math.min(1, Math.max(0, p)), 8);
      expect(at[1]).toBeCloseTo(q - at[0]!, 8);
      if (p > 1.01 || p < -0.01) expect(isAtBound).toEqual([true, false]);
    }),
  );
});

test("an unknown that nothing depends on stays where it was", () => {
  const { at } = leastSquares(([a = 0], into) => into.set([a - 2, 0]), 2, [free(0), free(7)]);
  expect(at[0]).toBeCloseTo(2, 9);
  expect(at[1]).toBe(7);
});

test("fewer residuals than unknowns, and a start that is nothing, are refused", () => {
  expect(() => leastSquares((_, into) => into.fill(0), 1, [free(0), free(0)])).toThrow(/2 unknowns need as many/);
  expect(() => leastSquares((_, into) => into.fill(NaN), 1, [free(0)])).toThrow(/not finite/);
});
