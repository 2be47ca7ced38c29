/** What cables held up side by side are compared by, and how far each is from the first. Pure; 20 °C. */
import { lossDbPer100m, lossRangeHz } from "@/lib/cables/model";
import type { Cable } from "@/lib/cables/schema";
import { nominalFigures } from "@/lib/line/cable";

/** Figures of one entry; null where it does not say. */
export interface CompareFigures {
  z0Ohm: number;
  velocityFactor: number;
  delaySPerM: number;
  capacitanceFPerM: number;
  inductanceHPerM: number;
  /** at the frequency asked */
  lossDbPer100m: number;
  lossLowDbPer100m: number;
  lossHighDbPer100m: number;
  /** out and back, dc */
  loopResistanceOhmPerM: number;
  outerDiameterMm: number | null;
  minBendMm: number | null;
  maxFrequencyHz: number | null;
  maxVoltageV: number | null;
  minTemperatureC: number | null;
  maxTemperatureC: number | null;
}
export type CompareQuantity = keyof CompareFigures;

/** @param lossAtHz - hertz, above 0 */
export function compareFigures(
  { model, limits, construction }: Pick<Cable, "model" | "limits" | "construction">,
  lossAtHz: number,
): CompareFigures {
  const { z0, velocityFactor, delay, capacitance, inductance } = nominalFigures(model);
  return {
    z0Ohm: z0,
    velocityFactor,
    delaySPerM: delay,
    capacitanceFPerM: capacitance,
    inductanceHPerM: inductance,
    lossDbPer100m: lossDbPer100m(model, lossAtHz),
    lossLowDbPer100m: lossDbPer100m(model, lossRangeHz[0]),
    lossHighDbPer100m: lossDbPer100m(model, lossRangeHz[1]),
    loopResistanceOhmPerM: model.conductors.reduce((sum, { r0OhmPerM }) => sum + r0OhmPerM, 0),
    outerDiameterMm: construction?.outerDiameterMm ?? null,
    minBendMm: limits.minBendMm ?? null,
    maxFrequencyHz: limits.maxFrequencyHz ?? null,
    maxVoltageV: limits.maxVoltageV ?? null,
    minTemperatureC: limits.minTemperatureC ?? null,
    maxTemperatureC: limits.maxTemperatureC ?? null,
  };
}

/** By how many per cent a value exceeds the reference; null where either is missing or the reference is 0. */
export function differencePercent(value: number | null, reference: number | null): number | null {
  if (value === null || reference === null || reference === 0) return null;
  const difference = 100 * (value / reference - 1);
  return Number.isFinite(difference) ? difference : null;
}
