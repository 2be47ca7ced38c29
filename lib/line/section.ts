import { product, quotient, steady, sum, times, type Analytic } from "@/lib/line/analytic";
import { perMetre } from "@/lib/line/cable";
import type { Complex } from "@/lib/line/complex";
import type { LineModel } from "@/lib/line/element";
import { evenHyperbolic } from "@/lib/line/hyperbolic";
import type { TwoPort, TwoPortAt } from "@/lib/line/two-port";

/**
 * A length of uniform line: a = d = cosh γl, b = Zl·sinhc γl, c = Yl·sinhc γl. Written with sinhc instead of Zc it is
 * exact at zero length and at dc.
 * @param model - at its temperature
 * @param length - metre, at least 0
 * @param paralleled - identical cables side by side, a whole number of at least 1
 * @throws RangeError when length or paralleled is out of range
 */
export function lineSection(model: LineModel, length: number, paralleled = 1): TwoPortAt {
  requireLength("lineSection", length);
  if (!(paralleled >= 1 && Number.isInteger(paralleled)))
    throw new RangeError(`lineSection: paralleled must be a whole number of at least 1, got ${paralleled}`);
  return (s) => {
    const { z, y } = perMetre(model, s);
    const series = times(z, length);
    const shunt = times(y, length);
    const { cosh, sinhc, logScale } = evenHyperbolic(product(series, shunt));
    const b = times(product(series, sinhc), 1 / paralleled);
    const c = times(product(shunt, sinhc), paralleled);
    return { a: cosh, b, c, d: cosh, logScale, matchedLoss: logScale };
  };
}

/**
 * Different cables side by side, joined at both ends: their admittance matrices add. Each is symmetrical, so the sum is
 * found by bisection: with both ends alike half a length sees an open middle (`even`), with opposite ends a shorted
 * one (`odd`), and nothing cancels whether the cables are short, long or resonant.
 * @param branches - models at their temperature and lengths in metre, above 0; at least one
 * @throws RangeError when there is no branch or a length is not positive
 * Source: A. C. Bartlett's bisection theorem.
 */
export function parallelSections(branches: { model: LineModel; length: number }[]): TwoPortAt {
  if (branches.length === 0) throw new RangeError("parallelSections: branches must not be empty");
  for (const { length } of branches)
    if (!(length > 0 && length < Infinity)) throw new RangeError(`parallelSections: length must be positive, got ${length}`);
  return (s) => joined(branches.map(({ model, length }) => bisected(model, length, s)));
}

interface Bisected {
  /** admittance of half the length with the middle open, and shorted, siemens */
  even: Analytic;
  odd: Analytic;
  /** 1/b of the whole length, times e^{logScale} */
  transfer: Analytic;
  logScale: number;
}

function bisected(model: LineModel, length: number, s: Complex): Bisected {
  const { z, y } = perMetre(model, s);
  const series = times(z, length);
  const shunt = times(y, length);
  const square = product(series, shunt);
  const half = evenHyperbolic(times(square, 0.25));
  const whole = evenHyperbolic(square);
  return {
    even: quotient(product(times(shunt, 0.5), half.sinhc), half.cosh),
    odd: quotient(half.cosh, product(times(series, 0.5), half.sinhc)),
    transfer: quotient(steady(1), product(series, whole.sinhc)),
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
  return { a, b: quotient(steady(1), transfer), c: quotient(product(even, odd), transfer), d: a, logScale, matchedLoss: 0 };
}

function requireLength(where: string, length: number): void {
  if (!(length >= 0 && length < Infinity)) throw new RangeError(`${where}: length must be at least 0, got ${length}`);
}
