/** The model of one lot: the entry's, with what was measured in the place of what is nominal. Pure. */
import { lossDbPer100m } from "@/lib/cables/model";
import type { Figure } from "@/lib/cables/schema";
import { modelAt } from "@/lib/cables/warm-model";
import { nominalFigures } from "@/lib/line/cable";
import { COPPER_TEMPERATURE_COEFFICIENT, SPEED_OF_LIGHT } from "@/lib/line/constants";
import type { LineModel } from "@/lib/line/element";

type Measured = readonly Pick<Figure, "quantity" | "valueSi" | "temperatureC" | "fromHz">[];

const found = (figures: Measured, quantity: string) => figures.find((figure) => figure.quantity === quantity);

/** L∞ and C of the measured impedance and velocity; what was not measured stays nominal. */
function withLine(model: LineModel, figures: Measured): LineModel {
  const nominal = nominalFigures(model);
  const z0 = found(figures, "z0Ohm")?.valueSi ?? nominal.z0;
  const velocity = (found(figures, "velocityFactor")?.valueSi ?? nominal.velocityFactor) * SPEED_OF_LIGHT;
  return { ...model, lInfHPerM: z0 / velocity, cFPerM: 1 / (z0 * velocity) };
}

/**
 * dc resistance as measured, brought to 20 °C. It says nothing of high frequency: there R is R0·√(ω/2ωs), so the skin
 * corner grows with the square of R0 and leaves it as it was.
 */
function withResistance(model: LineModel, figures: Measured): LineModel {
  const measured = found(figures, "r0OhmPerM");
  const nominal = model.conductors.reduce((sum, { r0OhmPerM }) => sum + r0OhmPerM, 0);
  if (!measured || !(nominal > 0)) return model;
  const perK = model.temperatureCoefficientPerK ?? COPPER_TEMPERATURE_COEFFICIENT;
  const ratio = measured.valueSi / (1 + perK * ((measured.temperatureC ?? 20) - 20)) / nominal;
  const conductors = model.conductors.map((term) => ({
    ...term,
    r0OhmPerM: term.r0OhmPerM * ratio,
    ...(term.skinCornerRadPerS !== undefined &&
      ratio > 0 && { skinCornerRadPerS: term.skinCornerRadPerS * ratio * ratio }),
  }));
  return { ...model, conductors };
}

/** By how much the measured loss is more than the model's, over all frequencies measured: the geometric mean. */
function lossRatio(model: LineModel, figures: Measured): number {
  const logs = figures.flatMap(({ quantity, valueSi, fromHz, temperatureC }) => {
    if (quantity !== "lossDbPerM" || fromHz === undefined) return [];
    const warm = modelAt(model, temperatureC ?? 20);
    const expected = warm ? lossDbPer100m(warm.model, fromHz) / 100 : NaN;
    const log = Math.log(valueSi / expected);
    return Number.isFinite(log) ? [log] : [];
  });
  return logs.length === 0 ? 1 : Math.exp(logs.reduce((sum, log) => sum + log, 0) / logs.length);
}

/** High-frequency loss by a factor: ωs/F², tan δ·F, dc resistance as it is. */
function withLoss(model: LineModel, factor: number): LineModel {
  if (factor === 1) return model;
  const conductors = model.conductors.map((term) =>
    term.skinCornerRadPerS === undefined
      ? term
      : { ...term, skinCornerRadPerS: term.skinCornerRadPerS / (factor * factor) },
  );
  return { ...model, conductors, ...(model.lossTangent !== undefined && { lossTangent: model.lossTangent * factor }) };
}

/**
 * @param model - the entry's, at 20 °C
 * @param figures - measured: z0Ohm, velocityFactor, r0OhmPerM (at its temperature), lossDbPerM at a frequency
 * @returns the model at 20 °C; null where what was measured makes none
 */
export function modelOfLot(model: LineModel, figures: Measured): LineModel | null {
  const line = withResistance(withLine(model, figures), figures);
  const lot = withLoss(line, lossRatio(line, figures));
  const isPossible = [lot.lInfHPerM, lot.cFPerM, lossDbPer100m(lot, 1e6)].every(
    (value) => Number.isFinite(value) && value >= 0,
  );
  return isPossible && (lot.lossTangent ?? 0) <= 1 ? lot : null;
}
