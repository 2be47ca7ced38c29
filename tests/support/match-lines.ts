/**
 * Lines and a job for the matching tests: three invented cables of the demo catalogue (single `sqrt` conductor term) and lossless
 * lines of any impedance.
 */
import type { Circuit } from "@/lib/line/element";
import { modelFromNominal } from "@/lib/line/cable";
import type { Candidate, MatchLine, MatchRequest } from "@/lib/line/match/match-request";

function cable(label: string, r0OhmPerKm: number, cornerKhz: number, lNhPerM: number, cPfPerM: number): MatchLine {
  return {
    cableId: label,
    label,
    model: {
      conductors: [{ form: "sqrt", r0OhmPerM: r0OhmPerKm / 1000, skinCornerRadPerS: 2 * Math.PI * 1000 * cornerKhz }],
      lInfHPerM: lNhPerM * 1e-9,
      cFPerM: cPfPerM * 1e-12,
      lossTangent: 1.5e-4,
    },
  };
}

export const c50F10 = cable("C50-F10", 8.611, 17.71, 196.17, 78.51);
export const c50F7 = cable("C50-F7", 16.081, 30.32, 200.98, 80.36);
export const c75F7 = cable("C75-F7", 30.1, 40, 301, 53.6);

export function lossless(z0: number, velocityFactor = 0.66): MatchLine {
  return { label: `${z0} ohm`, model: modelFromNominal({ z0, velocityFactor }) };
}

/** 27.2 MHz, load 22 − j35 Ω, C50-F10: the everyday question "where do I match?". */
export const everyday: MatchRequest = {
  load: { kind: "constant", reOhm: 22, imOhm: -35 },
  targetOhm: 50,
  designHz: 27.2e6,
  bandHz: [26.96e6, 27.41e6],
  returnLossDb: 14,
  feeder: c50F10,
  lines: [c50F10],
  partQ: { coilQ: 120, capacitorQ: 1000 },
};

/** The run of a match: what it is matched to, its network, what stands behind, the load. */
export function circuitOf(
  { targetOhm, load, behind = [] }: MatchRequest,
  { elements }: Pick<Candidate, "elements">,
): Circuit {
  return { source: { kind: "constant", reOhm: targetOhm, imOhm: 0 }, elements: [...elements, ...behind], load };
}

export function lengthsOf({ elements }: Candidate): number[] {
  return elements.map((each) => ("lengthM" in each ? each.lengthM : NaN));
}
