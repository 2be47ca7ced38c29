/** What hangs on the line at one point: a shunt or series branch made of any termination, a stub, or one part. */
import { product, quotient, sum, times, steady, type Analytic } from "@/lib/line/analytic";
import type { Complex } from "@/lib/line/complex";
import type { PartElement, Termination } from "@/lib/line/element";
import { terminationPort, type Port } from "@/lib/line/termination";
import { NONE, ONE, throughTwoPort, type TwoPort, type TwoPortAt } from "@/lib/line/two-port";

/** A branch across the line. A branch of 0 Ω lets nothing through. */
export function shuntBranch({ v, i }: Port): TwoPort {
  if (v.re === 0 && v.im === 0) return { a: NONE, b: NONE, c: ONE, d: NONE, logScale: Infinity, matchedLoss: 0 };
  return { a: ONE, b: NONE, c: quotient(i, v), d: ONE, logScale: 0, matchedLoss: 0 };
}

/** A branch in the line. An open branch lets nothing through. */
export function seriesBranch({ v, i }: Port): TwoPort {
  if (i.re === 0 && i.im === 0) return { a: NONE, b: ONE, c: NONE, d: NONE, logScale: Infinity, matchedLoss: 0 };
  return { a: ONE, b: quotient(v, i), c: NONE, d: ONE, logScale: 0, matchedLoss: 0 };
}

export function branch(connection: "shunt" | "series", port: Port): TwoPort {
  return connection === "shunt" ? shuntBranch(port) : seriesBranch(port);
}

/** A stub: a length of line with a far end, seen from its near end, as a branch. */
export function stubBranch(connection: "shunt" | "series", section: TwoPortAt, end: Termination): TwoPortAt {
  return (s) => branch(connection, throughTwoPort(section(s), terminationPort(end, s)));
}

/**
 * One resistor, coil or capacitor as a branch.
 * Loss: with `q` and `qAtHz` a fixed series resistance (coil 2π·qAtHz·L/q, capacitor 1/(2π·qAtHz·C·q)); with `q` alone
 * that Q at every frequency, |X|/q, which only means something on the imaginary axis.
 * @throws RangeError when not exactly one of rOhm, lH, cF is given, when one is out of range, or off the imaginary axis
 * where Q holds at every frequency
 */
export function partBranch(part: PartElement): TwoPortAt {
  requirePart(part);
  return (s) => branch(part.connection, partPort(part, s));
}

function partPort(part: PartElement, s: Complex): Port {
  if (part.rOhm !== undefined) return { v: steady(part.rOhm), i: ONE };
  if (part.q !== undefined && part.qAtHz === undefined && s.re !== 0)
    throw new RangeError(`partBranch: a Q that holds at every frequency needs Re s = 0, got ${s.re}`);
  return part.lH !== undefined ? coilPort(part, part.lH, s) : capacitorPort(part, part.cF!, s);
}

/** sL + R; with Q at every frequency sL·(1 − j/q), which is that on the imaginary axis. */
function coilPort({ q, qAtHz }: PartElement, lH: number, s: Complex): Port {
  const reactance = times(variable(s), lH);
  if (q === undefined) return { v: reactance, i: ONE };
  if (qAtHz === undefined) return { v: product(reactance, steady(1, -1 / q)), i: ONE };
  return { v: sum(reactance, steady((2 * Math.PI * qAtHz * lH) / q)), i: ONE };
}

/** (1 + sC·R) : sC; with Q at every frequency (1 + j/q) : sC. */
function capacitorPort({ q, qAtHz }: PartElement, cF: number, s: Complex): Port {
  const susceptance = times(variable(s), cF);
  if (q === undefined) return { v: ONE, i: susceptance };
  if (qAtHz === undefined) return { v: steady(1, 1 / q), i: susceptance };
  return { v: sum(ONE, times(susceptance, 1 / (2 * Math.PI * qAtHz * cF * q))), i: susceptance };
}

function variable(s: Complex): Analytic {
  return { re: s.re, im: s.im, slopeRe: 1, slopeIm: 0 };
}

function requirePart({ rOhm, lH, cF, q, qAtHz }: PartElement): void {
  const given = [rOhm, lH, cF].filter((value) => value !== undefined);
  if (given.length !== 1)
    throw new RangeError(`partBranch: exactly one of rOhm, lH and cF is needed, got ${given.length}`);
  if (!(given[0]! >= 0)) throw new RangeError(`partBranch: the part's value must be at least 0, got ${given[0]}`);
  if (q !== undefined && !(q > 0)) throw new RangeError(`partBranch: q must be positive, got ${q}`);
  if (qAtHz !== undefined && !(qAtHz > 0)) throw new RangeError(`partBranch: qAtHz must be positive, got ${qAtHz}`);
}
