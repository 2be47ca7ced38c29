/**
 * Lines for the matching tests: three invented cables of the demo catalogue (single `sqrt` conductor term) and lossless
 * lines of any impedance.
 */
import { modelFromNominal } from "@/lib/line/cable";
import type { MatchLine } from "@/lib/line/match/match-request";

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
