/** Ripples of a standing wave: how many there are, and the two curves that hold them. */
import type { Values } from "@/components/plot/curve";

/** Indices of the crests and troughs, leaving out what stands out by less than `least`. */
function turns(values: Values, least: number): { highs: number[]; lows: number[] } {
  const highs: number[] = [];
  const lows: number[] = [];
  let [best, isRising] = [0, true];
  values.forEach((value, i) => {
    if (value === null) return;
    const extreme = values[best] ?? value;
    if (isRising ? value >= extreme : value <= extreme) best = i;
    else if (Math.abs(value - extreme) > least) {
      // The first sample is where the line begins, not a crest.
      if (best > 0) (isRising ? highs : lows).push(best);
      isRising = !isRising;
      best = i;
    }
  });
  return { highs, lows };
}

function span(values: Values): number {
  let [least, most] = [Infinity, -Infinity];
  for (const value of values) {
    if (value === null || !Number.isFinite(value)) continue;
    least = Math.min(least, value);
    most = Math.max(most, value);
  }
  return most > least ? most - least : 0;
}

/** Number of crests, leaving out what is smaller than 1 % of the whole spread. */
export function rippleCount(values: Values): number {
  return turns(values, 0.01 * span(values)).highs.length;
}

/** More ripples than this, or ripples finer than this many px, are drawn as the curves that hold them. */
const mostRipples = 80;
const leastPxPerRipple = 5;

export function isTooDense(values: Values, lengthPx: number): boolean {
  const count = rippleCount(values);
  return count > mostRipples || lengthPx / Math.max(1, count) < leastPxPerRipple;
}

/** A point of an envelope: the value of one sample, standing at the place of another. */
export interface EnvelopePoint {
  atIndex: number;
  valueIndex: number;
}

function through(crests: readonly number[], last: number): EnvelopePoint[] {
  const [first = 0, end = last] = [crests[0], crests.at(-1)];
  return [
    { atIndex: 0, valueIndex: first },
    ...crests.map((i) => ({ atIndex: i, valueIndex: i })),
    { atIndex: last, valueIndex: end },
  ];
}

/** The upper and the lower curve, drawn level from the last crest to each end. */
export function envelope(values: Values): { upper: EnvelopePoint[]; lower: EnvelopePoint[] } {
  const { highs, lows } = turns(values, 0.01 * span(values));
  return { upper: through(highs, values.length - 1), lower: through(lows, values.length - 1) };
}
