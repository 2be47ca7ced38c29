/**
 * cosh √P and (sinh √P)/√P: the two even functions every uniform line is made of. Both are analytic in P, so nothing
 * is lost at P = 0, and both are divided by e^{Re √P}, so nothing overflows on a run of any loss.
 */
import { product, root, type Analytic } from "@/lib/line/analytic";

export interface EvenHyperbolic {
  /** e^{−logScale}·cosh √P */
  cosh: Analytic;
  /** e^{−logScale}·(sinh √P)/√P, 1 at P = 0 */
  sinhc: Analytic;
  /** Re √P, at least 0 */
  logScale: number;
}

/** Below this |P| the derivative of sinhc is summed as a series; at it both ways agree to 3·10⁻¹⁴. */
const seriesLimit = 1e-2;

/**
 * The scaled even hyperbolic functions with their derivatives by s.
 * @param square - P, the square of the argument (γ²·length² of a line), with its derivative by s
 * @param argument - √P with real part at least 0, where the caller has it at hand from better conditioned factors
 * Source: d cosh√P/dP = sinhc/2, d sinhc/dP = (cosh − sinhc)/2P; the scaling constant is not differentiated.
 */
export function evenHyperbolic(square: Analytic, argument: { re: number; im: number } = root(square)): EvenHyperbolic {
  const x = argument.re;
  const sine = Math.sin(argument.im);
  const cosine = Math.cos(argument.im);
  const sinhScaled = -Math.expm1(-2 * x) / 2;
  const coshScaled = 1 - sinhScaled;
  const coshRe = coshScaled * cosine;
  const coshIm = sinhScaled * sine;
  const size = x * x + argument.im * argument.im;
  if (size === 0) return atZero(square);
  const sinhRe = sinhScaled * cosine;
  const sinhIm = coshScaled * sine;
  const re = (sinhRe * x + sinhIm * argument.im) / size;
  const im = (sinhIm * x - sinhRe * argument.im) / size;
  const slope = size < seriesLimit ? sinhcSlopeSeries(square, Math.exp(-x)) : sinhcSlope(coshRe - re, coshIm - im, square);
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

function atZero(square: Analytic): EvenHyperbolic {
  return {
    cosh: { re: 1, im: 0, slopeRe: square.slopeRe / 2, slopeIm: square.slopeIm / 2 },
    sinhc: { re: 1, im: 0, slopeRe: square.slopeRe / 6, slopeIm: square.slopeIm / 6 },
    logScale: 0,
  };
}

/** (cosh − sinhc) / 2P. */
function sinhcSlope(differenceRe: number, differenceIm: number, square: Analytic): { re: number; im: number } {
  const size = 2 * (square.re * square.re + square.im * square.im);
  return {
    re: (differenceRe * square.re + differenceIm * square.im) / size,
    im: (differenceIm * square.re - differenceRe * square.im) / size,
  };
}

/** The same by its power series 1/6 + P/60 + P²/1680 + P³/90720, times the scale factor. */
function sinhcSlopeSeries(square: Analytic, factor: number): { re: number; im: number } {
  const p = { re: square.re, im: square.im, slopeRe: 0, slopeIm: 0 };
  const third = { re: 1 / 1680 + p.re / 90720, im: p.im / 90720, slopeRe: 0, slopeIm: 0 };
  const second = product(p, third);
  const first = product(p, { re: 1 / 60 + second.re, im: second.im, slopeRe: 0, slopeIm: 0 });
  return { re: (1 / 6 + first.re) * factor, im: first.im * factor };
}
