/** Least squares within bounds, for a handful of unknowns: what a model's free figures must be to meet given ones. */

export interface LeastSquares {
  at: number[];
  /** Σ residual² */
  sum: number;
  /** which unknowns ended at one of their bounds */
  isAtBound: boolean[];
}

export interface Unknown {
  start: number;
  low: number;
  high: number;
}

/** Fills in the residuals at a place. */
export type Residuals = (at: readonly number[], into: Float64Array) => void;

const mostRounds = 60;
const smallStep = 1e-13;
/** Mean square of residuals that are rounding. */
const nothing = 1e-24;
/** Relative gain of a round below which there is nothing left to gain. */
const smallGain = 1e-10;

/**
 * The place within bounds where Σ residual² is least, near the start. Unknowns should be of the order of 1 (logarithms,
 * ratios). Each round costs two evaluations an unknown.
 * @param count - how many residuals there are
 * @throws RangeError when there are fewer residuals than unknowns, or a residual at the start is not finite
 * Source: D. W. Marquardt, SIAM J. Appl. Math. 11 (1963) 431; bounds by the active set of the projected gradient,
 * C. T. Kelley, Iterative Methods for Optimization, SIAM 1999, section 5.5.
 */
export function leastSquares(residuals: Residuals, count: number, unknowns: readonly Unknown[]): LeastSquares {
  if (count < unknowns.length)
    throw new RangeError(`leastSquares: ${unknowns.length} unknowns need as many residuals, got ${count}`);
  let at = unknowns.map(({ start, low, high }) => clamp(start, low, high));
  let value: Float64Array = new Float64Array(count);
  let trial: Float64Array = new Float64Array(count);
  residuals(at, value);
  let sum = squared(value);
  if (!(sum < Infinity)) throw new RangeError("leastSquares: the residuals at the start are not finite");
  let damping = 1e-3;
  for (let round = 0; round < mostRounds && sum > nothing * count; round++) {
    const { matrix, gradient } = normalEquations(residuals, count, unknowns, at, value);
    let isBetter = false;
    let length = 0;
    const before = sum;
    for (let attempt = 0; attempt < 12 && !isBetter; attempt++) {
      const next = stepped(matrix, gradient, damping, at, unknowns);
      length = Math.max(...next.map((each, i) => Math.abs(each - (at[i] ?? 0)) / Math.max(1, Math.abs(each))));
      if (length < smallStep) break;
      residuals(next, trial);
      const reached = squared(trial);
      isBetter = reached < sum;
      damping = isBetter ? Math.max(damping / 9, 1e-14) : Math.max(damping * 8, 1e-12);
      if (isBetter) [at, sum, value, trial] = [next, reached, trial, value];
    }
    if (!isBetter || length < smallStep || before - sum < smallGain * before) break;
  }
  const isAtBound = unknowns.map(({ low, high }, i) => at[i] === low || at[i] === high);
  return { at, sum, isAtBound };
}

const clamp = (value: number, low: number, high: number) => Math.min(Math.max(value, low), high);

function squared(values: Float64Array): number {
  let sum = 0;
  for (const value of values) sum += value * value;
  return sum;
}

/** JᵀJ and Jᵀr, the derivatives by central differences that stay within the bounds. */
function normalEquations(
  residuals: Residuals,
  count: number,
  unknowns: readonly Unknown[],
  at: readonly number[],
  value: Float64Array,
): { matrix: number[][]; gradient: number[] } {
  const up = new Float64Array(count);
  const columns = unknowns.map(({ low, high }, i) => {
    const here = at[i] ?? NaN;
    const step = 1e-6 * Math.max(1, Math.abs(here));
    const [from, to] = [Math.max(low, here - step), Math.min(high, here + step)];
    const column = new Float64Array(count);
    if (!(to > from)) return column;
    residuals(at.with(i, to), up);
    residuals(at.with(i, from), column);
    for (let k = 0; k < count; k++) column[k] = ((up[k] ?? NaN) - (column[k] ?? NaN)) / (to - from);
    return column;
  });
  const dot = (a: Float64Array, b: Float64Array) => a.reduce((sum, each, k) => sum + each * (b[k] ?? NaN), 0);
  return { matrix: columns.map((a) => columns.map((b) => dot(a, b))), gradient: columns.map((a) => dot(a, value)) };
}

/** One damped step; an unknown that its bound holds back is left out of it. */
function stepped(
  matrix: number[][],
  gradient: number[],
  damping: number,
  at: readonly number[],
  unknowns: readonly Unknown[],
): number[] {
  const isFree = unknowns.map(({ low, high }, i) => {
    const slope = gradient[i] ?? 0;
    return low < high && !((at[i] ?? 0) <= low && slope > 0) && !((at[i] ?? 0) >= high && slope < 0);
  });
  const damped = matrix.map((row, i) =>
    row.map((each, j) => {
      if (!isFree[i] || !isFree[j]) return i === j ? 1 : 0;
      return i === j ? each * (1 + damping) + Number.MIN_VALUE : each;
    }),
  );
  const step = solved(
    damped,
    gradient.map((each, i) => (isFree[i] ? -each : 0)),
  );
  return unknowns.map(({ low, high }, i) => clamp((at[i] ?? 0) + (step[i] ?? 0), low, high));
}

/** A small system by elimination with pivots; a direction that says nothing gets 0. */
function solved(matrix: number[][], right: number[]): number[] {
  const n = right.length;
  const rows = matrix.map((row, i) => [...row, right[i] ?? 0]);
  const used: number[] = [];
  for (let column = 0; column < n; column++) {
    const rest = rows.map((_, i) => i).filter((i) => !used.includes(i));
    const pivot = rest.reduce((best, i) => (size(rows, i, column) > size(rows, best, column) ? i : best), rest[0] ?? 0);
    used.push(pivot);
    const lead = rows[pivot] ?? [];
    if (!(size(rows, pivot, column) > 0)) continue;
    rows.forEach((row, i) => {
      if (i === pivot) return;
      const factor = (row[column] ?? 0) / (lead[column] ?? 1);
      for (let k = column; k <= n; k++) row[k] = (row[k] ?? 0) - factor * (lead[k] ?? 0);
    });
  }
  return used.map((pivot, column) => {
    const value = (rows[pivot]?.[n] ?? 0) / (rows[pivot]?.[column] ?? 0);
    return Number.isFinite(value) ? value : 0;
  });
}

const size = (rows: number[][], i: number, column: number) => Math.abs(rows[i]?.[column] ?? 0);
