/** What the checks of an entry are made from, worked out once. Pure. */
import { statedFigures } from "@/lib/cables/agreement";
import type { Checked } from "@/lib/cables/checks";
import { type LossPoint, lossTable } from "@/lib/cables/loss-rows";
import type { Figure } from "@/lib/cables/schema";
import { constructionWay } from "@/lib/cables/ways/construction-way";
import { fitOf, type LossTableInput, usualForm, loopOf } from "@/lib/cables/ways/loss-way";
import type { WayResult } from "@/lib/cables/ways/way";
import { nominalFigures } from "@/lib/line/cable";
import type { ModelFit } from "@/lib/line/fit";
import type { PerLengthQuantity } from "@/lib/line/per-length";

export interface Facts extends Checked {
  stated: Partial<Record<PerLengthQuantity, number>>;
  /** as stated, ohm per metre of cable at 20 °C */
  loop: number | undefined;
  /** of the inner conductor, or of one wire, as stated */
  core: number | undefined;
  /** what the construction says, where it can be */
  drawn: WayResult | undefined;
  /** rows of what the cable is said to lose; its limits where that is all there is */
  rows: LossPoint[];
  /** of those rows, where they have one temperature */
  fit: ModelFit | undefined;
}

function statedResistance(figures: readonly Figure[], wanted: string): number | undefined {
  return figures.find(
    ({ quantity, kind, valueSi }) =>
      quantity === wanted && (kind === "nominal" || kind === "typical" || kind === "measured") && valueSi >= 0,
  )?.valueSi;
}

function rowsOf(figures: readonly Figure[]): LossPoint[] {
  const { points, limits } = lossTable(figures);
  return points.length > 0 ? points : limits;
}

/** A table for the engine; undefined for none, or for rows of several temperatures. */
export function tableOf(rows: readonly LossPoint[]): LossTableInput | undefined {
  const [first] = rows;
  if (!first || rows.some(({ temperatureC }) => temperatureC !== first.temperatureC)) return undefined;
  return {
    temperatureC: first.temperatureC,
    kind: "nominal",
    rows: rows.map(({ frequencyHz, lossDbPer100m }) => ({ frequencyHz, lossDbPerM: lossDbPer100m / 100 })),
  };
}

export function factsOf(cable: Checked): Facts {
  const { model, figures, construction, family, inputs } = cable;
  const drawn = construction ? constructionWay(construction, family, cable.build) : undefined;
  const rows = rowsOf(figures);
  const table = tableOf(rows);
  const { z0, velocityFactor } = nominalFigures(model);
  const r0 = loopOf(model);
  const isPossible = drawn !== undefined && drawn.refusal === undefined;
  const form = inputs?.form ?? usualForm(family);
  return {
    ...cable,
    stated: Object.fromEntries([...statedFigures(figures)].map(([quantity, { valueSi }]) => [quantity, valueSi])),
    loop: statedResistance(figures, "r0OhmPerM"),
    core: statedResistance(figures, "conductorOhmPerM"),
    drawn: isPossible ? drawn : undefined,
    rows,
    fit: table && fitOf(table, { z0, velocityFactor, r0 }, form, isPossible ? construction : null),
  };
}
