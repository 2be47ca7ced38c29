/** What lumped parts and terminations show, as polynomials of s: voltage and current in the ratio of the impedance. */
import type { PartElement, Termination } from "@/lib/line/element";

/** Coefficients of 1, s, s². */
type Quadratic = readonly [number, number, number];

export interface RationalPort {
  /** volt */
  v: Quadratic;
  /** ampere */
  i: Quadratic;
}

const ONE: Quadratic = [1, 0, 0];
const NONE: Quadratic = [0, 0, 0];

/**
 * A termination as a rational function.
 * @throws RangeError for what is known on the imaginary axis only, so that no signal follows from it: a sampled
 * termination, and a constant one with a reactance
 */
export function rationalTermination(termination: Termination): RationalPort {
  switch (termination.kind) {
    case "open":
      return { v: ONE, i: NONE };
    case "short":
      return { v: NONE, i: ONE };
    case "constant":
      if (termination.imOhm !== 0)
        throw new RangeError(
          `rationalTermination: a reactance that is the same at every frequency has no signal, got imOhm ${termination.imOhm}`,
        );
      return { v: [termination.reOhm, 0, 0], i: ONE };
    case "network":
      return termination.topology === "series" ? seriesNetwork(termination) : parallelNetwork(termination);
    case "sampled":
      throw new RangeError("rationalTermination: a sampled termination is known at its frequencies only");
  }
}

type Network = Extract<Termination, { kind: "network" }>;

/** R + sL, or with a capacitor (1 + sC·R + s²LC) : sC. */
function seriesNetwork({ rOhm = 0, lH = 0, cF }: Network): RationalPort {
  if (cF === undefined) return { v: [rOhm, lH, 0], i: ONE };
  return { v: [1, cF * rOhm, cF * lH], i: [0, cF, 0] };
}

/** 1 / (1/R + 1/(sL) + sC), cleared of fractions. A part of 0 Ω or 0 H is a short. */
function parallelNetwork({ rOhm, lH, cF = 0 }: Network): RationalPort {
  if (rOhm === 0 || lH === 0) return { v: NONE, i: ONE };
  const r = rOhm ?? 1;
  const loaded = rOhm === undefined ? 0 : 1;
  if (lH === undefined) return { v: [r, 0, 0], i: [loaded, r * cF, 0] };
  return { v: [0, r * lH, 0], i: [r, loaded * lH, r * lH * cF] };
}

/**
 * One part as a rational function; with `q` and `qAtHz` its loss is a fixed series resistance.
 * @throws RangeError where its Q holds at every frequency: such a part answers before it is asked
 */
export function rationalPart({ rOhm, lH, cF, q, qAtHz }: PartElement): RationalPort {
  if (q !== undefined && qAtHz === undefined)
    throw new RangeError("rationalPart: a Q that holds at every frequency has no signal; say at which it is given");
  if (rOhm !== undefined) return { v: [rOhm, 0, 0], i: ONE };
  const omega = 2 * Math.PI * (qAtHz ?? 0);
  if (lH !== undefined) return { v: [q === undefined ? 0 : (omega * lH) / q, lH, 0], i: ONE };
  const c = cF ?? 0;
  return { v: [1, q === undefined ? 0 : 1 / (omega * q), 0], i: [0, c, 0] };
}

function leadingPower(polynomial: Quadratic): number {
  if (polynomial[2] !== 0) return 2;
  if (polynomial[1] !== 0) return 1;
  return polynomial[0] !== 0 ? 0 : -1;
}

/** Impedance at the highest frequencies, ohm: what the front of a wave meets; 0 for a capacitor, Infinity for a coil. */
export function frontResistance({ v, i }: RationalPort): number {
  const [up, down] = [leadingPower(v), leadingPower(i)];
  if (up > down) return Infinity;
  return up < down ? 0 : v[up as 0]! / i[down as 0]!;
}
