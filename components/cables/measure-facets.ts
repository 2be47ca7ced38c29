/** The figures a catalogue is narrowed by: their words, their units, and how they are typed. */
import type { Measure } from "@/lib/cables/address";
import { digits } from "@/lib/format/quantity";
import type { QuantityKind } from "@/lib/format/unit-spelling";

export interface MeasureFacet {
  measure: Measure;
  name: string;
  unit: string;
  /** the unit in words */
  spoken: string;
  kind: QuantityKind;
  /** taken where a figure is typed without a unit */
  usualUnit: string;
  /** SI times this is the facet's own unit */
  perSi: number;
}

export const impedanceFacet: MeasureFacet = {
  ...{ measure: "z0Ohm", name: "Impedance", unit: "Ω", spoken: "ohms", kind: "resistance", usualUnit: "", perSi: 1 },
};
export const velocityFacet: MeasureFacet = {
  ...{ measure: "velocityFactor", name: "Velocity factor", unit: "", spoken: "", kind: "number" },
  ...{ usualUnit: "", perSi: 1 },
};
export const lossFacet: MeasureFacet = {
  ...{ measure: "lossDbPer100m", name: "dB per 100 m", unit: "", spoken: "decibels per 100 metres" },
  ...{ kind: "lossPerLength", usualUnit: "", perSi: 100 },
};
export const diameterFacet: MeasureFacet = {
  ...{ measure: "outerDiameterMm", name: "Outer diameter", unit: "mm", spoken: "millimetres", kind: "length" },
  ...{ usualUnit: "mm", perSi: 1000 },
};

/** A figure with no more than so many digits, and none that says nothing. */
export function shortFigure(value: number, most = 4): string {
  const short = Number(value.toPrecision(most));
  const decimals = /e-/.test(String(short)) ? most : (String(short).split(".")[1]?.length ?? 0);
  return digits(short, decimals);
}

/** A figure at the end of an axis, where the last digit does not matter. */
export const axisFigure = (value: number) => shortFigure(value, value < 1 ? 2 : 3);
