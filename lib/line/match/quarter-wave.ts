import { abs, arg, type Complex } from "@/lib/line/complex";
import { reflectionAgainst, wavelengths } from "@/lib/line/match/line-angle";

export interface RealPoint {
  /** wavelengths from the load, 0 to under 0.5 */
  distance: number;
  point: "voltageMaximum" | "voltageMinimum";
  resistanceOhm: number;
}

/**
 * The two places within a half wave of the load where a lossless line shows a pure resistance.
 * @param load - ohm; must take power
 * @param lineOhm - characteristic impedance, above 0
 * @returns sorted by distance; empty where the load equals the line (every place will do) or takes no power
 * Source: D. M. Pozar, Microwave Engineering, 2nd ed. 1998, section 2.3: Z0·(1 + ρ)/(1 − ρ) and its inverse.
 */
export function realPoints(load: Complex, lineOhm: number): RealPoint[] {
  const reflection = reflectionAgainst(load, lineOhm);
  const size = abs(reflection);
  if (!(load.re > 0 && size > 0)) return [];
  const vswr = (1 + size) / (1 - size);
  const maximum = wavelengths(arg(reflection) / 2);
  const minimum = wavelengths((arg(reflection) + Math.PI) / 2);
  const points: RealPoint[] = [
    { distance: maximum, point: "voltageMaximum", resistanceOhm: lineOhm * vswr },
    { distance: minimum, point: "voltageMinimum", resistanceOhm: lineOhm / vswr },
  ];
  return points.sort((a, b) => a.distance - b.distance);
}

/** Impedance of the quarter-wave section between two resistances, √(R1·R2); ohm. Source: Pozar, section 2.5. */
export function sectionImpedance(targetOhm: number, resistanceOhm: number): number {
  return Math.sqrt(targetOhm * resistanceOhm);
}

/**
 * What a quarter-wave section of any impedance leaves of the reflection between two resistances: it turns the load into
 * Zs²/R2, against R1 that is (Zs² − R1·R2)/(Zs² + R1·R2). Source: as `sectionImpedance`.
 * @param sectionOhm - of the lossless section, above 0
 * @returns |Γ| at the design frequency
 */
export function sectionReflection(sectionOhm: number, targetOhm: number, resistanceOhm: number): number {
  const [square, product] = [sectionOhm * sectionOhm, targetOhm * resistanceOhm];
  return Math.abs(square - product) / (square + product);
}

/**
 * Fraction of the design frequency over which a lossless quarter-wave section keeps the reflection of a real load
 * within a limit.
 * @param maxReflection - above 0 and under 1
 * @returns width over design frequency, 0 to 2; 2 where the reflection never exceeds the limit
 * @throws RangeError when the limit is not between 0 and 1
 * Source: D. M. Pozar, Microwave Engineering, 2nd ed. 1998, eq. 5.33.
 */
export function quarterWaveBandwidth(targetOhm: number, resistanceOhm: number, maxReflection: number): number {
  if (!(maxReflection > 0 && maxReflection < 1))
    throw new RangeError(`quarterWaveBandwidth: the reflection must be between 0 and 1, got ${maxReflection}`);
  const step = Math.abs(resistanceOhm - targetOhm);
  if (step === 0) return 2;
  const cosine =
    ((maxReflection / Math.sqrt(1 - maxReflection ** 2)) * 2 * Math.sqrt(targetOhm * resistanceOhm)) / step;
  return cosine >= 1 ? 2 : 2 - (4 / Math.PI) * Math.acos(cosine);
}
