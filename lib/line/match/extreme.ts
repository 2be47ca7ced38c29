import { goldenSection } from "@/lib/line/golden-section";
import type { MatchRequest } from "@/lib/line/match/match-request";
import { knownRange, rippleHz } from "@/lib/line/match/seen-load";

/** Leaves 6·10⁻⁶ of the interval, 10⁻¹¹ of the peak. */
const goldenSteps = 25;

export interface Band {
  designHz: number;
  bandHz: readonly [number, number];
  /** asked over the band, dB */
  returnLossDb: number;
  /** where the load is known, hertz; 0 and Infinity for one that is known everywhere */
  knownHz: readonly [number, number];
  /** frequencies to look at besides, such as the samples of the load */
  besidesHz: readonly number[];
  /** from one ripple of what stands behind to the next, hertz; Infinity where nothing does */
  rippleHz: number;
}

/** The band a request is judged over. */
export function bandOf(request: MatchRequest): Band {
  const { designHz, bandHz, returnLossDb } = request;
  return { designHz, bandHz, returnLossDb, ...knownRange(request), rippleHz: rippleHz(request) };
}

/** Steps to a ripple that miss none, and leave its top to be followed. */
export const stepsToRipple = 8;

/**
 * The frequencies at which a band is looked at, ascending: evenly, 61 and 64 more per design frequency of width, at most
 * 1001; 8 more per ripple of what stands behind, at most 4001 in all; its edges, the design frequency where it lies
 * inside and those of `besidesHz` among them.
 */
export function bandSamples({ designHz, bandHz: [from, to], besidesHz, rippleHz }: Band): number[] {
  const plain = Math.min(1001, Math.ceil(61 + (64 * (to - from)) / designHz));
  const count = Math.min(4001, plain + Math.ceil((stepsToRipple * (to - from)) / rippleHz));
  const even = Array.from({ length: count }, (_, k) => from + ((to - from) * k) / (count - 1));
  even[count - 1] = to;
  const more = [designHz, ...besidesHz].filter((f) => f > from && f < to);
  return [...new Set([...even, ...more])].sort((a, b) => a - b);
}

/**
 * The greatest value between the first and last frequency, at least the greatest sample: of the samples that stand above
 * their neighbours the one whose parabola reaches highest is followed to its true extreme by golden section, since among
 * many like ripples the greatest sample need not lie on the greatest.
 * @param values - `values[k]` is the value at `frequencies[k]`
 */
export function greatest(
  value: (frequency: number) => number,
  frequencies: readonly number[],
  values: readonly number[],
): number {
  let [atSample, highest, best] = [values[0]!, -Infinity, 0];
  for (let k = 1; k < values.length; k++) {
    atSample = Math.max(atSample, values[k]!);
    const top = k < values.length - 1 ? parabolaTop(values[k - 1]!, values[k]!, values[k + 1]!) : undefined;
    if (top !== undefined && top > highest) [highest, best] = [top, k];
  }
  if (!(highest > atSample)) return atSample;
  return Math.max(atSample, goldenSection(value, frequencies[best - 1]!, frequencies[best + 1]!, goldenSteps).value);
}

/** The top of the parabola through three evenly spaced values; undefined where the middle one is not above both others. */
function parabolaTop(before: number, middle: number, after: number): number | undefined {
  if (!(middle >= before && middle >= after && middle < Infinity)) return undefined;
  const bend = 2 * middle - before - after;
  return bend > 0 ? middle + (before - after) ** 2 / (8 * bend) : middle;
}
