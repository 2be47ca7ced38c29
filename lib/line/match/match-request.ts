/** What a matching job is asked with and answered with, the same shapes as `/compute/matches`. */
import type { Element, Line, Termination } from "@/lib/line/element";
import type { CutTolerance } from "@/lib/line/match/at-limits";

export const matchMethods = [
  "shuntStub",
  "seriesStub",
  "quarterWave",
  "seriesSection",
  "parallelCables",
  "lSection",
] as const;
export type MatchMethod = (typeof matchMethods)[number];

/** A line to cut from, with the name people know it by; without one it is called by its impedance. */
export interface MatchLine extends Line {
  label?: string;
}

export interface MatchRequest {
  load: Termination;
  /**
   * what stands between the network and the load, from the network to the load; without any, the network is at the
   * load. A joint that names no impedance takes the feeder's, as it would in a run
   */
  behind?: readonly Element[];
  /** what the match must show toward the source, ohm, above 0 */
  targetOhm: number;
  designHz: number;
  /** from and to, hertz, 0 < from ≤ to */
  bandHz: readonly [number, number];
  /** asked over the band, dB, above 0 */
  returnLossDb: number;
  /** the line between load (or what stands behind) and network; without one, the line nearest to the target is taken and the notes say so */
  feeder?: MatchLine;
  /** for stubs and sections */
  lines: readonly MatchLine[];
  /** default all */
  methods?: readonly MatchMethod[];
  /** Q of the parts at the design frequency, above 0; a part without one is taken as lossless */
  partQ?: { coilQ?: number; capacitorQ?: number };
  /** how well the match will be made; with it each candidate says what it keeps at its worst */
  tolerance?: CutTolerance;
  /** default 20 */
  temperatureC?: number;
}

export interface Candidate {
  method: MatchMethod;
  /** what it is, up to the first comma; then its lengths or values */
  title: string;
  /** the network alone, from the target side to the load */
  elements: Element[];
  /** at the design frequency; null for an exact match (180 dB and more, where only rounding is left) */
  designReturnLossDb: number | null;
  /** contiguous width around the design frequency where the asked return loss holds; 0 where it does not hold there */
  bandwidthHz: number;
  /** least over the band; null for a perfect match throughout */
  worstReturnLossDb: number | null;
  /** least over the band with every length and value at its worst limits; only where a tolerance is asked for */
  worstReturnLossAtLimitsDb?: number | null;
  /** available source power over power in the load, most over the band; null where no power arrives */
  worstTransducerLossDb: number | null;
  /** the same over the power that leaves the network; that of `worstTransducerLossDb` where the network is at the load */
  worstMatchLossDb: number | null;
  /** cable to cut, metres, each of paralleled lengths counted */
  totalLengthM: number;
  needs: string[];
  notes: string[];
}

export interface Refusal {
  method: MatchMethod;
  /** a sentence */
  why: string;
}

/** A way to match before it is judged over the band. */
export type Proposal = Pick<Candidate, "method" | "title" | "elements" | "needs" | "notes">;

/** What a method found; where that is nothing, `why` is the reason. */
export interface Outcome {
  proposals: Proposal[];
  why: string;
}

/** @throws RangeError when a number of the request is out of its range */
export function checkRequest(request: MatchRequest): void {
  const { targetOhm, designHz, bandHz, returnLossDb, partQ } = request;
  requirePositive("targetOhm", targetOhm);
  requirePositive("designHz", designHz);
  requirePositive("bandHz from", bandHz[0]);
  requirePositive("bandHz to", bandHz[1]);
  if (bandHz[1] < bandHz[0]) throw new RangeError(`findMatches: bandHz must ascend, got ${bandHz[0]} to ${bandHz[1]}`);
  requirePositive("returnLossDb", returnLossDb);
  if (partQ?.coilQ !== undefined) requirePositive("coilQ", partQ.coilQ);
  if (partQ?.capacitorQ !== undefined) requirePositive("capacitorQ", partQ.capacitorQ);
}

function requirePositive(name: string, value: number): void {
  if (!(value > 0 && value < Infinity)) throw new RangeError(`findMatches: ${name} must be positive, got ${value}`);
}
