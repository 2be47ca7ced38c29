import { expect, test } from "vitest";
import { complex, multiply, subtract } from "@/lib/line/complex";
import { solvePair } from "@/lib/line/match/solve-pair";

test("solvePair finds the two numbers whose complex residual vanishes", () => {
  const target = complex(3, 4);
  const solution = solvePair((x, y) => subtract(multiply(complex(x, y), complex(x, y)), target), [1.5, 1.5], [1, 1]);
  expect(solution.converged).toBe(true);
  expect(solution.value[0]).toBeCloseTo(2, 12);
  expect(solution.value[1]).toBeCloseTo(1, 12);
  expect(solution.iterations).toBeLessThan(12);
});

test("solvePair says that a residual which cannot vanish did not, and does not throw", () => {
  const solution = solvePair((x, y) => complex(1 + x * x, y), [0.5, 0.5], [0.1, 0.1]);
  expect(solution.converged).toBe(false);
  expect(solution.value.every(Number.isFinite)).toBe(true);
});

test("solvePair stops where the residual has no number", () => {
  expect(solvePair(() => complex(NaN, 0), [1, 1], [0.1, 0.1]).converged).toBe(false);
  expect(solvePair(() => complex(1, 0), [1, 1], [0.1, 0.1])).toEqual({
    value: [1, 1],
    converged: false,
    iterations: 0,
  });
});
