import { abs, add, divide, multiply, ONE, scale, tanh, type Complex } from "@/lib/line/complex";
import type { SpotFigures } from "@/lib/line/spot-figures";
import { portImpedance } from "@/lib/line/termination";

export type StubEnd = "open" | "short";

/** What of a cable a stub's impedance depends on. */
export type StubLine = Pick<SpotFigures, "gamma" | "zc">;

/**
 * Impedance of a stub at its near end, losses counted: Zc·tanh γl shorted, Zc·coth γl open.
 * @param length - metre, at least 0
 * @returns ohm; re = Infinity, im = NaN for an open stub of no length
 * @throws RangeError when the length is below 0 or not finite
 * Source: D. M. Pozar, Microwave Engineering, 4th ed., section 2.7, with ZL = 0 and ∞ in eq. 2.91.
 */
export function stubImpedance({ gamma, zc }: StubLine, length: number, end: StubEnd): Complex {
  if (!(length >= 0 && length < Infinity))
    throw new RangeError(`stubImpedance: length must be at least 0, got ${length}`);
  const t = tanh(scale(gamma, length));
  return end === "short" ? multiply(zc, t) : portImpedance({ v: zc, i: t });
}

/** Where a stub's reactance grows steadily with its length: from the least to the greatest it has there, ohm. */
interface Reach {
  from: { length: number; reactance: number };
  to: { length: number; reactance: number };
}

/** A branch's ends are looked for this close to it, as a share of a wavelength. */
const beside = 1e-12;

/**
 * The n-th stretch of lengths over which the reactance grows, counted from 0. Without loss it would run from −∞ to ∞
 * (the first shorted one from 0); loss rounds both ends off, and beyond them the stub is a resistance.
 */
function reachOf(line: StubLine, end: StubEnd, n: number): Reach {
  const quarter = Math.PI / 2 / line.gamma.im;
  const middle = end === "short" ? 2 * n * quarter : (2 * n + 1) * quarter;
  const least = Math.max(middle - quarter, 4 * beside * quarter);
  const reactance = (length: number) => stubImpedance(line, length, end).im;
  const from = n === 0 && end === "short" ? 0 : highest((length) => -reactance(length), least, middle);
  const to = highest(reactance, middle, middle + quarter * (1 - beside));
  return { from: { length: from, reactance: reactance(from) }, to: { length: to, reactance: reactance(to) } };
}

const golden = (Math.sqrt(5) - 1) / 2;

/** Where a function with one crest is highest, by golden section; 80 steps narrow the way by 10⁻¹⁶. */
function highest(value: (at: number) => number, from: number, to: number): number {
  let [low, high] = [from, to];
  for (let step = 0; step < 80; step++) {
    const [left, right] = [high - golden * (high - low), low + golden * (high - low)];
    if (value(left) > value(right)) high = right;
    else low = left;
  }
  return (low + high) / 2;
}

/**
 * The lengths at which a stub has a wanted reactance, where it acts as one: its reactance grows with its length.
 * @param reactance - ohm
 * @param count - how many at most, a half wavelength apart, whole, at least 1
 * @returns metre, ascending; empty where the cable's loss keeps every such stub from reaching it. A length of 0 (a
 *   short itself) is left out.
 */
export function stubLengths(line: StubLine, reactance: number, end: StubEnd, count = 2): number[] {
  const found: number[] = [];
  // For a shorted stub the first stretch holds no capacitive length, so one more is looked at.
  for (let n = 0; n <= count && found.length < count; n++) {
    const { from, to } = reachOf(line, end, n);
    if (!(reactance > from.reactance && reactance <= to.reactance)) continue;
    found.push(crossing((length) => stubImpedance(line, length, end).im - reactance, from.length, to.length));
  }
  return found;
}

/** Where a growing function that is not above 0 at `from` and not below it at `to` passes through 0, by halving. */
function crossing(value: (at: number) => number, from: number, to: number): number {
  let [low, high] = [from, to];
  for (let step = 0; step < 200; step++) {
    const middle = (low + high) / 2;
    if (middle === low || middle === high) break;
    if (value(middle) < 0) low = middle;
    else high = middle;
  }
  return high;
}

/** Greatest reactance, either way, that the shortest stubs of a cable have, ohm: what its loss leaves of infinity. */
export function greatestReactance(line: StubLine, end: StubEnd): { capacitive: number; inductive: number } {
  const [first, second] = [reachOf(line, end, 0), reachOf(line, end, 1)];
  return {
    capacitive: end === "open" ? first.from.reactance : second.from.reactance,
    inductive: first.to.reactance,
  };
}

/**
 * What a branch across a line takes from what passes it, between matched ends, dB: 20·log|1 + Zr/2Z|.
 * @param branch - impedance of the branch, ohm
 * @param referenceOhm - of the line and both ends, above 0
 * @returns Infinity for a short across the line, 0 for an open branch
 */
export function shuntLossDb(branch: Complex, referenceOhm: number): number {
  if (!(referenceOhm > 0)) throw new RangeError(`shuntLossDb: referenceOhm must be positive, got ${referenceOhm}`);
  if (branch.re === Infinity) return 0;
  if (branch.re === 0 && branch.im === 0) return Infinity;
  return 20 * Math.log10(abs(add(ONE, divide({ re: referenceOhm / 2, im: 0 }, branch))));
}
