/**
 * Voltage and current at one plane of a run over many frequencies at once, values only, and the steps toward the
 * source. The readable form of each step is in `section.ts` and `two-port.ts`; tests hold both against each other.
 */
import type { LineColumns } from "@/lib/line/line-columns";
import type { TwoPort } from "@/lib/line/two-port";

export interface WaveColumns {
  vRe: Float64Array;
  vIm: Float64Array;
  iRe: Float64Array;
  iIm: Float64Array;
  /** neper: the true voltage and current are e^{scale} times what stands here; Infinity behind what lets nothing through */
  scale: Float64Array;
}

/** A chain matrix at every frequency. */
export interface MatrixColumns {
  /** re and im of a, b, c, d, each length N */
  entries: Float64Array[];
  scale: Float64Array;
}

export function waveColumns(count: number): WaveColumns {
  const column = () => new Float64Array(count);
  return { vRe: column(), vIm: column(), iRe: column(), iIm: column(), scale: column() };
}

export function copyWave(from: WaveColumns, to: WaveColumns): void {
  to.vRe.set(from.vRe);
  to.vIm.set(from.vIm);
  to.iRe.set(from.iRe);
  to.iIm.set(from.iIm);
  to.scale.set(from.scale);
}

export function matrixColumns(count: number): MatrixColumns {
  return { entries: Array.from({ length: 8 }, () => new Float64Array(count)), scale: new Float64Array(count) };
}

export function putMatrix({ entries, scale }: MatrixColumns, k: number, { a, b, c, d, logScale }: TwoPort): void {
  [a.re, a.im, b.re, b.im, c.re, c.im, d.re, d.im].forEach((value, n) => (entries[n]![k] = value));
  scale[k] = logScale;
}

const TWO_OVER_PI = 2 / Math.PI;
/** The first 33 bits of π/2, and the rest: a multiple of the first by a whole number below 2^20 is exact. */
const HALF_PI = Math.floor((Math.PI / 2) * 2 ** 32) / 2 ** 32;
const HALF_PI_REST = Math.PI / 2 - HALF_PI + 6.123233995736766e-17;
/** Beyond this angle the machine's own functions are asked. */
const largestAngle = 1.6e6;
/** cos and sin of a whole number of quarter turns. */
const quarterCos = Float64Array.of(1, 0, -1, 0);
const quarterSin = Float64Array.of(0, 1, 0, -1);

/**
 * From the load side of a length of line to its source side, by its two waves: with a = v + Zc·i and b = v − Zc·i
 * there, v = (a + b·e^{−2γl})/2 and i = (a − b·e^{−2γl})/(2Zc) here, over e^{γl}; its phase is left out, since it turns
 * voltage and current alike.
 * @param length - metre, at least 0
 * @param paralleled - identical cables side by side
 * Source: sine and cosine by two-part reduction to ±π/4, W. J. Cody and W. Waite, Software Manual for the Elementary
 * Functions, 1980, chapter 8, then Taylor's series, whose rest is below 10⁻¹⁶.
 */
export function stepAlongLine(line: LineColumns, length: number, paralleled: number, wave: WaveColumns): void {
  const { gammaRe, gammaIm, zcRe, zcIm, ycRe, ycIm } = line;
  const { vRe, vIm, iRe, iIm, scale } = wave;
  const share = 1 / paralleled;
  const half = paralleled / 2;
  for (let k = 0; k < vRe.length; k++) {
    const loss = gammaRe[k]! * length;
    const angle = 2 * gammaIm[k]! * length;
    const turns = angle < largestAngle ? Math.floor(angle * TWO_OVER_PI + 0.5) : 0;
    const r = angle - turns * HALF_PI - turns * HALF_PI_REST;
    const z = r * r;
    // prettier-ignore
    const s = r - r * z * (1 / 6 - z * (1 / 120 - z * (1 / 5040 - z * (1 / 362880 - z * (1 / 39916800 - z * (1 / 6227020800 - z * (1 / 1307674368000)))))));
    // prettier-ignore
    const c = 1 - z * (0.5 - z * (1 / 24 - z * (1 / 720 - z * (1 / 40320 - z * (1 / 3628800 - z * (1 / 479001600 - z * (1 / 87178291200 - z * (1 / 20922789888000))))))));
    const quarter = turns & 3;
    const left = Math.exp(-2 * loss);
    const isFar = turns === 0 && angle > 1;
    const eRe = left * (isFar ? Math.cos(angle) : c * quarterCos[quarter]! - s * quarterSin[quarter]!);
    const eIm = -left * (isFar ? Math.sin(angle) : s * quarterCos[quarter]! + c * quarterSin[quarter]!);
    const zRe = zcRe[k]! * share;
    const zIm = zcIm[k]! * share;
    const uRe = zRe * iRe[k]! - zIm * iIm[k]!;
    const uIm = zRe * iIm[k]! + zIm * iRe[k]!;
    const bRe = vRe[k]! - uRe;
    const bIm = vIm[k]! - uIm;
    const backRe = bRe * eRe - bIm * eIm;
    const backIm = bRe * eIm + bIm * eRe;
    const aRe = vRe[k]! + uRe;
    const aIm = vIm[k]! + uIm;
    const dRe = (aRe - backRe) * half;
    const dIm = (aIm - backIm) * half;
    vRe[k] = (aRe + backRe) * 0.5;
    vIm[k] = (aIm + backIm) * 0.5;
    iRe[k] = dRe * ycRe[k]! - dIm * ycIm[k]!;
    iIm[k] = dRe * ycIm[k]! + dIm * ycRe[k]!;
    scale[k]! += loss;
  }
}

/**
 * From the load side of a two-port to its source side.
 * @param impedance - multiplies what the matrix has in ohm, divides what it has in siemens: one matrix serves a part
 * or a joint at every value it takes
 */
export function stepThroughMatrix({ entries, scale: lost }: MatrixColumns, impedance: number, wave: WaveColumns): void {
  const [aRe, aIm, bRe, bIm, cRe, cIm, dRe, dIm] = entries as [Float64Array, ...Float64Array[]];
  const { vRe, vIm, iRe, iIm, scale } = wave;
  const admittance = 1 / impedance;
  for (let k = 0; k < vRe.length; k++) {
    const [v, w, i, j] = [vRe[k]!, vIm[k]!, iRe[k]! * impedance, iIm[k]! * impedance];
    vRe[k] = aRe[k]! * v - aIm![k]! * w + (bRe![k]! * i - bIm![k]! * j);
    vIm[k] = aRe[k]! * w + aIm![k]! * v + (bRe![k]! * j + bIm![k]! * i);
    iRe[k] = (cRe![k]! * v - cIm![k]! * w + (dRe![k]! * i - dIm![k]! * j)) * admittance;
    iIm[k] = (cRe![k]! * w + cIm![k]! * v + (dRe![k]! * j + dIm![k]! * i)) * admittance;
    scale[k]! += lost[k]!;
    // what lets nothing through shows its own short or open even where it has nothing to work on
    if (lost[k] === Infinity && vRe[k] === 0 && vIm[k] === 0 && iRe[k] === 0 && iIm[k] === 0)
      if (cRe![k] !== 0) iRe[k] = 1;
      else vRe[k] = 1;
  }
  normalise(wave);
}

/** Beyond this a voltage or current is brought back to about 1, and the scale remembers by how much. */
const largest = 1e100;

export function normalise({ vRe, vIm, iRe, iIm, scale }: WaveColumns): void {
  for (let k = 0; k < vRe.length; k++) {
    const size = Math.max(Math.abs(vRe[k]!), Math.abs(vIm[k]!), Math.abs(iRe[k]!), Math.abs(iIm[k]!));
    if (size <= largest && size >= 1 / largest) continue;
    if (!(size > 0 && size < Infinity)) continue;
    vRe[k]! /= size;
    vIm[k]! /= size;
    iRe[k]! /= size;
    iIm[k]! /= size;
    scale[k]! += Math.log(size);
  }
}
