/** The discrete Fourier transform, on pairs of Float64Array. */

interface Tables {
  /** where each value goes before the first stage */
  reversed: Uint32Array;
  /** cos and sin of 2πk/size, k below size */
  cos: Float64Array;
  sin: Float64Array;
  /** filled and used up within one call */
  re: Float64Array;
  im: Float64Array;
}

const known = new Map<number, Tables>();

function tablesOf(size: number): Tables {
  const found = known.get(size);
  if (found) return found;
  const reversed = new Uint32Array(size);
  for (let k = 1; k < size; k++) reversed[k] = (reversed[k >> 1]! >> 1) | (k & 1 ? size >> 1 : 0);
  const cos = Float64Array.from({ length: size }, (_, k) => Math.cos((2 * Math.PI * k) / size));
  const sin = Float64Array.from({ length: size }, (_, k) => Math.sin((2 * Math.PI * k) / size));
  const tables = { reversed, cos, sin, re: new Float64Array(size / 2), im: new Float64Array(size / 2) };
  known.set(size, tables);
  return tables;
}

function requireSize(where: string, size: number): void {
  if (!(size >= 2 && Number.isInteger(Math.log2(size))))
    throw new RangeError(`${where}: the number of values must be a power of two of at least 2, got ${size}`);
}

/**
 * In place x_n ← Σ x_k·e^{+j2πkn/N}, not divided by N.
 * @param re - real parts, length N, a power of two of at least 2
 * @param im - imaginary parts, length N
 * @throws RangeError when N is not a power of two or the lengths differ
 * Source: J. W. Cooley and J. W. Tukey, Math. Comp. 19 (1965) 297; two stages at a time as one of radix 4, W. M.
 * Gentleman and G. Sande, Proc. AFIPS 29 (1966) 563.
 */
export function inverseFft(re: Float64Array, im: Float64Array): void {
  const size = re.length;
  requireSize("inverseFft", size);
  if (im.length !== size) throw new RangeError(`inverseFft: im must have ${size} values, got ${im.length}`);
  const tables = tablesOf(size);
  reorder(re, tables.reversed);
  reorder(im, tables.reversed);
  let span = 1;
  if (Math.log2(size) % 2 === 1) {
    pairs(re, im);
    span = 2;
  }
  for (; span < size; span *= 4) quadruples(re, im, span, tables);
}

function reorder(values: Float64Array, reversed: Uint32Array): void {
  for (let k = 0; k < values.length; k++) {
    const to = reversed[k]!;
    if (to <= k) continue;
    const kept = values[k]!;
    values[k] = values[to]!;
    values[to] = kept;
  }
}

/** The stage of two, whose factors are ±1. */
function pairs(re: Float64Array, im: Float64Array): void {
  for (let k = 0; k < re.length; k += 2) {
    const aRe = re[k]!;
    const aIm = im[k]!;
    const bRe = re[k + 1]!;
    const bIm = im[k + 1]!;
    re[k] = aRe + bRe;
    im[k] = aIm + bIm;
    re[k + 1] = aRe - bRe;
    im[k + 1] = aIm - bIm;
  }
}

/** From transforms of `span` values to transforms of four times as many. */
function quadruples(re: Float64Array, im: Float64Array, span: number, { cos, sin }: Tables): void {
  const size = re.length;
  const stride = size / (4 * span);
  for (let j = 0; j < span; j++) {
    const k = j * stride;
    const c1 = cos[2 * k]!;
    const s1 = sin[2 * k]!;
    const c2 = cos[k]!;
    const s2 = sin[k]!;
    const c3 = cos[3 * k]!;
    const s3 = sin[3 * k]!;
    for (let at = j; at < size; at += 4 * span) {
      const atB = at + span;
      const atC = atB + span;
      const atD = atC + span;
      const bRe = re[atB]! * c1 - im[atB]! * s1;
      const bIm = re[atB]! * s1 + im[atB]! * c1;
      const cRe = re[atC]! * c2 - im[atC]! * s2;
      const cIm = re[atC]! * s2 + im[atC]! * c2;
      const dRe = re[atD]! * c3 - im[atD]! * s3;
      const dIm = re[atD]! * s3 + im[atD]! * c3;
      const sumRe = re[at]! + bRe;
      const sumIm = im[at]! + bIm;
      const gapRe = re[at]! - bRe;
      const gapIm = im[at]! - bIm;
      re[at] = sumRe + (cRe + dRe);
      im[at] = sumIm + (cIm + dIm);
      re[atC] = sumRe - (cRe + dRe);
      im[atC] = sumIm - (cIm + dIm);
      re[atB] = gapRe - (cIm - dIm);
      im[atB] = gapIm + (cRe - dRe);
      re[atD] = gapRe + (cIm - dIm);
      im[atD] = gapIm - (cRe - dRe);
    }
  }
}

/**
 * The real signal x_n = Σ X_k·e^{+j2πkn/N} over all k of a spectrum with X_{N−k} = X_k*, not divided by N. Half of it is
 * given, and it costs half a transform.
 * @param re - real parts of X_0 … X_{N/2}; where fewer are given the rest is 0
 * @param im - imaginary parts; those of X_0 and X_{N/2} count as 0
 * @param size - N, a power of two of at least 4
 * @param length - how many values of the signal are wanted, at most N
 * @returns that many values
 * @throws RangeError when N is not such a power or more is given than N/2 + 1 values
 */
export function realSignal(re: Float64Array, im: Float64Array, size: number, length = size): Float64Array {
  const half = size / 2;
  requireSize("realSignal", half);
  if (re.length > half + 1) throw new RangeError(`realSignal: at most ${half + 1} values, got ${re.length}`);
  const { cos, sin, re: outRe, im: outIm } = tablesOf(size);
  // where the spectrum has ended there is 0
  const xRe = re.length > half ? re : padded(re, half + 1);
  const xIm = im.length > half ? im : padded(im, half + 1);
  outRe[0] = xRe[0]! + xRe[half]!;
  outIm[0] = xRe[0]! - xRe[half]!;
  for (let k = 1; k < half; k++) {
    const mirrorRe = xRe[half - k]!;
    const mirrorIm = -xIm[half - k]!;
    const gapRe = xRe[k]! - mirrorRe;
    const gapIm = xIm[k]! - mirrorIm;
    outRe[k] = xRe[k]! + mirrorRe - (gapRe * sin[k]! + gapIm * cos[k]!);
    outIm[k] = xIm[k]! + mirrorIm + (gapRe * cos[k]! - gapIm * sin[k]!);
  }
  inverseFft(outRe, outIm);
  const signal = new Float64Array(length);
  for (let n = 0; n < length; n++) signal[n] = n % 2 === 0 ? outRe[n >> 1]! : outIm[n >> 1]!;
  return signal;
}

function padded(values: Float64Array, length: number): Float64Array {
  const result = new Float64Array(length);
  result.set(values);
  return result;
}
