import { add, complex, reciprocal, type Complex } from "@/lib/line/complex";
import { lSections } from "@/lib/line/match/l-section";
import { lossySections, type PartsQ } from "@/lib/line/match/l-section-lossy";

export type ThreePartTopology = "pi" | "T";

/** Susceptances of the parts across in siemens, with their loss; reactances of those in series in ohm. None is 0. */
export interface ThreeParts {
  /** across in a pi, in series in a T; next to what is matched */
  atLoad: number;
  middle: number;
  atTarget: number;
}

/** What a part across, or in series, next to the load must be less than to count as none: of 1/R or R. */
const nothing = 1e-9;

/**
 * The least Q of a pi or T: that of the L-section between the same two resistances, √(Rhigh/Rlow − 1).
 * @param load - ohm; its resistance is taken in parallel form for a pi, in series form for a T
 */
export function leastQ(load: Complex, targetOhm: number, topology: ThreePartTopology): number {
  const resistance = topology === "pi" ? 1 / reciprocal(load).re : load.re;
  const [low, high] = [Math.min(resistance, targetOhm), Math.max(resistance, targetOhm)];
  return Math.sqrt(high / low - 1);
}

/**
 * Every pi or T of a chosen Q between a load and a resistance: two L-sections back to back at a middle resistance, which
 * lies below both for a pi, above both for a T. Q fixes the part next to the load, up to its sign; the other two then are
 * the L-sections between what it leaves and the target, solved with the parts' loss.
 * @param load - ohm, resistance above 0
 * @param targetOhm - ohm, above 0
 * @param networkQ - √(Rhigh/Rmiddle − 1) of a pi, √(Rmiddle/Rlow − 1) of a T; above `leastQ`
 * @returns up to four; none where the Q is not above the least one
 * Source: F. E. Terman, Radio Engineers' Handbook, 1943, section 3 (pi and T as L-sections in a row); C. Bowick, RF
 * Circuit Design, 1982, chapter 4.
 */
export function threeParts(
  load: Complex,
  targetOhm: number,
  topology: ThreePartTopology,
  networkQ: number,
  q: PartsQ,
): ThreeParts[] {
  if (!(load.re > 0 && networkQ > leastQ(load, targetOhm, topology))) return [];
  return [1, -1].flatMap((sign) =>
    topology === "pi" ? pis(load, targetOhm, networkQ, sign, q) : tees(load, targetOhm, networkQ, sign, q),
  );
}

function pis(load: Complex, targetOhm: number, networkQ: number, sign: number, q: PartsQ): ThreeParts[] {
  const admittance = reciprocal(load);
  const middle = Math.max(1 / admittance.re, targetOhm) / (1 + networkQ * networkQ);
  const total = sign * Math.sqrt(admittance.re * (1 / middle - admittance.re));
  const b = total - admittance.im;
  if (Math.abs(b) < nothing * admittance.re) return [];
  const seen = reciprocal(add(admittance, complex(Math.abs(b) / (b > 0 ? q.capacitor : q.coil), b)));
  return rest(seen, targetOhm, q)
    .filter(({ topology }) => topology === "seriesAtLoad")
    .map((each) => ({ atLoad: b, middle: each.seriesReactanceOhm, atTarget: each.shuntSusceptanceS }));
}

function tees(load: Complex, targetOhm: number, networkQ: number, sign: number, q: PartsQ): ThreeParts[] {
  const middle = Math.min(load.re, targetOhm) * (1 + networkQ * networkQ);
  const total = sign * Math.sqrt(load.re * (middle - load.re));
  const x = total - load.im;
  if (Math.abs(x) < nothing * load.re) return [];
  const seen = add(load, complex(Math.abs(x) / (x > 0 ? q.coil : q.capacitor), x));
  return rest(seen, targetOhm, q)
    .filter(({ topology }) => topology === "shuntAtLoad")
    .map((each) => ({ atLoad: x, middle: each.shuntSusceptanceS, atTarget: each.seriesReactanceOhm }));
}

/** The L-sections that have both their parts. */
function rest(seen: Complex, targetOhm: number, q: PartsQ) {
  const isLossy = q.coil < Infinity || q.capacitor < Infinity;
  const all = isLossy ? lossySections(seen, targetOhm, q) : lSections(seen, targetOhm);
  return all.filter((each) => each.seriesReactanceOhm !== 0 && each.shuntSusceptanceS !== 0);
}
