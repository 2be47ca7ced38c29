/**
 * A two-port by its chain matrix, (V1, I1) = [a b; c d]·(V2, I2) with I2 flowing out toward the load. The matrix is
 * kept divided by e^{logScale}, a real number, so a run of any loss multiplies without overflow.
 * Source: D. M. Pozar, Microwave Engineering, 4th ed., section 4.4.
 */
import { difference, quotient, steady, sum, sumOfProducts, times, type Analytic } from "@/lib/line/analytic";
import { scale, type Complex } from "@/lib/line/complex";
import type { Port } from "@/lib/line/termination";

export interface TwoPort {
  a: Analytic;
  /** ohm */
  b: Analytic;
  /** siemens */
  c: Analytic;
  d: Analytic;
  /**
   * neper, at least 0: the matrix is e^{logScale} times what stands here. Infinity for what lets nothing through
   * (a shunt short, a series open); the matrix then gives the direction of (V1, I1) only.
   */
  logScale: number;
  /** nominal loss between matched ends, neper: attenuation of a cable, of a pad, of a joint; 0 for all else */
  matchedLoss: number;
}

/** A two-port as a function of complex frequency, its constants worked out once. */
export type TwoPortAt = (s: Complex) => TwoPort;

export const ONE = steady(1);
export const NONE = steady(0);
export const THROUGH: TwoPort = { a: ONE, b: NONE, c: NONE, d: ONE, logScale: 0, matchedLoss: 0 };

/** The two-port of one after the other, source side first. */
export function cascade(first: TwoPort, second: TwoPort): TwoPort {
  return {
    a: sumOfProducts(first.a, second.a, first.b, second.c),
    b: sumOfProducts(first.a, second.b, first.b, second.d),
    c: sumOfProducts(first.c, second.a, first.d, second.c),
    d: sumOfProducts(first.c, second.b, first.d, second.d),
    logScale: first.logScale + second.logScale,
    matchedLoss: first.matchedLoss + second.matchedLoss,
  };
}

/**
 * Voltage and current at the source side of a two-port from those at its load side, both over e^{logScale}.
 * What lets nothing through shows its own short or open even where it has nothing to work on.
 */
export function throughTwoPort(twoPort: TwoPort, port: Port): Port {
  const v = sumOfProducts(twoPort.a, port.v, twoPort.b, port.i);
  const i = sumOfProducts(twoPort.c, port.v, twoPort.d, port.i);
  if (twoPort.logScale < Infinity || v.re !== 0 || v.im !== 0 || i.re !== 0 || i.im !== 0) return { v, i };
  return twoPort.c.re !== 0 ? { v, i: ONE } : { v: ONE, i };
}

/**
 * The chain matrix itself, not divided by anything.
 * @returns a, d dimensionless, b ohm, c siemens; beyond about 6100 dB they are not finite
 */
export function chainMatrix(twoPort: TwoPort): { a: Complex; b: Complex; c: Complex; d: Complex } {
  const factor = Math.exp(twoPort.logScale);
  return {
    a: scale(twoPort.a, factor),
    b: scale(twoPort.b, factor),
    c: scale(twoPort.c, factor),
    d: scale(twoPort.d, factor),
  };
}

export interface Scattering {
  s11: Analytic;
  s12: Analytic;
  s21: Analytic;
  s22: Analytic;
}

/**
 * Scattering parameters in one real reference impedance; forward transmission of a very lossy run tends to 0.
 * @param referenceOhm - above 0
 * @throws RangeError when referenceOhm is not positive
 */
export function scattering(twoPort: TwoPort, referenceOhm: number): Scattering {
  if (!(referenceOhm > 0)) throw new RangeError(`scattering: referenceOhm must be positive, got ${referenceOhm}`);
  const { a, d } = twoPort;
  const b = times(twoPort.b, 1 / referenceOhm);
  const c = times(twoPort.c, referenceOhm);
  const denominator = sum(sum(a, d), sum(b, c));
  const spread = difference(a, d);
  const skew = difference(b, c);
  // every two-port here is reciprocal: a·d − b·c = 1, so both transmissions are 2/denominator
  const transmission = quotient(steady(2 * Math.exp(-twoPort.logScale)), denominator);
  return {
    s11: quotient(sum(skew, spread), denominator),
    s12: transmission,
    s21: transmission,
    s22: quotient(difference(skew, spread), denominator),
  };
}
