import { COPPER_TEMPERATURE_COEFFICIENT } from "@/lib/line/constants";
import type { LineModel, LossSlope } from "@/lib/line/element";

/** Temperature at which every model is stated, °C. */
export const REFERENCE_TEMPERATURE_C = 20;

export interface ModelAtTemperature {
  model: LineModel;
  temperatureC: number;
  /** resistivity over resistivity at 20 °C: what dc resistance scales by */
  resistivityRatio: number;
  /** what high-frequency loss scales by; √resistivityRatio for the conductors' part unless slopes are declared */
  lossRatio: number;
  /** which rule gave the high-frequency loss */
  slope: "resistivity" | "declared";
}

/**
 * The line model at a temperature: R0 and skin corner follow resistivity, 1 + a·(T − 20); where the cable declares
 * slopes of its loss, high-frequency loss follows those instead while dc resistance still follows resistivity.
 * Capacitance and L∞ stay.
 * @param model - at 20 °C
 * @param temperatureC - °C
 * @returns a model to be used as it is (its own temperature coefficient and slopes have been used up), and which
 * slope was used
 * @throws RangeError when the resistivity or the loss would not be positive at that temperature
 * Source: ρ = ρ20·(1 + a·(T − 20)), IEC 60028 for copper; declared slopes as cabling standards give them, added
 * over ranges.
 */
export function atTemperature(model: LineModel, temperatureC: number): ModelAtTemperature {
  const step = temperatureC - REFERENCE_TEMPERATURE_C;
  const ratio = 1 + (model.temperatureCoefficientPerK ?? COPPER_TEMPERATURE_COEFFICIENT) * step;
  if (!(ratio > 0)) throw new RangeError(`atTemperature: no positive resistivity at temperatureC = ${temperatureC}`);
  const slopes = model.lossSlopes ?? [];
  if (slopes.length === 0) return scaled(model, temperatureC, ratio, Math.sqrt(ratio), 1, "resistivity");
  const loss = declaredLossRatio(slopes, temperatureC);
  if (!(loss > 0)) throw new RangeError(`atTemperature: no positive loss at temperatureC = ${temperatureC}`);
  return scaled(model, temperatureC, ratio, loss, loss, "declared");
}

/** 1 + Σ perK·ΔT from 20 °C to the temperature, over the parts of the way that lie in a range; 1 outside them all. */
function declaredLossRatio(slopes: LossSlope[], temperatureC: number): number {
  let ratio = 1;
  for (const { fromC, toC, perK } of slopes)
    ratio += perK * (inRange(temperatureC, fromC, toC) - inRange(20, fromC, toC));
  return ratio;
}

function inRange(value: number, low: number, high: number): number {
  return Math.min(Math.max(value, low), high);
}

function scaled(
  model: LineModel,
  temperatureC: number,
  resistivityRatio: number,
  lossRatio: number,
  lossTangentRatio: number,
  slope: ModelAtTemperature["slope"],
): ModelAtTemperature {
  const cornerRatio = (resistivityRatio / lossRatio) ** 2;
  const conductors = model.conductors.map((term) => ({
    ...term,
    r0OhmPerM: term.r0OhmPerM * resistivityRatio,
    ...(term.skinCornerRadPerS === undefined ? {} : { skinCornerRadPerS: term.skinCornerRadPerS * cornerRatio }),
  }));
  const { lossSlopes: _used, ...rest } = model;
  const lossTangent = (model.lossTangent ?? 0) * lossTangentRatio;
  return {
    model: { ...rest, conductors, lossTangent, temperatureCoefficientPerK: 0 },
    temperatureC,
    resistivityRatio,
    lossRatio,
    slope,
  };
}
