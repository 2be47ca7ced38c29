import { abs2, reciprocal, type Complex } from "@/lib/line/complex";
import { distancesAtCosine, impedanceAlong, reflectionAgainst, wavelengths } from "@/lib/line/match/line-angle";

export type StubEnd = "open" | "short";

export interface StubPlan {
  load: Complex;
  /** the line between load and stub, ohm, above 0 */
  lineOhm: number;
  /** what the match must show, ohm, above 0 */
  targetOhm: number;
  stubOhm: number;
  connection: "shunt" | "series";
  end: StubEnd;
}

export interface StubSolution {
  /** wavelengths of the line, load to stub */
  distance: number;
  /** wavelengths of the stub's own line */
  length: number;
}

/**
 * Length of a lossless stub that has a wanted susceptance or reactance.
 * @param immittance - susceptance of a shunt stub, siemens, or reactance of a series stub, ohm
 * @param characteristic - of the stub's line in the same unit: 1/Z0, siemens, or Z0, ohm
 * @param isTangent - true where the immittance grows from 0 with the length: an open shunt stub or a shorted series
 *   one; false where it starts from an infinite value
 * @returns wavelengths, 0 to under 0.5
 */
export function stubLength(immittance: number, characteristic: number, isTangent: boolean): number {
  const angle = isTangent ? Math.atan2(immittance, characteristic) : Math.atan2(-characteristic, immittance);
  return wavelengths(angle);
}

/**
 * Single-stub match on a lossless line, every solution: the stub stands where the line shows the target's
 * conductance (shunt) or resistance (series) and takes away the rest.
 * @returns sorted by distance from the load; empty where the line never shows the wanted value (possible only when the
 *   line's impedance is not the target) or the load takes no power
 * Source: D. M. Pozar, Microwave Engineering, 2nd ed. 1998, section 5.2, here in the angle of the reflection and for a
 * line that need not be the target: (1 − ρ²)/(1 + ρ² ± 2ρ cos ψ) = wanted ratio; convention e^{+jωt}.
 */
export function singleStub(plan: StubPlan): StubSolution[] {
  const reflection = reflectionAgainst(plan.load, plan.lineOhm);
  const size = abs2(reflection);
  if (!(plan.load.re > 0 && size > 0)) return [];
  const isShunt = plan.connection === "shunt";
  const wanted = isShunt ? plan.lineOhm / plan.targetOhm : plan.targetOhm / plan.lineOhm;
  const cosine = ((1 - size) / wanted - 1 - size) / (2 * Math.sqrt(size));
  return distancesAtCosine(reflection, isShunt ? cosine : -cosine)
    .map((distance) => ({ distance, length: lengthAt(plan, distance) }))
    .sort((a, b) => a.distance - b.distance);
}

function lengthAt(plan: StubPlan, distance: number): number {
  const seen = impedanceAlong(plan.load, plan.lineOhm, distance);
  if (plan.connection === "series") return stubLength(-seen.im, plan.stubOhm, plan.end === "short");
  return stubLength(-reciprocal(seen).im, 1 / plan.stubOhm, plan.end === "open");
}
