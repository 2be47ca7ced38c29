/** What a run has to keep, and whether it does. */
import type { Plane } from "@/lib/line/element";

export const targetQuantities = [
  // prettier-ignore
  "loss",
  "returnLoss",
  "vswr",
  "delay",
  "skew",
  "level",
  "overshoot",
  "settling",
  "tapDip",
  "dcDrop",
  "idleBias",
  "voltage",
  "power",
] as const;
export type TargetQuantity = (typeof targetQuantities)[number];

/** Limits in the quantity's SI unit or dB. */
export interface Target {
  quantity: TargetQuantity;
  plane?: Plane | undefined;
  bandHz?: readonly [number, number] | undefined;
  atLeast?: number | undefined;
  atMost?: number | undefined;
}

/** What a quantity reaches over its band; NaN where it is not defined. */
export interface Reached {
  least: number;
  greatest: number;
}

export interface Judgement {
  /** the value that decides; NaN where it is not defined */
  value: number;
  /** how far inside the limit the value that decides is; below 0 where the target is missed; NaN as the value */
  margin: number;
  isMet: boolean;
  /** why it cannot be worked out, in words */
  why?: string;
}

/** Holds a target against what is reached: the limit that is nearest decides. */
export function judge({ atLeast = -Infinity, atMost = Infinity }: Target, { least, greatest }: Reached): Judgement {
  const above = atLeast === -Infinity ? Infinity : inside(least, atLeast);
  const below = atMost === Infinity ? Infinity : inside(atMost, greatest);
  const isAbove = !(below < above) || Number.isNaN(above);
  const margin = isAbove ? above : below;
  return { value: isAbove ? least : greatest, margin, isMet: above >= 0 && below >= 0 };
}

/** Upper less lower, of which one may be infinite. */
function inside(upper: number, lower: number): number {
  return upper === lower ? 0 : upper - lower;
}

/**
 * Indices of the frequencies (hertz) that lie in a band, its ends included; without a band those of the first `asked`,
 * behind which the ends of other bands may stand.
 */
export function indicesInBand(frequencies: ArrayLike<number>, band: Target["bandHz"], asked: number): number[] {
  if (!band) return Array.from({ length: asked }, (_, k) => k);
  const all = Array.from({ length: frequencies.length }, (_, k) => k);
  return all.filter((k) => frequencies[k]! >= band[0] * (1 - 1e-12) && frequencies[k]! <= band[1] * (1 + 1e-12));
}

/** The frequencies asked, and after them the ends of every band that are not among them, hertz. */
export function frequenciesWithBands(frequencies: ArrayLike<number>, targets: readonly Target[]): Float64Array {
  const asked = new Set(Array.from(frequencies));
  const ends = targets.flatMap(({ bandHz }) => bandHz ?? []).filter((end) => !asked.has(end));
  return Float64Array.from([...Array.from(frequencies), ...new Set(ends)]);
}

/** Least and greatest of some of the values; NaN where one of them is, or where there are none. */
export function reachedOver(values: ArrayLike<number>, indices: readonly number[], offset = 0): Reached {
  let least = indices.length > 0 ? Infinity : NaN;
  let greatest = indices.length > 0 ? -Infinity : NaN;
  for (const k of indices) {
    const value = values[offset + k]!;
    if (!(value >= least)) least = value;
    if (!(value <= greatest)) greatest = value;
    if (Number.isNaN(value)) return { least: NaN, greatest: NaN };
  }
  return { least, greatest };
}
