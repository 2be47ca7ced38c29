/**
 * From what was typed of a cable, by any of the ways in, to its one model. Where ways disagree the ruling one counts;
 * what it does not say is taken from the next. Pure.
 */
import type { EntryInputs } from "@/lib/cables/inputs";
import { derivedFigures } from "@/lib/cables/model";
import type { Build, Construction, Family } from "@/lib/cables/schema";
import { constructionWay } from "@/lib/cables/ways/construction-way";
import { type Estimate, exactly, share, within } from "@/lib/cables/ways/estimate";
import { fitOf, loopOf, smoothCopperResistance, solidCopper, usualForm, withLoop } from "@/lib/cables/ways/loss-way";
import { nominalWay } from "@/lib/cables/ways/nominal-way";
import { readingsWay } from "@/lib/cables/ways/readings-way";
import { firstSaid, waysInOrder } from "@/lib/cables/ways/ruling";
import { unlessRefused } from "@/lib/cables/ways/unless-refused";
import { usualSpreads } from "@/lib/cables/ways/usual-spreads";
import type { Way, WayResult, Ways } from "@/lib/cables/ways/way";
import { modelFromNominal, nominalFigures } from "@/lib/line/cable";
import type { Conductor, LineModel } from "@/lib/line/element";
import type { ModelFit } from "@/lib/line/fit";

export interface Entered {
  family: Family;
  construction: Construction | null;
  /** for the make of the conductor */
  build?: Build | null;
  inputs: EntryInputs;
  /** what no way in says of the model and an edit must not lose: loss slopes, leakage, another metal's coefficient */
  kept?: Pick<LineModel, "lossSlopes" | "g0SPerM" | "temperatureCoefficientPerK">;
}

/** Which way said what the model has; "smoothCopper" where none did and it follows from the loss. */
export interface Ruled {
  impedance: Way;
  velocityFactor: Way;
  loss: Way | null;
  resistance: Way | "smoothCopper" | null;
}

export interface Worked {
  ways: Ways;
  /** null while too little is given */
  model: LineModel | null;
  ruled: Ruled | null;
  /** shares of the value, k = 2 */
  uncertainty: { z0: number; velocityFactor: number; loss: number } | null;
  /** of the loss table, where there is one and the rest is known */
  fit: ModelFit | null;
  /** what to give so that there is a model; null where there is one */
  missing: string | null;
  /** what was taken for granted; sentences */
  notes: string[];
}

function waysOf({ family, construction, build, inputs }: Entered): Ways {
  const { nominal, readings, sweep, form = usualForm(family) } = inputs;
  return {
    ...(construction && { construction: constructionWay(construction, family, build) }),
    ...(nominal && { nominal: nominalWay(nominal, family) }),
    ...(readings && { readings: readingsWay(readings, form) }),
    ...(sweep?.model && { sweep: sweepWay(sweep.model) }),
  };
}

/** Of a swept sample what was worked out when the sweep was read; its spread is that of the sample's length and delay. */
function sweepWay(model: LineModel): WayResult {
  const { z0, velocityFactor, capacitance, inductance } = nominalFigures(model);
  const { length, delay } = usualSpreads.reading;
  const spread = Math.hypot(length, delay);
  return {
    z0: within(z0, 2 * spread),
    velocityFactor: within(velocityFactor, spread),
    capacitance: within(capacitance, 2 * spread),
    inductance: within(inductance, 2 * spread),
    loopResistance: within(loopOf(model), usualSpreads.resistance),
    model,
    notes: [],
  };
}

interface Known {
  z0: Estimate;
  velocityFactor: Estimate;
}

/** Dc loop resistance: what a way says, else what smooth copper of this loss would have. */
function resistanceOf(
  { family, inputs }: Entered,
  ways: Ways,
  { z0, velocityFactor }: Known,
): { from: Ruled["resistance"]; loop: Estimate } {
  const said = firstSaid(ways, waysInOrder("resistance", inputs.ruling), "loopResistance");
  if (said) return { from: said.way, loop: said.estimate };
  const { lossTable } = inputs;
  const line = { z0: z0.value, velocityFactor: velocityFactor.value };
  const loop = (lossTable && unlessRefused(() => smoothCopperResistance(lossTable, line, family))) ?? 0;
  return loop > 0 ? { from: "smoothCopper", loop: within(loop, 0.3) } : { from: null, loop: exactly(0) };
}

interface Lossy {
  from: Ruled["loss"];
  conductors: Conductor[];
  lossTangent: number;
  /** share of the loss, k = 2 */
  spread: number;
}

/** The part of the model that loses, by the first way that says something of it. */
function lossOf({ family, inputs }: Entered, ways: Ways, loop: number, fit: ModelFit | null): Lossy {
  for (const way of waysInOrder("loss", inputs.ruling)) {
    const said = ways[way];
    if (way === "lossTable" && fit) {
      const { conductors, lossTangent = 0 } = fit.refit.model;
      const spread = Math.max(usualSpreads.lossRow, (2 * fit.refit.rmsPercent) / 100);
      return { from: way, conductors, lossTangent, spread };
    }
    if ((way === "construction" || way === "sweep") && said?.model) {
      const { conductors, lossTangent = 0 } = said.model;
      // Without a resistance of its own, a way that has one keeps it.
      const kept = loop > 0 ? withLoop(conductors, loop) : conductors;
      return { from: way, conductors: kept, lossTangent, spread: usualSpreads.constructionLoss };
    }
    if (way === "nominal" && said && loop > 0) {
      const conductors = solidCopper(loop, said.conductorResistance?.value, family);
      return { from: way, conductors, lossTangent: said.lossTangent ?? 0, spread: 0.2 };
    }
  }
  const conductors: Conductor[] = [{ form: "constant", r0OhmPerM: loop }];
  return { from: null, conductors, lossTangent: ways.nominal?.lossTangent ?? 0, spread: 1 };
}

function nothing(ways: Ways, missing: string): Worked {
  return { ways, model: null, ruled: null, uncertainty: null, fit: null, missing, notes: notesOf(ways) };
}

const notesOf = (ways: Ways) =>
  Object.values(ways).flatMap(({ notes, refusal }) => [...(refusal ? [refusal] : []), ...notes]);

function missingWords(hasZ0: boolean, hasVelocity: boolean): string {
  const what = [!hasZ0 && "the impedance", !hasVelocity && "the velocity"].filter(Boolean).join(" and ");
  return `Nothing given says ${what} yet: type the construction, two of impedance, velocity factor and capacitance, or read a sample.`;
}

/** Whether a model can be worked with: its figures, and its loss at the frequencies the catalogue shows. */
function isFinite(model: LineModel): boolean {
  const figures = Object.values(derivedFigures(model, null, {})).filter((value) => value !== null);
  return figures.every((value) => Number.isFinite(value)) && Math.min(model.cFPerM, model.lInfHPerM) > 0;
}

/**
 * The model of what was entered, and what each way says on its own.
 * @returns a model as soon as impedance and velocity are told by anything; never a guess of those two
 */
export function fromInputs(entered: Entered): Worked {
  const { family, construction, inputs, kept } = entered;
  const ways = waysOf(entered);
  const order = waysInOrder("impedance", inputs.ruling);
  const [z0, velocity] = [firstSaid(ways, order, "z0"), firstSaid(ways, order, "velocityFactor")];
  if (!z0 || !velocity) return nothing(ways, missingWords(!!z0, !!velocity));
  const known = { z0: z0.estimate, velocityFactor: velocity.estimate };
  const { from, loop } = resistanceOf(entered, ways, known);
  const line = { z0: known.z0.value, velocityFactor: known.velocityFactor.value };
  const form = inputs.form ?? usualForm(family);
  const drawn = ways.construction?.model ? construction : null;
  const fit = (inputs.lossTable && fitOf(inputs.lossTable, { ...line, r0: loop.value }, form, drawn)) ?? null;
  const loss = lossOf(entered, ways, loop.value, fit);
  const { conductors, lossTangent } = loss;
  const model = unlessRefused(() =>
    modelFromNominal({ ...line, conductors, ...(lossTangent > 0 && { lossTangent }), ...kept }),
  );
  if (!model || !isFinite(model)) return nothing(ways, "These values give no finite impedance, velocity or loss.");
  const resistance = from ?? (loopOf({ conductors }) > 0 ? loss.from : null);
  return {
    ways,
    model,
    ruled: { impedance: z0.way, velocityFactor: velocity.way, loss: loss.from, resistance },
    uncertainty: {
      z0: share(known.z0),
      velocityFactor: share(known.velocityFactor),
      // dB for dB, what is unsure of the impedance is unsure of the loss of the same conductors
      loss: loss.from === "lossTable" ? loss.spread : Math.hypot(loss.spread, share(known.z0)),
    },
    fit,
    missing: null,
    notes: [
      ...notesOf(ways),
      ...(from === "smoothCopper"
        ? [
            inputs.nominal?.conductorResistanceOhmPerM === undefined
              ? "No dc resistance is given: that of smooth copper with this loss was taken."
              : "The dc resistance given is of one conductor: for the loop, that of smooth copper with this loss was taken.",
          ]
        : []),
      ...(loss.from === "nominal" ? ["No loss is given: the conductors were taken for solid copper."] : []),
    ],
  };
}
