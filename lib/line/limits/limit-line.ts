/** A limit that a standard sets on a cable, a link or a channel, over frequency or once for all. */
import type { Seen } from "@/lib/line/materials";

export type LimitQuantity = "insertionLoss" | "returnLoss" | "delay" | "delaySkew" | "dcLoop" | "conductorDc";

/**
 * One stretch of a limit: constant + root·√f + linear·f + inverseRoot/√f + perDecade·log10(f/at), f in MHz as standards
 * print it; ends belong to it.
 */
export interface LimitPiece {
  fromMhz: number;
  toMhz: number;
  constant?: number;
  root?: number;
  linear?: number;
  inverseRoot?: number;
  perDecade?: number;
  /** MHz; needed with perDecade */
  at?: number;
}

export interface StandardLimit {
  id: string;
  standard: string;
  edition: string;
  /** null where the clause was not seen */
  clause: string | null;
  /** category or class, as the standard calls it */
  category: string;
  object: "cable" | "channel" | "permanentLink" | "segment";
  quantity: LimitQuantity;
  bound: "atMost" | "atLeast";
  /** what one unit of the pieces is: dB, second or ohm */
  unit: "dB" | "s" | "ohm";
  /** what the pieces' figures are multiplied by to be in that unit */
  scale: number;
  /** length of cable that the limit is for, metre; null for a channel or link of any length */
  lengthM: number | null;
  /** of the limit, °C; null where it does not depend on it */
  temperatureC: number | null;
  /** a limit that does not depend on frequency has one piece from 0 to Infinity */
  pieces: readonly LimitPiece[];
  source: string;
  seen: Seen;
}

/** What a limit is worked out from, whoever set it. */
export type Limit = Pick<StandardLimit, "bound" | "scale" | "pieces">;

/** What to say beside a limit that was recalled. */
export const checkYourEdition = "Recalled without the page at hand: check your edition.";

/**
 * A limit at a frequency, in its unit; NaN where the standard sets none.
 * @param frequency - hertz, above 0
 * @throws RangeError when the frequency is not positive
 */
export function limitAt(limit: Limit, frequency: number): number {
  if (!(frequency > 0)) throw new RangeError(`limitAt: frequency must be positive, got ${frequency}`);
  const f = frequency / 1e6;
  const piece = limit.pieces.find(({ fromMhz, toMhz }) => f >= fromMhz && f <= toMhz);
  return piece ? limit.scale * valueOf(piece, f) : NaN;
}

function valueOf(piece: LimitPiece, f: number): number {
  const { constant = 0, root = 0, linear = 0, inverseRoot = 0, perDecade = 0, at = 1 } = piece;
  return constant + root * Math.sqrt(f) + linear * f + inverseRoot / Math.sqrt(f) + perDecade * Math.log10(f / at);
}

/**
 * How far a value is inside a limit, in its unit: negative outside, NaN where there is no limit.
 * @param value - of the same length of cable as the limit
 */
export function marginTo(limit: Limit, frequency: number, value: number): number {
  const bound = limitAt(limit, frequency);
  return limit.bound === "atMost" ? bound - value : value - bound;
}

/** The margin that is least over a sweep, and where; undefined where no frequency has a limit. */
export function worstMargin(
  limit: Limit,
  frequencies: ArrayLike<number>,
  values: ArrayLike<number>,
): { margin: number; frequency: number } | undefined {
  let worst: { margin: number; frequency: number } | undefined;
  for (let k = 0; k < frequencies.length; k++) {
    const frequency = frequencies[k] ?? NaN;
    const margin = marginTo(limit, frequency, values[k] ?? NaN);
    if (!Number.isNaN(margin) && !(worst && margin >= worst.margin)) worst = { margin, frequency };
  }
  return worst;
}
