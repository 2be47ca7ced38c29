import { abs, isFinite, scale, subtract, type Complex } from "@/lib/line/complex";

export interface PairSolution {
  value: [number, number];
  converged: boolean;
  iterations: number;
}

type Residual = (first: number, second: number) => Complex;

const mostIterations = 60;
const goodEnough = 1e-13;
/** A reflection below this is a match: 200 dB, far beyond what any length or part can be made to. */
const accepted = 1e-10;

/**
 * Two real numbers that bring a complex residual to zero, by Newton's method from a near start, damped where a full
 * step would make it worse.
 * @param residual - dimensionless, smooth near the start
 * @param start - of the order of the solution
 * @param reach - the largest step of each number in one iteration, above 0; derivatives are taken over 1e-6 of it
 * @returns the numbers; `converged` is true where the residual is below 1e-10. Never throws on slowness
 * Source: W. H. Press et al., Numerical Recipes, 3rd ed. 2007, section 9.6, with central differences.
 */
export function solvePair(residual: Residual, start: [number, number], reach: [number, number]): PairSolution {
  let value = start;
  let current = residual(...value);
  let iterations = 0;
  while (iterations < mostIterations && abs(current) > goodEnough) {
    const step = newtonStep(residual, value, current, reach);
    if (!step) break;
    iterations += 1;
    const next = damped(residual, value, step, abs(current));
    if (!next) break;
    value = next;
    current = residual(...value);
  }
  return { value, converged: abs(current) < accepted, iterations };
}

function newtonStep(
  residual: Residual,
  [x, y]: [number, number],
  current: Complex,
  [reachX, reachY]: [number, number],
): [number, number] | undefined {
  const hx = reachX * 1e-6;
  const hy = reachY * 1e-6;
  const dx = scale(subtract(residual(x + hx, y), residual(x - hx, y)), 1 / (2 * hx));
  const dy = scale(subtract(residual(x, y + hy), residual(x, y - hy)), 1 / (2 * hy));
  const determinant = dx.re * dy.im - dx.im * dy.re;
  if (!isFinite(dx) || !isFinite(dy) || determinant === 0) return undefined;
  const stepX = (dy.re * current.im - dy.im * current.re) / determinant;
  const stepY = (dx.im * current.re - dx.re * current.im) / determinant;
  const shorten = Math.min(1, reachX / Math.abs(stepX), reachY / Math.abs(stepY));
  return [stepX * shorten, stepY * shorten];
}

/** The step, or the largest half, quarter, eighth … of it that lowers the residual. */
function damped(
  residual: Residual,
  [x, y]: [number, number],
  [stepX, stepY]: [number, number],
  before: number,
): [number, number] | undefined {
  for (let share = 1; share > 1e-4; share /= 2) {
    const next: [number, number] = [x + share * stepX, y + share * stepY];
    if (abs(residual(...next)) < before) return next;
  }
  return undefined;
}
