import { prepareLine } from "@/lib/line/cable";
import { type KnownLine, lossTangentOf, modelOf, skinCornerOf } from "@/lib/line/closed-mapping";
import { DB_PER_NEPER } from "@/lib/line/constants";
import type { ConductorForm, LineModel } from "@/lib/line/element";
import { leastSquares, type Unknown } from "@/lib/line/least-squares";
import type { LossFit, LossRow } from "@/lib/line/loss-table";
import { atTemperature } from "@/lib/line/temperature";

/** A loss tangent above this is no cable's insulation. */
export const MOST_LOSS_TANGENT = 0.1;
/** How far the skin corner may go from the closed mapping's, as a factor either way. */
const cornerReach = 1e3;
/** Unknowns are of the order of 1: the loss tangent is counted in thousandths. */
const tangentUnit = 1e-3;

export interface Refit {
  /** at 20 °C */
  model: LineModel;
  /** attenuation of the model at the table's temperature, dB/m, row by row */
  fittedDbPerM: number[];
  /** of (given − fitted)/given */
  rmsPercent: number;
  /** whether skin corner or loss tangent ended at a bound, so that the table asks for more than the model can */
  isAtBound: boolean;
}

/** Attenuation of a model at 20 °C, taken to a temperature, dB/m. */
export function lossOf(model: LineModel, frequencies: readonly number[], temperatureC: number): number[] {
  const line = prepareLine(atTemperature(model, temperatureC).model);
  return frequencies.map((frequency) => line({ re: 0, im: 2 * Math.PI * frequency }).gamma.re * DB_PER_NEPER);
}

/**
 * Skin corner and loss tangent of the chosen conductor form that meet the table itself, least squares on the relative
 * error, both within bounds. The closed mapping is where it starts: that one holds far above the corner only.
 * @param rows - positive throughout
 * @param table - the fit of the same rows
 * @throws RangeError as `leastSquares` does
 */
export function refitModel(
  known: KnownLine,
  rows: readonly LossRow[],
  table: Pick<LossFit, "k1" | "k2" | "range">,
  form: ConductorForm,
  temperatureC: number,
): Refit {
  const frequencies = rows.map(({ frequency }) => frequency);
  const tangent: Unknown = {
    start: lossTangentOf(known.velocityFactor, table.k2) / tangentUnit,
    low: 0,
    high: MOST_LOSS_TANGENT / tangentUnit,
  };
  // where the fit has no part in √f, the corner is looked for from the top of the table
  const closed = skinCornerOf(known, table.k1);
  const middle = closed > 0 && closed < Infinity ? closed : 2 * Math.PI * table.range[1];
  const reach = Math.log(cornerReach);
  const corner: Unknown = { start: 0, low: -reach, high: reach };
  const hasCorner = form !== "constant" && known.r0 > 0;
  const modelAt = ([first = 0, second = 0]: readonly number[]) =>
    hasCorner
      ? modelOf(known, form, middle * Math.exp(second), first * tangentUnit)
      : modelOf(known, "constant", Infinity, first * tangentUnit);
  const errors = (at: readonly number[], into: Float64Array) =>
    lossOf(modelAt(at), frequencies, temperatureC).forEach((fitted, k) => {
      const { lossDbPerM, weight = 1 } = rows[k] ?? { lossDbPerM: NaN };
      into[k] = Math.sqrt(weight) * (fitted / lossDbPerM - 1);
    });
  const unknowns = hasCorner && rows.length > 1 ? [tangent, corner] : [tangent];
  const { at, isAtBound } = leastSquares(errors, rows.length, unknowns);
  const model = modelAt(at);
  const fittedDbPerM = lossOf(model, frequencies, temperatureC);
  const squares = rows.reduce((sum, { lossDbPerM }, k) => sum + (1 - (fittedDbPerM[k] ?? NaN) / lossDbPerM) ** 2, 0);
  const hitsBound = isAtBound.some((is, i) => is && !(i === 0 && (at[0] ?? 0) === 0));
  return { model, fittedDbPerM, rmsPercent: 100 * Math.sqrt(squares / rows.length), isAtBound: hitsBound };
}
