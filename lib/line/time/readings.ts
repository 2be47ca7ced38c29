/** What people read off a step response: delay, rise, overshoot, settling. */
import { edgePart, emfAt, finalEmf, transitions, type Drive } from "@/lib/line/time/drive";
import { crossing } from "@/lib/line/time/signal";
import type { Signal } from "@/lib/line/time/time-response";

export interface ReadingOptions {
  /** fraction, above 0 and below 1, of the e.m.f. and of the settled level between which delay runs; default 0.5 */
  fraction?: number;
  /** volt at the node that delay runs to instead */
  thresholdV?: number;
  /** half width of the band in which a signal has settled, per settled level, above 0; default 0.05 */
  band?: number;
}

/** NaN stands for what does not happen within the window, or has no meaning (a level of 0). */
export interface Readings {
  /** from the fraction of the e.m.f. to the same fraction of the level, or to the threshold, second */
  delayS: number;
  /** from the start of the drive to the same moment, second */
  reachedS: number;
  /** 10 to 90 % of the level, second */
  riseS: number;
  /** peak over level − 1; below 0 where the level is not reached within the window */
  overshoot: number;
  /** last time outside the band about the level, second; 0 where it never is */
  settlingS: number;
  /** limit of s·V(s), volt */
  settledV: number;
}

/**
 * Readings of a node's signal. For a pulse or a bit pattern delay, rise and overshoot are those of its first edge, held
 * against the level that edge alone would lead to; settling and settled level are of the whole.
 * @param signal - voltage at the node, from the start of the drive
 * @param drive - of the source
 * @param level - settled voltage at the node per volt of e.m.f.
 * @throws RangeError when an option is out of range
 */
export function readings(signal: Signal, drive: Drive, level: number, options: ReadingOptions = {}): Readings {
  const { fraction = 0.5, thresholdV, band = 0.05 } = options;
  if (!(fraction > 0 && fraction < 1))
    throw new RangeError(`readings: fraction must be between 0 and 1, got ${fraction}`);
  if (!(band > 0)) throw new RangeError(`readings: band must be positive, got ${band}`);
  const [first] = transitions(drive);
  const held = level * (first?.jumpV ?? 0);
  // a voltage that is named is passed whatever is left in the end
  const toward = held === 0 ? (thresholdV ?? 0) : held;
  const reachedS = passes(signal, thresholdV ?? fraction * held, toward);
  const settledV = level * finalEmf(drive);
  return {
    reachedS,
    delayS: reachedS - emfReaches(drive, fraction),
    riseS: passes(signal, 0.9 * held, held) - passes(signal, 0.1 * held, held),
    overshoot: held === 0 ? NaN : peak(signal, held) / held - 1,
    settlingS: settling(signal, settledV, band * Math.abs(settledV === 0 ? held : settledV), drive),
    settledV,
  };
}

/** When the first edge of the e.m.f. has come to a fraction of its height, second. */
function emfReaches(drive: Drive, fraction: number): number {
  const [first] = transitions(drive);
  return first === undefined ? NaN : first.atS + edgePart(drive.edge ?? "sineSquared", fraction) * drive.riseS;
}

/** First time at a level on the way from 0 to where the signal is held, or, held nowhere, to that level. */
function passes(signal: Signal, level: number, held: number): number {
  return held === 0 || !Number.isFinite(held) ? NaN : crossing(signal, level, held > 0);
}

/** The value furthest on the side of the held level. */
function peak({ values }: Signal, held: number): number {
  const side = Math.sign(held);
  return values.reduce((most, value) => (side * value > side * most ? value : most), values[0]!);
}

/** Last time further than `width` from the level; NaN where that is where the window ends, or the drive is not over. */
function settling({ stepS, values }: Signal, level: number, width: number, drive: Drive): number {
  if (!Number.isFinite(level) || width === 0) return NaN;
  const outside = (n: number) => Math.abs(values[n]! - level) > width;
  const last = values.length - 1;
  if (emfAt(drive, last * stepS) !== finalEmf(drive) || outside(last)) return NaN;
  for (let n = last - 1; n >= 0; n--) {
    if (!outside(n)) continue;
    const edge = level + Math.sign(values[n]! - level) * width;
    return (n + (values[n]! - edge) / (values[n]! - values[n + 1]!)) * stepS;
  }
  return 0;
}
