/**
 * What is known of a run at direct current from one side of a place: an equation p·V + q·I = r between voltage and
 * current (toward the load), carried from its end through the elements. It is a source behind a resistance, and holds
 * for a short (p·V = 0) and for an open end (q·I = 0) too.
 */
import type { Termination } from "@/lib/line/element";
import { terminationPort } from "@/lib/line/termination";
import type { TwoPort } from "@/lib/line/two-port";

export interface Side {
  p: number;
  q: number;
  r: number;
}

export const AT_REST = { re: 0, im: 0 };

/** A termination as it is at rest: the reactance of one that is stated for all frequencies is none. */
export function endAtRest(end: Termination): Termination {
  return end.kind === "constant" ? { ...end, imOhm: 0 } : end;
}

/** At every plane, from the source on. `supplyV` is its e.m.f.; NaN where there is none. */
export function sidesFromSource(source: Termination, twoPorts: TwoPort[], supplyV: number): Side[] {
  const { v, i } = terminationPort(endAtRest(source), AT_REST);
  let side = level({ p: i.re, q: v.re, r: i.re * supplyV });
  return [side, ...twoPorts.map((twoPort) => (side = level(towardLoad(side, twoPort))))];
}

/** At every plane, in the same order, from the load back; it draws a current besides its own. */
export function sidesFromLoad(load: Termination, twoPorts: TwoPort[], currentA: number): Side[] {
  const { v, i } = terminationPort(endAtRest(load), AT_REST);
  let side = level({ p: -i.re, q: v.re, r: v.re * currentA });
  const sides = [side];
  for (const twoPort of [...twoPorts].reverse()) sides.unshift((side = level(towardSource(side, twoPort))));
  return sides;
}

/** What lets nothing through: behind a short the voltage is 0, behind an open the current. */
function cutOff({ c }: TwoPort): Side {
  return c.re !== 0 ? { p: 1, q: 0, r: 0 } : { p: 0, q: 1, r: 0 };
}

/** With (V1, I1) = e^S·M·(V2, I2) an equation on the source's side becomes one on the load's. */
function towardLoad({ p, q, r }: Side, twoPort: TwoPort): Side {
  const { a, b, c, d, logScale } = twoPort;
  if (logScale === Infinity) return cutOff(twoPort);
  return { p: p * a.re + q * c.re, q: p * b.re + q * d.re, r: r * Math.exp(-logScale) };
}

/** The other way: every two-port here is reciprocal, so M⁻¹ = [d −b; −c a]. */
function towardSource({ p, q, r }: Side, twoPort: TwoPort): Side {
  const { a, b, c, d, logScale } = twoPort;
  if (logScale === Infinity) return cutOff(twoPort);
  return { p: p * d.re - q * c.re, q: q * a.re - p * b.re, r: r * Math.exp(-logScale) };
}

/** The same equation with coefficients of about 1. */
function level({ p, q, r }: Side): Side {
  const size = Math.max(Math.abs(p), Math.abs(q));
  return size > 0 ? { p: p / size, q: q / size, r: r / size } : { p, q, r };
}

export interface Meeting {
  v: number;
  i: number;
}

/**
 * Voltage and current where what is known from both sides meets. Between two opens there is no current, and no voltage
 * can be told; between two shorts it is the other way round.
 */
export function meeting(left: Side, right: Side): Meeting {
  const determinant = left.p * right.q - right.p * left.q;
  const isCutOff = left.r === 0 && right.r === 0;
  if (isCutOff && left.p === 0 && right.p === 0) return { v: NaN, i: 0 };
  if (isCutOff && left.q === 0 && right.q === 0) return { v: 0, i: NaN };
  return {
    v: (left.r * right.q - right.r * left.q) / determinant,
    i: (left.p * right.r - right.p * left.r) / determinant,
  };
}

/** Power toward the load; none where either voltage or current is none. */
export function powerAt({ v, i }: Meeting): number {
  return v === 0 || i === 0 ? 0 : v * i;
}

/** Resistance of both sides in parallel, without their sources; Infinity where neither conducts. */
export function together(left: Side, right: Side): number {
  if (left.q === 0 || right.q === 0) return 0;
  const conductance = left.p / left.q - right.p / right.q;
  return conductance > 0 ? 1 / conductance : Infinity;
}
