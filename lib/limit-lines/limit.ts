/** A limit line of the wire as the engine reads it: megahertz, pieces of a formula. Pure, runs in the browser too. */
import { limitAt, type Limit, type LimitPiece } from "@/lib/line/limits/limit-line";

/** dB, but delay and skew in seconds and resistances in ohm. */
export type LimitQuantity = "insertionLoss" | "returnLoss" | "delay" | "skew" | "dcLoop" | "conductorDc";

/** Link: the cable laid and its outlets. Channel: with the cords at both ends. Segment: a bus from end to end. */
export type LimitOf = "cable" | "link" | "channel" | "segment";

/** k0 + k1·√x + k2·x + k3/√x + kLog·log₁₀x, x being the frequency over the formula's reference. */
export interface FormulaPiece {
  fromHz: number;
  toHz: number;
  k0?: number;
  k1?: number;
  k2?: number;
  k3?: number;
  kLog?: number;
}

export interface LimitPoint {
  frequencyHz: number;
  value: number;
}

export type LimitCurve =
  | { form: "formula"; referenceHz: number; pieces: readonly FormulaPiece[] }
  /** ascending; between two of them straight over the logarithm of frequency */
  | { form: "points"; points: readonly LimitPoint[] }
  | { form: "constant"; value: number };

export interface LimitLine {
  quantity: LimitQuantity;
  of: LimitOf;
  /** the line is for this length and grows with it, metres; absent: for the whole, whatever its length */
  perLengthM?: number;
  curve: LimitCurve;
}

const mega = 1e6;

/** Whether the quantity must be at least its limit; otherwise at most. */
export function isFloor(quantity: LimitQuantity): boolean {
  return quantity === "returnLoss";
}

function pieceOf(
  { fromHz, toHz, k0, k1 = 0, k2 = 0, k3 = 0, kLog = 0 }: FormulaPiece,
  referenceHz: number,
): LimitPiece {
  const times = mega / referenceHz;
  const at = referenceHz / mega;
  return {
    ...{ fromMhz: fromHz / mega, toMhz: toHz / mega, constant: k0, root: k1 * Math.sqrt(times), linear: k2 * times },
    ...{ inverseRoot: k3 / Math.sqrt(times), perDecade: kLog, at },
  };
}

/** Between two points the value is straight over log f: a constant and so much a decade from the lower one. */
function pieceBetween(from: LimitPoint, to: LimitPoint): LimitPiece {
  const [fromMhz, toMhz] = [from.frequencyHz / mega, to.frequencyHz / mega];
  const perDecade = (to.value - from.value) / Math.log10(toMhz / fromMhz);
  return { fromMhz, toMhz, constant: from.value, perDecade, at: fromMhz };
}

function piecesOf(curve: LimitCurve): LimitPiece[] {
  if (curve.form === "constant") return [{ fromMhz: 0, toMhz: Infinity, constant: curve.value }];
  if (curve.form === "formula") return curve.pieces.map((piece) => pieceOf(piece, curve.referenceHz));
  return curve.points.slice(1).map((to, i) => pieceBetween(curve.points[i] as LimitPoint, to));
}

/**
 * The line for a length, as the engine's functions of limits take it.
 * @param length - metres, above 0; needed where the line is per length
 * @throws RangeError when the length is needed and is not positive
 */
export function limitFor({ quantity, perLengthM, curve }: LimitLine, length?: number): Limit {
  if (perLengthM !== undefined && !(length !== undefined && length > 0 && length < Infinity))
    throw new RangeError(`limitFor: this line is per length, and the length must be positive, got ${length}`);
  const scale = perLengthM === undefined || length === undefined ? 1 : length / perLengthM;
  return { bound: isFloor(quantity) ? "atLeast" : "atMost", scale, pieces: piecesOf(curve) };
}

/**
 * The limit at each frequency.
 * @param frequencies - hertz, above 0, length N
 * @returns length N, dB, seconds or ohm; NaN where the line says nothing
 * @throws RangeError when a frequency is not positive, or as `limitFor`
 */
export function limitOver(line: LimitLine, frequencies: ArrayLike<number>, length?: number): Float64Array {
  const limit = limitFor(line, length);
  return Float64Array.from(frequencies, (frequency) => limitAt(limit, frequency));
}

/** Lowest and highest frequency a curve says anything about, hertz; null for one that holds everywhere. */
export function limitRange(curve: LimitCurve): [number, number] | null {
  if (curve.form === "constant") return null;
  if (curve.form === "formula") return [curve.pieces[0]?.fromHz ?? NaN, curve.pieces.at(-1)?.toHz ?? NaN];
  return [curve.points[0]?.frequencyHz ?? NaN, curve.points.at(-1)?.frequencyHz ?? NaN];
}
