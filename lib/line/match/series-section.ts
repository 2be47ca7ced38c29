import { abs2, arg, type Complex } from "@/lib/line/complex";
import { distancesAtCosine, impedanceAlong, reflectionAgainst, wavelengths } from "@/lib/line/match/line-angle";

export interface SectionPlan {
  load: Complex;
  /** the line between load and section, ohm */
  lineOhm: number;
  sectionOhm: number;
  /** what the match must show, ohm */
  targetOhm: number;
}

export interface SectionSolution {
  /** wavelengths of the line, load to section */
  distance: number;
  /** wavelengths of the section's own line */
  length: number;
}

/**
 * Cosine of the angle that the line's reflection must have where the section begins. Beyond −1 and 1 the section cannot
 * reach the target on lossless lines.
 * Source: derived here. On the section the quantity (|Z|² + Zs²)/(2·Zs·Re Z) does not change along it; equating it at
 * both ends and writing Z in the line's reflection angle ψ gives cos ψ in closed form. Convention e^{+jωt}.
 */
export function sectionCosine({ load, lineOhm, sectionOhm, targetOhm }: SectionPlan): number {
  const size = abs2(reflectionAgainst(load, lineOhm));
  const onSection = (targetOhm ** 2 + sectionOhm ** 2) / targetOhm;
  const left = onSection * lineOhm * (1 - size) - (lineOhm ** 2 + sectionOhm ** 2) * (1 + size);
  return left / (2 * Math.sqrt(size) * (lineOhm ** 2 - sectionOhm ** 2));
}

/**
 * Two-length series section on lossless lines, every solution: a length of the line brings the load onto the circle
 * on which the section's own line carries the target, then the section turns it there.
 * @returns sorted by distance from the load; empty where the two lines' impedances cannot reach the target from this
 *   load, or where section and line are equal
 * Source: see `sectionCosine`.
 */
export function seriesSection(plan: SectionPlan): SectionSolution[] {
  const { load, lineOhm, sectionOhm, targetOhm } = plan;
  const reflection = reflectionAgainst(load, lineOhm);
  if (!(load.re > 0 && abs2(reflection) > 0)) return [];
  const wanted = targetOhm >= sectionOhm ? 0 : Math.PI;
  return distancesAtCosine(reflection, sectionCosine(plan))
    .map((distance) => {
      const seen = reflectionAgainst(impedanceAlong(load, lineOhm, distance), sectionOhm);
      return { distance, length: wavelengths((arg(seen) - wanted) / 2) };
    })
    .sort((a, b) => a.distance - b.distance);
}
