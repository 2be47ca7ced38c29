/** What a matching job is asked with and answered with, the same shapes as `/compute/matches`. */
import type { Element, Line, Termination } from "@/lib/line/element";
import type { CutTolerance } from "@/lib/line/match/at-limits";

export const matchMethods = [
  "shuntStub",
  "seriesStub",
  "doubleStub",
  "quarterWave",
  "seriesSection",
  "parallelCables",
  "binomial",
  "equalRipple",
  "alternatingSections",
  "lSection",
  "piNetwork",
  "tNetwork",
  "pad",
  "notchStub",
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
  /** two of the lines one after the other among series sections, and side by side among paralleled cables */
  pairs?: boolean;
  /** default all */
  methods?: readonly MatchMethod[];
  /** of a double stub: wavelengths of the feeder from stub to stub, above 0 and under a half; default an eighth */
  spacingWavelengths?: number;
  /** of a double stub: wavelengths of the feeder from the load to the first stub, 0 to under a half; default 0 */
  firstDistanceWavelengths?: number;
  /** of binomial and equal-ripple transformers, 1 to 10; default as few, from 2 to 5, as keep the band without loss */
  sections?: number;
  /** ripple of an equal-ripple transformer, dB; default 6 dB better than the return loss asked over the band */
  rippleReturnLossDb?: number;
  /** loaded Q of pi and T networks at their middle resistance; default 1.5 times that of an L-section, at least 2 */
  networkQ?: number;
  /** frequency to keep from the load, not the design frequency; without it there is no notch stub */
  notchHz?: number;
  /** what joints and ends add to each piece of cable in all, metre; what is to be cut is that much shorter; default 0 */
  endAllowanceM?: number;
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
  /** share of seeded draws within the tolerance that keep the asked return loss over the band; only with a tolerance */
  yieldPercent?: number;
  /** a section is a line that no cable given has the impedance of, and has to be made; absent where none is */
  hasIdealLine?: true;
  /** resistors of a pad from the source side, ohm: series, shunt, series, or shunt, series, shunt; 0 is a wire */
  resistorsOhm?: [number, number, number];
  /** available source power over power in the load at the notch; null where no power arrives; notch stubs only */
  notchLossDb?: number | null;
  /** available source power over power in the load, most over the band; null where no power arrives */
  worstTransducerLossDb: number | null;
  /** the same over the power that leaves the network; that of `worstTransducerLossDb` where the network is at the load */
  worstMatchLossDb: number | null;
  /** cable to cut, metres, each of paralleled lengths counted */
  totalLengthM: number;
  /** what to cut, from the target side to the load */
  cuts: Cut[];
  needs: string[];
  notes: string[];
}

/** A piece of cable to cut. */
export interface Cut {
  /** what the piece is called in the run */
  name: string;
  /** the line's name */
  line: string;
  /** identical pieces side by side */
  count: number;
  /** physical length that the match is worked out with, metre */
  lengthM: number;
  /** the same less what its joints and ends add, metre; null where nothing would be left */
  cutM: number | null;
  /** how the best frequency moves for each metre taken off, hertz, up above 0; null where no exact match is left to move */
  trimHzPerM: number | null;
}

export interface Refusal {
  method: MatchMethod;
  /** a sentence */
  why: string;
}

/** A way to match before it is judged over the band. */
export type Proposal = Pick<
  Candidate,
  "method" | "title" | "elements" | "needs" | "notes" | "resistorsOhm" | "hasIdealLine"
>;

/** What a method found; where that is nothing, `why` is the reason. */
export interface Outcome {
  proposals: Proposal[];
  why: string;
}
