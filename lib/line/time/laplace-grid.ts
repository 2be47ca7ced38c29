/** Where a Laplace transform is looked at so that a fast Fourier transform turns it into a signal. */
import { realSignal } from "@/lib/line/time/fft";
import type { EdgeShape } from "@/lib/line/time/drive";

/** s_k = damping + j·omega[k], k = 0 … count − 1, evenly spaced from 0. */
export interface LaplaceGrid {
  count: number;
  /** 1/s, above 0 */
  damping: number;
  /** rad/s */
  omega: Float64Array;
  /** number of values of the transform, a power of two */
  size: number;
  /** time from one value of the signal to the next, second */
  stepS: number;
  /** how many of those make one step of what is shown */
  every: number;
}

export interface Shown {
  /** second, above 0; what is shown runs from 0 to here */
  windowS: number;
  /** values shown, both ends counted, a whole number of at least 2 */
  points: number;
}

/** What comes round from the next period is this much smaller. */
const foldedOver = Math.log(1e7);
/** Least values of the transform, and least steps to an edge; the spectrum of a raised cosine falls less steeply. */
const leastSize = 4096;
const stepsPerEdge = { sineSquared: 16, raisedCosine: 32 };
/** Edges in the longest window allowed: 65,536 values at 16 steps an edge, of which half are shown. */
export const mostEdges = 2048;

/**
 * The grid for a window. The period is twice the window (a little more, so that what is shown falls on values), the
 * damping makes what folds over from beyond it 10⁻⁷ times smaller, and the spectrum reaches as far as 16 steps an edge
 * do, for a raised cosine 32.
 * @throws RangeError when the window holds more than 2,048 edges, or the points are not a whole number of at least 2
 * Source: damped inverse transform, K. S. Crump, J. ACM 23 (1976) 89.
 */
export function laplaceGrid({ windowS, points }: Shown, riseS: number, edge: EdgeShape): LaplaceGrid {
  if (!(windowS > 0 && windowS <= mostEdges * riseS * (1 + 1e-12)))
    throw new RangeError(`laplaceGrid: windowS must be above 0 and at most ${mostEdges * riseS}, got ${windowS}`);
  if (!(points >= 2 && Number.isInteger(points)))
    throw new RangeError(`laplaceGrid: points must be a whole number of at least 2, got ${points}`);
  const key = `${windowS} ${points} ${riseS} ${edge}`;
  if (last?.key !== key) last = { key, grid: gridFor({ windowS, points }, riseS, edge) };
  return last.grid;
}

/** The grid asked for last: edits of a run and solves ask for the same one again and again. It is never changed. */
let last: { key: string; grid: LaplaceGrid } | undefined;

function gridFor({ windowS, points }: Shown, riseS: number, edge: EdgeShape): LaplaceGrid {
  const shownStep = windowS / (points - 1);
  const steps = stepsPerEdge[edge];
  const least = Math.ceil((steps * shownStep) / riseS) * 2 * (points - 1);
  const size = Math.max(leastSize, 2 ** Math.ceil(Math.log2(least)));
  const every = Math.floor(size / (2 * (points - 1)));
  const stepS = shownStep / every;
  const period = size * stepS;
  const count = Math.min(size / 2, Math.max(leastSize / 2, Math.ceil((steps * period) / (2 * riseS)))) + 1;
  const apart = (2 * Math.PI) / period;
  const omega = new Float64Array(count);
  for (let k = 0; k < count; k++) omega[k] = k * apart;
  return { count, damping: foldedOver / period, omega, size, stepS, every };
}

/**
 * The signal of a transform looked at on a grid.
 * @returns values from 0 on, `stepS` apart, as far as is shown
 */
export function signalOf(re: Float64Array, im: Float64Array, grid: LaplaceGrid, points: number): Float64Array {
  const length = (points - 1) * grid.every + 1;
  const signal = realSignal(re, im, grid.size, length);
  const growth = Math.exp(grid.damping * grid.stepS);
  let factor = 1 / (grid.size * grid.stepS);
  for (let n = 0; n < length; n++) {
    signal[n]! *= factor;
    factor *= growth;
  }
  return signal;
}
