/** Attenuation of a length at a temperature, with what else the length does. Pure. */
import { chosenLine, lineInputs, type ChosenLine } from "@/lib/calculators/line-inputs";
import { fault, found, optional, quantity, type Outcome, type Values } from "@/lib/calculators/input";
import type { CableLine } from "@/lib/cables/line";
import { COPPER_RESISTIVITY } from "@/lib/line/constants";
import { powerShare } from "@/lib/line/decibels";
import { lineFigures } from "@/lib/line/line-figures";
import { skinDepth } from "@/lib/line/skin-depth";
import { lengthFigures, spotFigures, type LengthFigures, type SpotFigures } from "@/lib/line/spot-figures";
import { atTemperature, REFERENCE_TEMPERATURE_C } from "@/lib/line/temperature";

const span = { isPositive: true, most: 1e12 } as const;

export const attenuationInputs = {
  ...lineInputs,
  length: quantity("length", "Length", "100 m", { isNotNegative: true, most: 1e7 }),
  frequency: quantity("frequency", "Frequency", "100 MHz", span),
  temperature: quantity("temperature", "Temperature", "20", { least: -200, most: 400 }),
  current: optional(quantity("current", "Direct current", "", { isNotNegative: true, most: 1e6, width: "narrow" })),
  from: quantity("frequency", "Curve from", "1 MHz", span),
  to: quantity("frequency", "to", "1 GHz", span),
};

export interface Curve {
  frequenciesHz: number[];
  lossDb: number[];
  /** the same at 20 °C */
  referenceDb: number[];
}

export interface AttenuationResult {
  line: ChosenLine;
  spot: SpotFigures;
  whole: LengthFigures;
  /** the same length at 20 °C */
  reference: LengthFigures;
  /** share of the power that arrives, 0 to 1 */
  share: number;
  /** volts lost in both conductors; null without a current */
  dropV: number | null;
  /** of copper at this temperature, metre */
  skinDepthM: number;
  curve: Curve;
}

/** Points of the curve; on a log axis they lie closer than a screen can show. */
const points = 241;

export function attenuation(
  values: Values<typeof attenuationInputs>,
  entries: ReadonlyMap<string, CableLine>,
): Outcome<AttenuationResult> {
  const line = chosenLine(values, entries);
  if (!line) return fault("cable", "This cable is on its way.");
  const { length, frequency, temperature, current, from, to } = values;
  if (!(to > from)) return fault("to", "Above the frequency that the curve starts at.");
  const refusal = temperatureRefusal(line, temperature);
  if (refusal) return fault("temperature", refusal);
  const spot = spotFigures(line.model, frequency, temperature);
  const whole = lengthFigures(spot, length);
  const { resistivityRatio } = spot.temperature;
  return found({
    line,
    spot,
    whole,
    reference: lengthFigures(spotFigures(line.model, frequency), length),
    share: powerShare(whole.lossDb),
    dropV: current === undefined ? null : current * whole.dcResistanceOhm,
    skinDepthM: skinDepth(frequency, COPPER_RESISTIVITY * resistivityRatio),
    curve: curveOf(line, length, temperature, from, to),
  });
}

/** Why a cable cannot be worked out at a temperature: resistance or loss would be nothing or less. */
export function temperatureRefusal({ model }: ChosenLine, temperatureC: number): string | null {
  try {
    atTemperature(model, temperatureC);
    return null;
  } catch (error) {
    if (error instanceof RangeError) return "So far from 20 °C the cable's resistance would be nothing or less.";
    throw error;
  }
}

function curveOf({ model }: ChosenLine, length: number, temperatureC: number, from: number, to: number): Curve {
  const frequenciesHz = Array.from({ length: points }, (_, k) => from * Math.pow(to / from, k / (points - 1)));
  const lossAt = (celsius: number) =>
    Array.from(lineFigures(model, frequenciesHz, celsius).attenuationDbPerM, (perMetre) => perMetre * length);
  return { frequenciesHz, lossDb: lossAt(temperatureC), referenceDb: lossAt(REFERENCE_TEMPERATURE_C) };
}
