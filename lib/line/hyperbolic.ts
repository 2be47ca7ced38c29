/**
 * cosh √P and (sinh √P)/√P: the two even functions every uniform line is made of. Both are analytic in P, so nothing
 * is lost at P = 0, and both are divided by e^{Re √P}, so nothing overflows on a run of any loss.
 */
import type { Analytic } from "@/lib/line/analytic";
import type { Complex } from "@/lib/line/complex";

export interface EvenHyperbolic {
  /** e^{−logScale}·cosh √P */
  cosh: Analytic;
  /** e^{−logScale}·(sinh √P)/√P, 1 at P = 0 */
  sinhc: Analytic;
  /** Re √P, at least 0 */
  logScale: number;
}

/**
 * The scaled even hyperbolic functions with their derivatives by s.
 * @param square - P, the square of the argument (γ²·length² of a line), with its derivative by s
 * @param x - real part of √P, at least 0
 * @param phase - imaginary part of √P
 * Source: d cosh√P/dP = sinhc/2, d sinhc/dP = (cosh − sinhc)/2P; the scaling constant is not differentiated.
 */
export function evenHyperbolic(square: Analytic, x: number, phase: number): EvenHyperbolic {
  const size = x * x + phase * phase;
  const sine = Math.sin(phase);
  const cosine = Math.cos(phase);
  const sinhScaled = -Math.expm1(-2 * x) / 2;
  const coshScaled = 1 - sinhScaled;
  const coshRe = coshScaled * cosine;
  const coshIm = sinhScaled * sine;
  const re = size === 0 ? 1 : (sinhScaled * cosine * x + coshScaled * sine * phase) / size;
  const im = size === 0 ? 0 : (coshScaled * sine * x - sinhScaled * cosine * phase) / size;
  const slope = sinhcSlope(square.re, square.im, coshRe - re, coshIm - im, x);
  return {
    cosh: {
      re: coshRe,
      im: coshIm,
      slopeRe: (re * square.slopeRe - im * square.slopeIm) / 2,
      slopeIm: (re * square.slopeIm + im * square.slopeRe) / 2,
    },
    sinhc: {
      re,
      im,
      slopeRe: slope.re * square.slopeRe - slope.im * square.slopeIm,
      slopeIm: slope.re * square.slopeIm + slope.im * square.slopeRe,
    },
    logScale: x,
  };
}

/** Below this |P|² the derivative of sinhc is summed as a series; at it both ways agree to 3·10⁻¹⁴. */
const seriesLimit = 1e-4;

/**
 * d sinhc/dP, scaled: (cosh − sinhc)/2P, which cancels near P = 0 and is there e^{−x}·(1/6 + P/60 + P²/1680 + P³/90720).
 * @param re - real part of P
 * @param im - imaginary part of P
 * @param differenceRe - real part of cosh − sinhc, scaled
 * @param differenceIm - its imaginary part
 * @param x - Re √P
 */
export function sinhcSlope(re: number, im: number, differenceRe: number, differenceIm: number, x: number): Complex {
  const size = re * re + im * im;
  if (size >= seriesLimit)
    return {
      re: (differenceRe * re + differenceIm * im) / (2 * size),
      im: (differenceIm * re - differenceRe * im) / (2 * size),
    };
  const factor = Math.exp(-x);
  const thirdRe = 1 / 1680 + re / 90720;
  const thirdIm = im / 90720;
  const secondRe = 1 / 60 + re * thirdRe - im * thirdIm;
  const secondIm = re * thirdIm + im * thirdRe;
  return { re: (1 / 6 + re * secondRe - im * secondIm) * factor, im: (re * secondIm + im * secondRe) * factor };
}
