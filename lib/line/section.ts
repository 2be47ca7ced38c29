import { product, quotient, steady, sum, times, timesProduct, type Analytic } from "@/lib/line/analytic";
import type { LineAt, PerMetre } from "@/lib/line/cable";
import { evenHyperbolic } from "@/lib/line/hyperbolic";
import type { TwoPort, TwoPortAt } from "@/lib/line/two-port";

/**
 * A length of uniform line: a = d = cosh γl, b = Zl·sinhc γl, c = Yl·sinhc γl. Written with sinhc instead of Zc it is
 * exact at zero length and at dc.
 * @param line - at its temperature
 * @param length - metre, at least 0
 * @param paralleled - identical cables side by side, a whole number of at least 1
 * @throws RangeError when length or paralleled is out of range
 */
export function lineSection(line: LineAt, length: number, paralleled = 1): TwoPortAt {
  requireLength("lineSection", length);
  if (!(paralleled >= 1 && Number.isInteger(paralleled)))
    throw new RangeError(`lineSection: paralleled must be a whole number of at least 1, got ${paralleled}`);
  const square = length * length;
  return (s) => {
    const { z, y, gammaSquared, gamma } = line(s);
    const { cosh, sinhc, logScale } = evenHyperbolic(times(gammaSquared, square), gamma.re * length, gamma.im * length);
    const b = timesProduct(length / paralleled, z, sinhc);
    const c = timesProduct(length * paralleled, y, sinhc);
    return { a: cosh, b, c, d: cosh, logScale, matchedLoss: logScale };
  };
}

/**
 * Different cables side by side, joined at both ends: their admittance matrices add. Each is symmetrical, so the sum is
 * found by bisection: with both ends alike half a length sees an open middle (`even`), with opposite ends a shorted
 * one (`odd`), and nothing cancels whether the cables are short, long or resonant.
 * @param branches - lines at their temperature and lengths in metre, above 0; at least one
 * @throws RangeError when there is no branch or a length is not positive
 * Source: A. C. Bartlett's bisection theorem.
 */
export function parallelSections(branches: { line: LineAt; length: number }[]): TwoPortAt {
  if (branches.length === 0) throw new RangeError("parallelSections: branches must not be empty");
  for (const { length } of branches)
    if (!(length > 0 && length < Infinity))
      throw new RangeError(`parallelSections: length must be positive, got ${length}`);
  return (s) => joined(branches.map(({ line, length }) => bisected(line(s), length)));
}

interface Bisected {
  /** admittance of half the length with the middle open, and shorted, siemens */
  even: Analytic;
  odd: Analytic;
  /** 1/b of the whole length, times e^{logScale} */
  transfer: Analytic;
  logScale: number;
}

function bisected({ z, y, gammaSquared, gamma }: PerMetre, length: number): Bisected {
  const [re, im] = [gamma.re * length, gamma.im * length];
  const half = evenHyperbolic(times(gammaSquared, (length * length) / 4), re / 2, im / 2);
  const whole = evenHyperbolic(times(gammaSquared, length * length), re, im);
  return {
    even: quotient(product(times(y, length / 2), half.sinhc), half.cosh),
    odd: quotient(half.cosh, product(times(z, length / 2), half.sinhc)),
    transfer: quotient(steady(1), product(times(z, length), whole.sinhc)),
    logScale: whole.logScale,
  };
}

function joined(branches: Bisected[]): TwoPort {
  const logScale = Math.min(...branches.map((branch) => branch.logScale));
  let even = steady(0);
  let odd = steady(0);
  let transfer = steady(0);
  for (const branch of branches) {
    even = sum(even, branch.even);
    odd = sum(odd, branch.odd);
    transfer = sum(transfer, times(branch.transfer, Math.exp(logScale - branch.logScale)));
  }
  const a = quotient(times(sum(even, odd), 0.5), transfer);
  return {
    a,
    b: quotient(steady(1), transfer),
    c: quotient(product(even, odd), transfer),
    d: a,
    logScale,
    matchedLoss: 0,
  };
}

function requireLength(where: string, length: number): void {
  if (!(length >= 0 && length < Infinity)) throw new RangeError(`${where}: length must be at least 0, got ${length}`);
}
