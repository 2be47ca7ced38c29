/** From a loss table, and what else is known of its cable, to the part of the model that loses. Pure. */
import type { EntryInputs } from "@/lib/cables/inputs";
import type { Construction, Family } from "@/lib/cables/schema";
import { unlessRefused } from "@/lib/cables/ways/unless-refused";
import { geometryOf } from "@/lib/compute/geometry/answer";
import type { KnownLine } from "@/lib/line/closed-mapping";
import { roundConductor, surfaceResistance, tubeConductor } from "@/lib/line/conductor-shape";
import { DB_PER_NEPER, MU0, SPEED_OF_LIGHT } from "@/lib/line/constants";
import type { Conductor, ConductorForm, LineModel } from "@/lib/line/element";
import { fitModel, type ModelFit } from "@/lib/line/fit";
import { USUAL_SHIELD_WALL } from "@/lib/line/geometry";
import { fitLossTable, type LossRow } from "@/lib/line/loss-table";

export type LossTableInput = NonNullable<EntryInputs["lossTable"]>;

/** The rows that count. */
export function fittedRows({ rows }: LossTableInput): LossRow[] {
  return rows
    .filter(({ isLeftOut }) => !isLeftOut)
    .map(({ frequencyHz, lossDbPerM }) => ({ frequency: frequencyHz, lossDbPerM }));
}

/** A pair's wire is round; of a coaxial cable all that its loss table tells is one lumped term. */
export function usualForm(family: Family): ConductorForm {
  return family === "coaxial" ? "sqrt" : "round";
}

/**
 * High-frequency resistance of smooth conductors of a construction over √f, ohm per metre per √Hz.
 * @throws RangeError where the construction cannot be
 */
export function smoothResistanceOf(construction: Construction): number {
  const smooth = construction.kind === "coax" ? { ...construction, strandFactor: 1, braidFactor: 1 } : construction;
  return geometryOf(smooth).highFrequencyResistance(1);
}

/** The fit of a table; undefined where it has no rows that count, or the engine refuses. */
export function fitOf(
  table: LossTableInput,
  known: KnownLine,
  form: ConductorForm,
  construction: Construction | null,
): ModelFit | undefined {
  const rows = fittedRows(table);
  if (rows.length === 0) return undefined;
  return unlessRefused(() => {
    const smoothResistance = construction ? smoothResistanceOf(construction) : undefined;
    return fitModel({ ...known, rows, form, temperatureC: table.temperatureC, smoothResistance });
  });
}

/**
 * Dc loop resistance of smooth copper that would lose the table's part in √f, ohm per metre: what is put in the place of
 * a resistance nobody gave. Impedance and velocity give the ratio of the diameters, the loss gives their size.
 * Source: R = 2·Z0·α; coaxial R = (Rs/π)(1/d + 1/D), ln(D/d) = 2π·Z0/(η0·VF); pair R = (2Rs/πd)·P, acosh(s/d) = π·Z0/(η0·VF).
 */
export function smoothCopperResistance(
  table: LossTableInput,
  { z0, velocityFactor }: Pick<KnownLine, "z0" | "velocityFactor">,
  family: Family,
): number {
  const fit = fitLossTable(fittedRows(table));
  if (!fit || !(fit.k1 > 0)) return 0;
  const perRoot = (2 * z0 * fit.k1) / DB_PER_NEPER;
  const surface = surfaceResistance(1);
  const shape = (Math.PI * z0) / (freeSpaceImpedance * velocityFactor);
  if (family === "coaxial") {
    const ratio = Math.exp(2 * shape);
    const inner = ((surface / Math.PI) * (1 + 1 / ratio)) / perRoot;
    const outer = tubeConductor(inner * ratio, USUAL_SHIELD_WALL);
    return roundConductor(inner).r0OhmPerM + outer.r0OhmPerM;
  }
  const ratio = Math.cosh(shape);
  const proximity = ratio / Math.sqrt(ratio * ratio - 1);
  return 2 * roundConductor((2 * surface * proximity) / (Math.PI * perRoot)).r0OhmPerM;
}

/** √(μ0/ε0), ohm */
const freeSpaceImpedance = MU0 * SPEED_OF_LIGHT;

/** Dc resistance of the loop, ohm per metre. */
export const loopOf = ({ conductors }: Pick<LineModel, "conductors">) =>
  conductors.reduce((sum, { r0OhmPerM }) => sum + r0OhmPerM, 0);

/**
 * Conductors with another dc resistance and the same loss at high frequency: R0 times n and the corner times n² leave
 * R0·√(ω/2ωs) as it is.
 */
export function withLoop(conductors: readonly Conductor[], loop: number): Conductor[] {
  const now = loopOf({ conductors: [...conductors] });
  if (!(now > 0)) return [{ form: "constant", r0OhmPerM: loop }];
  const n = loop / now;
  if (!(n > 0)) return [{ form: "constant", r0OhmPerM: 0 }];
  return conductors.map((term) => ({
    ...term,
    r0OhmPerM: term.r0OhmPerM * n,
    ...(term.skinCornerRadPerS !== undefined && { skinCornerRadPerS: term.skinCornerRadPerS * n * n }),
  }));
}

/**
 * Conductors of which only the dc resistance is known, taken for solid copper: a round wire of resistance R has its skin
 * corner at 4πR/μ0, since ωs = 4ρ/(μ0·a²) and R = ρ/(π·a²). What a coaxial cable's outer conductor adds stays as at dc.
 */
export function solidCopper(loop: number, core: number | undefined, family: Family): Conductor[] {
  if (!(loop > 0)) return [{ form: "constant", r0OhmPerM: 0 }];
  const wire = core ?? (family === "coaxial" ? loop : loop / 2);
  const skinCornerRadPerS = (4 * Math.PI * wire) / MU0;
  if (family !== "coaxial" || core === undefined || core >= loop)
    return [{ form: "round", r0OhmPerM: loop, skinCornerRadPerS }];
  return [
    { form: "round", r0OhmPerM: core, skinCornerRadPerS },
    { form: "constant", r0OhmPerM: loop - core },
  ];
}
