/** From a revision of an entry to what the engine and the catalogue need of it. Pure. */
import type { CableState, Construction, Limits } from "@/lib/cables/schema";
import { propagation } from "@/lib/line/cable";
import { DB_PER_NEPER, SPEED_OF_LIGHT } from "@/lib/line/constants";
import type { LineModel } from "@/lib/line/element";

/** Attenuation of 100 m at 20 °C, dB; `frequency` in hertz, above 0. */
export function lossDbPer100m(model: LineModel, frequency: number): number {
  return propagation(model, { re: 0, im: 2 * Math.PI * frequency }).gamma.re * DB_PER_NEPER * 100;
}

export const lossRangeHz = [10e6, 1e9] as const;

/** The figures of a revision that search and sort by, at 20 °C; Z0, velocity and delay are those of high frequency. */
export function derivedFigures(model: LineModel, construction: Construction | null, limits: Limits) {
  const { lInfHPerM, cFPerM } = model;
  const delaySPerM = Math.sqrt(lInfHPerM * cFPerM);
  return {
    z0Ohm: Math.sqrt(lInfHPerM / cFPerM),
    velocityFactor: 1 / (SPEED_OF_LIGHT * delaySPerM),
    capacitanceFPerM: cFPerM,
    delaySPerM,
    lossLowDbPer100m: lossDbPer100m(model, lossRangeHz[0]),
    lossHighDbPer100m: lossDbPer100m(model, lossRangeHz[1]),
    outerDiameterMm: construction?.outerDiameterMm ?? null,
    maxFrequencyHz: limits.maxFrequencyHz ?? null,
  };
}

/** Whether an entry in this state may be put into a run that does not use it yet. */
export function isUsable(state: CableState): boolean {
  return state === "approved" || state === "restricted";
}

/** States in which nobody has approved what the entry says. */
export const unapprovedStates: CableState[] = ["draft", "inReview"];
