/**
 * The value of an analytic function of s together with its derivative by s (forward differentiation). An `Analytic`
 * is also a plain `Complex`, so whoever needs only the value hands it on as it is. Group delay comes from here:
 * exact, never a difference of neighbouring points.
 */
import type { Complex } from "@/lib/line/complex";

export interface Analytic extends Complex {
  /** real and imaginary part of the derivative by s */
  readonly slopeRe: number;
  readonly slopeIm: number;
}

/** A value that does not depend on s. */
export function steady(re: number, im = 0): Analytic {
  return { re, im, slopeRe: 0, slopeIm: 0 };
}

export function analytic(value: Complex, slope: Complex): Analytic {
  return { re: value.re, im: value.im, slopeRe: slope.re, slopeIm: slope.im };
}

export function slopeOf(a: Analytic): Complex {
  return { re: a.slopeRe, im: a.slopeIm };
}

export function sum(a: Analytic, b: Analytic): Analytic {
  return { re: a.re + b.re, im: a.im + b.im, slopeRe: a.slopeRe + b.slopeRe, slopeIm: a.slopeIm + b.slopeIm };
}

export function difference(a: Analytic, b: Analytic): Analytic {
  return { re: a.re - b.re, im: a.im - b.im, slopeRe: a.slopeRe - b.slopeRe, slopeIm: a.slopeIm - b.slopeIm };
}

export function product(a: Analytic, b: Analytic): Analytic {
  return {
    re: a.re * b.re - a.im * b.im,
    im: a.re * b.im + a.im * b.re,
    slopeRe: a.slopeRe * b.re - a.slopeIm * b.im + a.re * b.slopeRe - a.im * b.slopeIm,
    slopeIm: a.slopeRe * b.im + a.slopeIm * b.re + a.re * b.slopeIm + a.im * b.slopeRe,
  };
}

/** a·x + b·y in one step: what every chain matrix does, so it makes no numbers on the way. */
export function sumOfProducts(a: Analytic, x: Analytic, b: Analytic, y: Analytic): Analytic {
  return {
    re: a.re * x.re - a.im * x.im + b.re * y.re - b.im * y.im,
    im: a.re * x.im + a.im * x.re + b.re * y.im + b.im * y.re,
    slopeRe:
      a.slopeRe * x.re -
      a.slopeIm * x.im +
      a.re * x.slopeRe -
      a.im * x.slopeIm +
      (b.slopeRe * y.re - b.slopeIm * y.im + b.re * y.slopeRe - b.im * y.slopeIm),
    slopeIm:
      a.slopeRe * x.im +
      a.slopeIm * x.re +
      a.re * x.slopeIm +
      a.im * x.slopeRe +
      (b.slopeRe * y.im + b.slopeIm * y.re + b.re * y.slopeIm + b.im * y.slopeRe),
  };
}

/** A real multiple. */
export function times(a: Analytic, factor: number): Analytic {
  return { re: a.re * factor, im: a.im * factor, slopeRe: a.slopeRe * factor, slopeIm: a.slopeIm * factor };
}

/** A real multiple of a product. */
export function timesProduct(factor: number, a: Analytic, b: Analytic): Analytic {
  const re = a.re * factor;
  const im = a.im * factor;
  return {
    re: re * b.re - im * b.im,
    im: re * b.im + im * b.re,
    slopeRe: (a.slopeRe * b.re - a.slopeIm * b.im) * factor + (re * b.slopeRe - im * b.slopeIm),
    slopeIm: (a.slopeRe * b.im + a.slopeIm * b.re) * factor + (re * b.slopeIm + im * b.slopeRe),
  };
}

/** a / b; the derivative is (a' − (a/b)·b') / b. */
export function quotient(a: Analytic, b: Analytic): Analytic {
  const size = b.re * b.re + b.im * b.im;
  const re = (a.re * b.re + a.im * b.im) / size;
  const im = (a.im * b.re - a.re * b.im) / size;
  const restRe = a.slopeRe - re * b.slopeRe + im * b.slopeIm;
  const restIm = a.slopeIm - re * b.slopeIm - im * b.slopeRe;
  return {
    re,
    im,
    slopeRe: (restRe * b.re + restIm * b.im) / size,
    slopeIm: (restIm * b.re - restRe * b.im) / size,
  };
}

/**
 * Principal square root, real part at least 0; the derivative is a' / (2√a). At 0 the derivative is reported as 0:
 * it has none there.
 */
export function root(a: Analytic): Analytic {
  const magnitude = Math.sqrt(a.re * a.re + a.im * a.im);
  if (magnitude === 0) return { re: 0, im: 0, slopeRe: 0, slopeIm: 0 };
  const larger = Math.sqrt((magnitude + Math.abs(a.re)) / 2);
  const smaller = a.im / (2 * larger);
  const re = a.re >= 0 ? larger : Math.abs(smaller);
  const im = a.re >= 0 ? smaller : a.im < 0 ? -larger : larger;
  // 1/(2√a) = conj(√a) / (2|a|)
  const half = 0.5 / magnitude;
  return {
    re,
    im,
    slopeRe: (a.slopeRe * re + a.slopeIm * im) * half,
    slopeIm: (a.slopeIm * re - a.slopeRe * im) * half,
  };
}
