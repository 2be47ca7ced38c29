/**
 * How far a figure may be off when nobody says: shares of the value, k = 2. Common practice of the house; every one of
 * them gives way to a tolerance that is stated.
 */
import type { Family } from "@/lib/cables/schema";

export const usualSpreads = {
  /** of a diameter or a spacing, as cables are made */
  dimension: 0.01,
  /** of the permittivity of the insulation of a coaxial cable; of a pair, whose field is partly in air */
  permittivity: { coaxial: 0.014, twistedPair: 0.04, twinaxial: 0.03 } satisfies Record<Family, number>,
  /** of the loss of smooth conductors with the factors given */
  constructionLoss: 0.05,
  velocityFactor: 0.01,
  capacitance: 0.03,
  inductance: 0.03,
  resistance: 0.05,
  /** of a row of a loss table that is no limit */
  lossRow: 0.02,
  /** of what a meter reads on a sample, its fittings taken off */
  reading: { capacitance: 0.01, inductance: 0.02, resistance: 0.01, delay: 0.005, length: 0.002 },
} as const;

/** ±2 Ω of a coaxial cable, ±10 % of a pair, as a share. */
export function usualImpedanceSpread(family: Family, z0: number): number {
  return family === "coaxial" ? 2 / z0 : 0.1;
}
