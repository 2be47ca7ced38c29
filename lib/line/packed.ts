/**
 * The hot path of a sweep: numbers of `analytic.ts` laid out in a Float64Array, four to a number (re, im, slopeRe,
 * slopeIm), so that walking a run makes no objects. The readable form of each step is in `hyperbolic.ts`, `section.ts`
 * and `two-port.ts`; tests hold both against each other.
 */
import type { Analytic } from "@/lib/line/analytic";
import type { PerMetre } from "@/lib/line/cable";
import { sinhcSlope } from "@/lib/line/hyperbolic";

/** Numbers to a packed value, and to a plane: voltage, then current. */
export const VALUE = 4;
export const PLANE = 2 * VALUE;

export function put(out: Float64Array, at: number, value: Analytic): void {
  out[at] = value.re;
  out[at + 1] = value.im;
  out[at + 2] = value.slopeRe;
  out[at + 3] = value.slopeIm;
}

export function take(from: Float64Array, at: number): Analytic {
  return { re: from[at]!, im: from[at + 1]!, slopeRe: from[at + 2]!, slopeIm: from[at + 3]! };
}

/** out ← factor·a·(b at j). */
function putProduct(out: Float64Array, at: number, factor: number, a: Analytic, b: Float64Array, j: number): void {
  const re = a.re * factor;
  const im = a.im * factor;
  const slopeRe = a.slopeRe * factor;
  const slopeIm = a.slopeIm * factor;
  const bRe = b[j]!;
  const bIm = b[j + 1]!;
  out[at] = re * bRe - im * bIm;
  out[at + 1] = re * bIm + im * bRe;
  out[at + 2] = slopeRe * bRe - slopeIm * bIm + (re * b[j + 2]! - im * b[j + 3]!);
  out[at + 3] = slopeRe * bIm + slopeIm * bRe + (re * b[j + 3]! + im * b[j + 2]!);
}

/** out ← (a at i)·(v at j) + (b at k)·(v at j + VALUE): one row of a chain matrix on a plane. */
function putRow(
  out: Float64Array,
  at: number,
  m: Float64Array,
  i: number,
  k: number,
  v: Float64Array,
  j: number,
): void {
  const aRe = m[i]!,
    aIm = m[i + 1]!,
    bRe = m[k]!,
    bIm = m[k + 1]!;
  const vRe = v[j]!,
    vIm = v[j + 1]!,
    iRe = v[j + 4]!,
    iIm = v[j + 5]!;
  out[at] = aRe * vRe - aIm * vIm + (bRe * iRe - bIm * iIm);
  out[at + 1] = aRe * vIm + aIm * vRe + (bRe * iIm + bIm * iRe);
  out[at + 2] =
    m[i + 2]! * vRe -
    m[i + 3]! * vIm +
    (aRe * v[j + 2]! - aIm * v[j + 3]!) +
    (m[k + 2]! * iRe - m[k + 3]! * iIm + (bRe * v[j + 6]! - bIm * v[j + 7]!));
  out[at + 3] =
    m[i + 2]! * vIm +
    m[i + 3]! * vRe +
    (aRe * v[j + 3]! + aIm * v[j + 2]!) +
    (m[k + 2]! * iIm + m[k + 3]! * iRe + (bRe * v[j + 7]! + bIm * v[j + 6]!));
}

/** cosh, sinhc, b and c of the line being walked through; filled and used up within one call. */
const matrix = new Float64Array(4 * VALUE);
const COSH = 0;
const SINHC = VALUE;
const B = 2 * VALUE;
const C = 3 * VALUE;

/**
 * From the plane at the load side of a length of line to the one at its source side.
 * @param planes - packed planes; the one at `from` is read, the one at `to` written over e^{logScale}
 * @returns logScale, neper: the line's attenuation
 */
export function stepThroughLine(
  line: PerMetre,
  length: number,
  paralleled: number,
  planes: Float64Array,
  from: number,
  to: number,
): number {
  putEvenHyperbolic(matrix, line, length);
  putProduct(matrix, B, length / paralleled, line.z, matrix, SINHC);
  putProduct(matrix, C, length * paralleled, line.y, matrix, SINHC);
  putRow(planes, to, matrix, COSH, B, planes, from);
  putRow(planes, to + VALUE, matrix, C, COSH, planes, from);
  return line.gamma.re * length;
}

/** `evenHyperbolic` of a length of line. */
function putEvenHyperbolic(out: Float64Array, { gammaSquared, gamma }: PerMetre, length: number): void {
  const x = gamma.re * length;
  const phase = gamma.im * length;
  const area = length * length;
  const slopeRe = gammaSquared.slopeRe * area;
  const slopeIm = gammaSquared.slopeIm * area;
  const size = x * x + phase * phase;
  const sine = Math.sin(phase);
  const cosine = Math.cos(phase);
  const sinhScaled = -Math.expm1(-2 * x) / 2;
  const coshScaled = 1 - sinhScaled;
  const coshRe = coshScaled * cosine;
  const coshIm = sinhScaled * sine;
  const re = size === 0 ? 1 : (sinhScaled * cosine * x + coshScaled * sine * phase) / size;
  const im = size === 0 ? 0 : (coshScaled * sine * x - sinhScaled * cosine * phase) / size;
  const slope = sinhcSlope(gammaSquared.re * area, gammaSquared.im * area, coshRe - re, coshIm - im, x);
  out[COSH] = coshRe;
  out[COSH + 1] = coshIm;
  out[COSH + 2] = (re * slopeRe - im * slopeIm) / 2;
  out[COSH + 3] = (re * slopeIm + im * slopeRe) / 2;
  out[SINHC] = re;
  out[SINHC + 1] = im;
  out[SINHC + 2] = slope.re * slopeRe - slope.im * slopeIm;
  out[SINHC + 3] = slope.re * slopeIm + slope.im * slopeRe;
}
