/** From a loss table and what else is known of a cable to its model, with what does not fit. */
import { type KnownLine, modelFromLoss } from "@/lib/line/closed-mapping";
import { DB_PER_NEPER } from "@/lib/line/constants";
import type { ConductorForm, LineModel } from "@/lib/line/element";
import { fitWarnings, type FitWarning } from "@/lib/line/fit-warnings";
import { leaveOneOut, type LeftOut } from "@/lib/line/leave-one-out";
import { fitLossTable, type LossFit, type LossRow } from "@/lib/line/loss-table";
import { lossOf, type Refit, refitModel } from "@/lib/line/refit";
import { atTemperature } from "@/lib/line/temperature";

export interface FitRequest extends KnownLine {
  rows: readonly LossRow[];
  /** of the one conductor term; default `sqrt`, which is all that a loss table and a dc resistance tell */
  form?: ConductorForm;
  /** of the table, °C; default 20 */
  temperatureC?: number;
  /** high-frequency resistance of smooth conductors of the same cross-section over √f, ohm per metre per √Hz */
  smoothResistance?: number;
}

export interface ModelFit {
  table: LossFit;
  leftOut: LeftOut[];
  /** the closed mapping, at 20 °C */
  model: LineModel;
  refit: Refit;
  /** loss of the dc resistance alone in a line of low loss, at the table's temperature, dB/m */
  dcFloorDbPerM: number;
  /** k1 over that of smooth conductors, where their cross-section is known: at least 1 for anything that exists */
  k1OverSmooth: number | undefined;
  warnings: FitWarning[];
}

/**
 * Fits k1·√f + k2·f to a loss table, maps it to a model in closed form and refits that model to the table directly.
 * @throws RangeError when a figure is not positive, there are no rows, or the temperature has no positive resistivity
 */
export function fitModel(request: FitRequest): ModelFit {
  const { rows, form = "sqrt", temperatureC = 20, smoothResistance, ...known } = request;
  check(known, rows);
  const table = fitLossTable(rows);
  if (!table) throw new RangeError("fitModel: at least one row is needed");
  const atDc = { conductors: [{ form: "constant" as const, r0OhmPerM: known.r0 }], lInfHPerM: 1, cFPerM: 1 };
  const { resistivityRatio } = atTemperature(atDc, temperatureC);
  const leftOut = leaveOneOut(rows);
  const refit = refitModel(known, rows, table, form, temperatureC);
  const dcFloorDbPerM = (DB_PER_NEPER * known.r0 * resistivityRatio) / (2 * known.z0);
  const smoothK1 = smoothResistance && (DB_PER_NEPER * smoothResistance * Math.sqrt(resistivityRatio)) / (2 * known.z0);
  const k1OverSmooth = smoothK1 ? table.k1 / smoothK1 : undefined;
  return {
    table,
    leftOut,
    // the conductors' loss at high frequency goes with the square root of resistivity
    model: modelFromLoss(known, table.k1 / Math.sqrt(resistivityRatio), table.k2, form),
    refit,
    dcFloorDbPerM,
    k1OverSmooth,
    warnings: fitWarnings({
      known,
      rows,
      table,
      leftOut,
      refit,
      floorsDbPerM: floorsOf(refit.model, rows, temperatureC),
      k1OverSmooth,
      refitTo: (others) => refitModel(known, others, table, form, temperatureC),
      temperatureC,
    }),
  };
}

/**
 * The least a row can lose: the dc resistance alone, with the inductance of a current that fills the conductors. Where
 * resistance is more than reactance this is below the dc floor of a low-loss line.
 */
function floorsOf(model: LineModel, rows: readonly LossRow[], temperatureC: number): number[] {
  const internal = model.conductors.map(
    ({ r0OhmPerM, skinCornerRadPerS = Infinity }) => r0OhmPerM / (2 * skinCornerRadPerS),
  );
  const floor: LineModel = {
    ...model,
    conductors: model.conductors.map(({ r0OhmPerM }) => ({ form: "constant", r0OhmPerM })),
    lInfHPerM: internal.reduce((sum, each) => sum + each, model.lInfHPerM),
    lossTangent: 0,
  };
  return lossOf(
    floor,
    rows.map(({ frequency }) => frequency),
    temperatureC,
  );
}

function check({ z0, velocityFactor, r0 }: KnownLine, rows: readonly LossRow[]): void {
  for (const [name, value] of Object.entries({ z0, velocityFactor }))
    if (!(value > 0 && value < Infinity)) throw new RangeError(`fitModel: ${name} must be positive, got ${value}`);
  if (!(r0 >= 0 && r0 < Infinity)) throw new RangeError(`fitModel: r0 must be at least 0, got ${r0}`);
  if (rows.length === 0) throw new RangeError("fitModel: at least one row is needed");
}
