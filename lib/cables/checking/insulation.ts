/** What is usual for the insulation an entry names: the velocity it lets through and the loss tangent it has. Pure. */
import type { Build } from "@/lib/cables/schema";

export interface UsualInsulation {
  name: string;
  /** velocity factor of a coaxial cable made with it, from and to */
  velocityFactor: readonly [number, number];
  /** highest loss tangent that goes with it; above the second it is another material, or wet */
  lossTangent: readonly [number, number];
}

/**
 * Common practice for cables; the velocity of solid insulation is 1/√εr of its material. Polyethylene and PTFE have loss
 * tangents of 10⁻⁵ to 10⁻³, and with the additives of data pairs a few thousandths; 10⁻² and above is PVC or moisture.
 */
const usual = {
  solidPe: { name: "solid polyethylene", velocityFactor: [0.645, 0.675], lossTangent: [4e-3, 1e-2] },
  foamPe: { name: "foamed polyethylene", velocityFactor: [0.76, 0.9], lossTangent: [2e-3, 1e-2] },
  solidPtfe: { name: "solid PTFE", velocityFactor: [0.685, 0.71], lossTangent: [1e-3, 1e-2] },
  expandedPtfe: { name: "expanded PTFE", velocityFactor: [0.76, 0.87], lossTangent: [1e-3, 1e-2] },
  airSpaced: { name: "air-spaced insulation", velocityFactor: [0.82, 0.98], lossTangent: [1e-3, 1e-2] },
  pvc: { name: "PVC", velocityFactor: [0.42, 0.62], lossTangent: [0.1, 0.2] },
} as const satisfies Record<string, UsualInsulation>;

const all: readonly UsualInsulation[] = Object.values(usual);

/** The usual figures of what an entry says its insulation is; undefined for a material nobody here has heard of. */
export function usualInsulation(build: Build | null): UsualInsulation | undefined {
  if (!build) return undefined;
  const { dielectric, dielectricName } = build;
  if (/pvc/i.test(dielectricName)) return usual.pvc;
  if (dielectric === "airSpaced") return usual.airSpaced;
  if (/ptfe|fep/i.test(dielectricName)) return dielectric === "foam" ? usual.expandedPtfe : usual.solidPtfe;
  if (/\bpe\b|poly(ethylene|thene)/i.test(dielectricName)) return dielectric === "foam" ? usual.foamPe : usual.solidPe;
  return undefined;
}

/** The insulations a velocity factor is usual for, the narrowest range first. */
export function insulationsFor(velocityFactor: number): UsualInsulation[] {
  const width = ({ velocityFactor: [from, to] }: UsualInsulation) => to - from;
  return all
    .filter(({ velocityFactor: [from, to] }) => velocityFactor >= from && velocityFactor <= to)
    .sort((a, b) => width(a) - width(b));
}

/** How far a velocity factor lies outside a range, as a share; 0 within. */
export function outside(velocityFactor: number, [from, to]: readonly [number, number]): number {
  if (velocityFactor < from) return velocityFactor / from - 1;
  return velocityFactor > to ? velocityFactor / to - 1 : 0;
}
