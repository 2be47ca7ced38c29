import { add, divide, multiply, ONE, tanh, ZERO, type Complex } from "@/lib/line/complex";
import type { DesignLine, DesignPoint } from "@/lib/line/match/design-point";
import type { StubEnd } from "@/lib/line/match/single-stub";

/** Voltage and current in the ratio of an impedance, so that an open or a short needs no infinity. */
export interface Pair {
  v: Complex;
  i: Complex;
}

/**
 * A pair seen through a length of line, in the ratio of the exact impedance. Lengths below 0 are allowed: a solution is
 * looked for on both sides of the load before it is moved by a half wave.
 * @param paralleled - identical lengths side by side
 * Source: D. M. Pozar, Microwave Engineering, 4th ed., eq. 2.91, cleared of fractions.
 */
export function along({ v, i }: Pair, { gamma, zc }: DesignLine, length: number, paralleled = 1): Pair {
  const t = tanh({ re: gamma.re * length, im: gamma.im * length });
  const z = { re: zc.re / paralleled, im: zc.im / paralleled };
  return { v: add(v, multiply(multiply(z, t), i)), i: add(i, divide(multiply(t, v), z)) };
}

/** A stub's near end. */
export function stubPair(line: DesignLine, length: number, end: StubEnd): Pair {
  return along(end === "open" ? { v: ONE, i: ZERO } : { v: ZERO, i: ONE }, line, length);
}

/** A pair with a branch across it (shunt) or in front of it (series). */
export function withBranch(connection: "shunt" | "series", pair: Pair, branch: Pair): Pair {
  const cross = add(multiply(pair.v, branch.i), multiply(pair.i, branch.v));
  return connection === "shunt"
    ? { v: multiply(pair.v, branch.v), i: cross }
    : { v: cross, i: multiply(pair.i, branch.i) };
}

/** The load as a pair. */
export function loadPair({ load }: DesignPoint): Pair {
  return { v: load, i: ONE };
}

/** A line with a share of its loss: 0 is lossless with the same wavelength, 1 the line itself. */
export function withLossShare(line: DesignLine, share: number): DesignLine {
  return {
    ...line,
    gamma: { re: share * line.gamma.re, im: line.gamma.im },
    zc: { re: line.zc.re, im: share * line.zc.im },
  };
}
