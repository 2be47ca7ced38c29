/** What a row states -> an entry: model, figures, construction, and the inputs as they were given. Pure. */
import type { EntryInputs } from "@/lib/cables/inputs";
import type { Construction, Family, Figure, Limits } from "@/lib/cables/schema";
import type { Meaning } from "@/lib/cables/exchange/head-names";
import type { StatedFigure, StatedLoss, StatedRow } from "@/lib/cables/exchange/stated-row";
import { modelFromLoss } from "@/lib/line/closed-mapping";
import { DB_PER_NEPER } from "@/lib/line/constants";
import type { LineModel } from "@/lib/line/element";
import { fitLossTable } from "@/lib/line/loss-table";
import { figuresFromTwo, permittivityOf, type PerLengthQuantity, type Stated } from "@/lib/line/per-length";

/** In the order in which they are believed, as `lib/line/per-length.ts` has it for these. */
const perLength: [Meaning, PerLengthQuantity][] = [
  ["z0", "z0"],
  ["velocityFactor", "velocityFactor"],
  ["delay", "delay"],
  ["capacitance", "capacitance"],
  ["inductance", "inductance"],
];

type Figures = StatedRow["figures"];

/** Impedance and velocity by the first two figures that determine them; whether the rest agrees is for the checks. */
function lineOf(figures: Figures): { z0: number; velocityFactor: number } | undefined {
  const stated = perLength.flatMap(([meaning, quantity]): Stated[] => {
    const value = figures[meaning]?.valueSi;
    return value !== undefined && value > 0 ? [{ quantity, value }] : [];
  });
  const [first, ...rest] = stated;
  for (const second of rest) {
    const both = first && figuresFromTwo(first, second);
    if (both) return both;
  }
  return undefined;
}

/** dc resistance out and back; with a sentence where the row gives only a part of it. */
function loopOf(figures: Figures, family: Family): { r0?: number; note?: string } {
  const [loop, core, screen] = [figures.loopResistance, figures.coreResistance, figures.screenResistance];
  if (loop) return { r0: loop.valueSi };
  if (!core) return {};
  if (family !== "coaxial") return { r0: 2 * core.valueSi };
  if (screen) return { r0: core.valueSi + screen.valueSi };
  return {
    r0: core.valueSi,
    note: "Only the inner conductor's resistance is given: the loop's is more than the model has.",
  };
}

/** How far below the lowest row a model may claim the skin effect where no dc resistance says where it ends. */
const belowTable = 100;

interface Modelled {
  model: LineModel;
  notes: string[];
}

function modelOf(known: { z0: number; velocityFactor: number }, row: StatedRow, family: Family): Modelled {
  const { r0, note } = loopOf(row.figures, family);
  const notes = note === undefined ? [] : [note];
  const points = row.losses.filter(({ isLimit }) => !isLimit);
  const fit = fitLossTable(points.map(({ frequencyHz, valueSi }) => ({ frequency: frequencyHz, lossDbPerM: valueSi })));
  if (!fit) {
    if (r0 === undefined) notes.push("Neither loss nor resistance is given: the model has no loss.");
    else notes.push("No loss table is given: the model has its dc resistance at every frequency.");
    const lossTangent = row.figures.lossTangent?.valueSi ?? 0;
    return { model: { ...modelFromLoss({ ...known, r0: r0 ?? 0 }, 0, 0), lossTangent }, notes };
  }
  if (points.length === 1)
    notes.push("One row of loss cannot tell conductor from dielectric; it is put down to the conductors.");
  if (r0 !== undefined && r0 > 0) return { model: modelFromLoss({ ...known, r0 }, fit.k1, fit.k2), notes };
  const corner = (2 * Math.PI * fit.range[0]) / belowTable;
  notes.push("No dc resistance is given: below the table the model's resistance only continues the table.");
  const least = ((2 * known.z0 * fit.k1) / DB_PER_NEPER) * Math.sqrt(corner / Math.PI);
  return { model: modelFromLoss({ ...known, r0: least }, fit.k1, fit.k2), notes };
}

const quantities: [Meaning, string][] = Object.entries({
  z0: "z0Ohm",
  velocityFactor: "velocityFactor",
  delay: "delaySPerM",
  capacitance: "cFPerM",
  inductance: "lInfHPerM",
  loopResistance: "r0OhmPerM",
  coreResistance: "conductorResistanceOhmPerM",
  screenResistance: "screenResistanceOhmPerM",
  lossTangent: "lossTangent",
  outerDiameter: "outerDiameterM",
  inner: "innerDiameterM",
  dielectric: "dielectricDiameterM",
  wire: "wireDiameterM",
  spacing: "spacingM",
  permittivity: "relativePermittivity",
} satisfies Partial<Record<Meaning, string>>) as [Meaning, string][];

function figuresOf(row: StatedRow, source: string): Figure[] {
  const one = (quantity: string, { valueSi, toleranceSi, asTyped }: StatedFigure): Figure => ({
    ...{ quantity, valueSi, asTyped: asTyped.slice(0, 120), kind: "nominal", source },
    ...(toleranceSi !== undefined && { toleranceSi }),
  });
  const stated = quantities.flatMap(([meaning, quantity]) => {
    const figure = row.figures[meaning];
    return figure ? [one(quantity, figure)] : [];
  });
  const losses = row.losses.map((loss: StatedLoss): Figure => {
    const at = { fromHz: loss.frequencyHz, toHz: loss.frequencyHz };
    return { ...one("lossDbPerM", loss), ...at, kind: loss.isLimit ? "maximum" : "nominal" };
  });
  return [...stated, ...losses];
}

const millimetres = (figure: StatedFigure | undefined) =>
  figure === undefined ? undefined : Number((figure.valueSi * 1000).toPrecision(15));

function constructionOf({ figures }: StatedRow, velocityFactor: number, lossTangent: number): Construction | null {
  const { inner, dielectric, wire, spacing, permittivity, outerDiameter } = figures;
  const er = permittivity?.valueSi ?? permittivityOf(velocityFactor);
  const outer = millimetres(outerDiameter);
  const whole = { lossTangent, ...(outer !== undefined && { outerDiameterMm: outer }) };
  const [innerMm, dielectricMm] = [millimetres(inner), millimetres(dielectric)];
  if (innerMm && dielectricMm) return { kind: "coax", innerMm, dielectricMm, relativePermittivity: er, ...whole };
  const [wireMm, spacingMm] = [millimetres(wire), millimetres(spacing)];
  if (wireMm && spacingMm) return { kind: "pair", wireMm, spacingMm, effectivePermittivity: er, ...whole };
  return null;
}

function limitsOf({ figures }: StatedRow): Limits {
  const { maxFrequency, maxVoltage, minBend, minTemperature, maxTemperature } = figures;
  const limits: Limits = {
    maxFrequencyHz: maxFrequency?.valueSi,
    maxVoltageV: maxVoltage?.valueSi,
    minBendMm: millimetres(minBend),
    minTemperatureC: minTemperature?.valueSi,
    maxTemperatureC: maxTemperature?.valueSi,
  };
  return Object.fromEntries(Object.entries(limits).filter(([, value]) => value !== undefined));
}

function inputsOf({ figures, losses }: StatedRow): EntryInputs {
  const nominal = {
    z0Ohm: figures.z0?.valueSi,
    z0ToleranceOhm: figures.z0?.toleranceSi,
    velocityFactor: figures.velocityFactor?.valueSi,
    cFPerM: figures.capacitance?.valueSi,
    cToleranceFPerM: figures.capacitance?.toleranceSi,
    lInfHPerM: figures.inductance?.valueSi,
    loopResistanceOhmPerM: figures.loopResistance?.valueSi,
    conductorResistanceOhmPerM: figures.coreResistance?.valueSi,
    lossTangent: figures.lossTangent?.valueSi,
  };
  const rows = losses
    .filter(({ isLimit }) => !isLimit)
    .map(({ frequencyHz, valueSi, asTyped }) => ({ frequencyHz, lossDbPerM: valueSi, typed: asTyped.slice(0, 120) }));
  return {
    nominal: Object.fromEntries(Object.entries(nominal).filter(([, value]) => value !== undefined)),
    ...(rows.length > 0 && { lossTable: { temperatureC: 20, kind: "nominal" as const, rows } }),
  };
}

/**
 * @param family - where the row names none
 * @param source - where the row names none
 * @returns the entry before its schema has looked at it, and what to know of how it was made
 */
export function statedEntry(row: StatedRow, family: Family | undefined, source: string) {
  const faults: string[] = [];
  const known = row.family ?? family;
  if (!known) faults.push("Say its family: coaxial, twisted pair or twinaxial.");
  if (row.texts.designation.trim() === "") faults.push("It has no designation.");
  const line = lineOf(row.figures);
  if (!line)
    faults.push(
      "Two of impedance, velocity factor (or delay), capacitance and inductance are needed: they make a line.",
    );
  if (row.losses.some(({ valueSi }) => !(valueSi > 0))) faults.push("A loss must be more than 0.");
  if (faults.length > 0 || !line || !known) return { faults, notes: [], entry: undefined };
  const { z0, velocityFactor } = line;
  const { model, notes } = modelOf({ z0, velocityFactor }, row, known);
  const { designation, aliases, name } = row.texts;
  const entry = {
    ...{ designation, aliases, name, family: known, model },
    construction: constructionOf(row, velocityFactor, row.figures.lossTangent?.valueSi ?? model.lossTangent ?? 0),
    ...{
      build: null,
      figures: figuresOf(row, row.texts.source ?? source),
      limits: limitsOf(row),
      inputs: inputsOf(row),
    },
  };
  return { faults, notes, entry };
}
