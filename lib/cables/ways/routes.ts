/** Every way to one figure, for a plot that shows whether they agree. Pure. */
import type { EntryInputs } from "@/lib/cables/inputs";
import type { Family } from "@/lib/cables/schema";
import type { Worked } from "@/lib/cables/from-inputs";
import { type Estimate, within } from "@/lib/cables/ways/estimate";
import { fromTwo, statedFigures } from "@/lib/cables/ways/nominal-way";
import { usualSpreads } from "@/lib/cables/ways/usual-spreads";
import { propagation } from "@/lib/line/cable";
import { DB_PER_NEPER } from "@/lib/line/constants";
import type { LineModel } from "@/lib/line/element";
import type { PerLengthQuantity } from "@/lib/line/per-length";

/** A way to a figure, in the order in which they are shown. */
export type RouteName =
  "construction" | "nominal" | "velocityAndC" | "impedanceAndC" | "inductanceAndC" | "readings" | "sweep" | "lossTable";

export interface Route extends Estimate {
  route: RouteName;
}

export interface Routes {
  /** ohm */
  z0: Route[];
  velocityFactor: Route[];
  /** dB/m at one frequency */
  loss: Route[];
  frequencyHz: number;
}

const named = (route: RouteName, estimate: Estimate | undefined): Route[] =>
  estimate && Number.isFinite(estimate.value) && estimate.value > 0 ? [{ route, ...estimate }] : [];

/** What two stated figures say of a third. */
function stated(
  entered: { inputs: EntryInputs; family: Family },
  wanted: PerLengthQuantity,
  first: PerLengthQuantity,
  second: PerLengthQuantity,
): Estimate | undefined {
  const { nominal } = entered.inputs;
  const given = nominal ? statedFigures(nominal, entered.family) : {};
  const [a, b] = [given[first], given[second]];
  return a && b ? fromTwo(wanted, [first, a], [second, b]) : undefined;
}

/** Attenuation of a model at 20 °C, dB/m. */
function lossAt(model: LineModel, frequencyHz: number): number {
  return propagation(model, { re: 0, im: 2 * Math.PI * frequencyHz }).gamma.re * DB_PER_NEPER;
}

function lossRoutes({ ways, fit, model, ruled }: Worked, frequencyHz: number): Route[] {
  const construction = ways.construction?.model;
  const sweep = ways.sweep?.model;
  const nominal = ruled?.loss === "nominal" ? model : undefined;
  const of = (route: RouteName, line: LineModel | null | undefined, spread: number) =>
    line ? named(route, within(lossAt(line, frequencyHz), spread)) : [];
  return [
    ...of("construction", construction, usualSpreads.constructionLoss),
    ...of("nominal", nominal, 0.2),
    ...of("sweep", sweep, usualSpreads.lossRow),
    ...of("lossTable", fit?.refit.model, Math.max(usualSpreads.lossRow, (2 * (fit?.refit.rmsPercent ?? 0)) / 100)),
  ];
}

/** @param frequencyHz - at which the losses are compared, above 0 */
export function routesOf(
  entered: { inputs: EntryInputs; family: Family },
  worked: Worked,
  frequencyHz: number,
): Routes {
  const { construction, readings, sweep } = worked.ways;
  const nominal = entered.inputs.nominal ? statedFigures(entered.inputs.nominal, entered.family) : {};
  return {
    z0: [
      ...named("construction", construction?.z0),
      ...named("nominal", nominal.z0),
      ...named("velocityAndC", stated(entered, "z0", "velocityFactor", "capacitance")),
      ...named("inductanceAndC", stated(entered, "z0", "capacitance", "inductance")),
      ...named("readings", readings?.z0),
      ...named("sweep", sweep?.z0),
    ],
    velocityFactor: [
      ...named("construction", construction?.velocityFactor),
      ...named("nominal", nominal.velocityFactor),
      ...named("impedanceAndC", stated(entered, "velocityFactor", "z0", "capacitance")),
      ...named("readings", readings?.velocityFactor),
      ...named("sweep", sweep?.velocityFactor),
    ],
    loss: lossRoutes(worked, frequencyHz),
    frequencyHz,
  };
}
