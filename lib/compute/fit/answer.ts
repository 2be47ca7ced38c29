/** A loss table of the wire -> a fit of the engine -> the wire. Pure. */
import type { Construction } from "@/lib/cables/schema";
import type { FitAnswer, FitRequest } from "@/lib/compute/fit/schema";
import { warningSentence } from "@/lib/compute/fit/warning-sentence";
import { geometryOf } from "@/lib/compute/geometry/answer";
import { wireNumber } from "@/lib/compute/wire";
import { fitModel } from "@/lib/line/fit";

/** High-frequency resistance of smooth conductors over √f, ohm per metre per √Hz. */
function smoothResistanceOf(construction: Construction): number {
  const smooth = construction.kind === "coax" ? { ...construction, strandFactor: 1, braidFactor: 1 } : construction;
  return geometryOf(smooth).highFrequencyResistance(1);
}

/** @throws RangeError where the engine refuses */
export function fitAnswer(request: FitRequest): FitAnswer {
  const { z0Ohm: z0, velocityFactor, r0OhmPerM: r0, form, temperatureC, construction } = request;
  const rows = request.points.map(({ frequencyHz, ...rest }) => ({ frequency: frequencyHz, ...rest }));
  const smoothResistance = construction && smoothResistanceOf(construction);
  const fit = fitModel({ z0, velocityFactor, r0, rows, form, temperatureC, smoothResistance });
  const { table, leftOut, refit } = fit;
  return {
    k1DbPerMRootHz: table.k1,
    k2DbPerMHz: table.k2,
    model: fit.model,
    refit: { model: refit.model, rmsPercent: refit.rmsPercent },
    residuals: table.rows.map((row, n) => ({
      frequencyHz: row.frequency,
      givenDbPerM: row.lossDbPerM,
      fittedDbPerM: row.fittedDbPerM,
      errorPercent: row.errorPercent,
      leftOutErrorPercent: wireNumber(leftOut[n]?.errorPercent ?? NaN),
      refitErrorPercent: 100 * (1 - (refit.fittedDbPerM[n] ?? NaN) / row.lossDbPerM),
    })),
    rmsPercent: table.rmsPercent,
    worstPercent: table.worstPercent,
    dcFloorDbPerM: fit.dcFloorDbPerM,
    ...(fit.k1OverSmooth !== undefined && { k1OverSmooth: fit.k1OverSmooth }),
    warnings: fit.warnings.map(warningSentence),
  };
}
