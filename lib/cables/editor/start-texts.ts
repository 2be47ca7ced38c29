/** An entry -> what stands in the editor's fields when it is opened: as it was typed, else as its figures have it. Pure. */
import {
  constructionFigures,
  type FigureField,
  figureFields,
  type FigureName,
  nominalFigures,
  nominalInputs,
  readingFigures,
  readingInputs,
} from "@/lib/cables/editor/fields";
import {
  emptySource,
  emptyTexts,
  type EntryTexts,
  noFigures,
  type RowTexts,
  sourceParts,
  type SourceTexts,
  sourceWays,
} from "@/lib/cables/editor/texts";
import { inputsOfFigures } from "@/lib/cables/editor/inputs-of-figures";
import type { EntryInputs } from "@/lib/cables/inputs";
import type { Provenance } from "@/lib/cables/provenance";
import type { Cable, Construction, Limits } from "@/lib/cables/schema";
import { lossUnits, type LossUnit } from "@/lib/cables/pasting/units";
import type { LineModel } from "@/lib/line/element";
import { metals } from "@/lib/line/materials";

export type Opened = Pick<
  Cable,
  "designation" | "aliases" | "name" | "family" | "construction" | "build" | "figures" | "limits"
> & { inputs?: EntryInputs | null; model?: LineModel };

/** The form of the conductor: as chosen, else that of a stored model of one term, so that opening it changes nothing. */
function formOf({ inputs, model }: Opened): EntryTexts["form"] {
  const [term, ...more] = model?.conductors ?? [];
  if (inputs || !term || more.length > 0) return inputs?.form ?? "";
  return term.form === "round" || term.form === "sqrt" ? term.form : "";
}

const shown = (value: number) => String(Number(value.toPrecision(9)));

/** A value in the unit of its field, without the unit. */
function textOf(name: FigureName, value: number | undefined): string {
  if (value === undefined) return "";
  const field: FigureField = figureFields[name];
  return shown(value / (field.perUnit ?? 1));
}

/** What was typed, less a unit that stands beside the field anyway. */
function typedText(name: FigureName, typed: string | undefined, value: number | undefined): string {
  if (typed === undefined) return textOf(name, value);
  const { unit } = figureFields[name];
  return unit !== "" && typed.endsWith(` ${unit}`) ? typed.slice(0, -unit.length - 1) : typed;
}

const metres = (mm: number | undefined) => (mm === undefined ? undefined : mm / 1000);

function sizesOf(construction: Construction): Partial<Record<FigureName, number | undefined>> {
  const { lossTangent: tangent, outerDiameterMm } = construction;
  const outer = metres(outerDiameterMm);
  if (construction.kind === "coax") {
    const { innerMm, dielectricMm, relativePermittivity, shieldThicknessMm, strandFactor, braidFactor } = construction;
    const sizes = { conductor: metres(innerMm), insulation: metres(dielectricMm), shield: metres(shieldThicknessMm) };
    return { ...sizes, permittivity: relativePermittivity, tangent, outer, strandFactor, braidFactor };
  }
  const { wireMm, spacingMm, effectivePermittivity, layMm, screen } = construction;
  const sizes = { conductor: metres(wireMm), insulation: metres(spacingMm), lay: metres(layMm) };
  return { ...sizes, permittivity: effectivePermittivity, tangent, outer, screenBore: metres(screen?.innerMm) };
}

function limitTexts(limits: Limits): Partial<Record<FigureName, string>> {
  return {
    maxFrequency: textOf("maxFrequency", limits.maxFrequencyHz),
    maxVoltage: textOf("maxVoltage", limits.maxVoltageV),
    minBend: textOf("minBend", metres(limits.minBendMm)),
    minTemperature: textOf("minTemperature", limits.minTemperatureC),
    maxTemperature: textOf("maxTemperature", limits.maxTemperatureC),
  };
}

function figureTexts({ construction, limits }: Opened, inputs: EntryInputs): Record<FigureName, string> {
  const { nominal, readings, lossTable, constructionTyped } = inputs;
  const sizes = construction ? sizesOf(construction) : {};
  const names = construction ? constructionFigures[construction.kind] : [];
  const fields = [
    ...names.map((name) => [name, typedText(name, constructionTyped?.[name], sizes[name])] as const),
    ...nominalFigures.map((name) => {
      const as = nominalInputs[name];
      return [name, typedText(name, nominal?.typed?.[as], nominal?.[as])] as const;
    }),
    ...readingFigures.map((name) => {
      const as = readingInputs[name];
      return [name, typedText(name, readings?.typed?.[as], readings?.[as])] as const;
    }),
  ];
  const tableTemperature = shown(lossTable?.temperatureC ?? 20);
  return { ...noFigures, ...Object.fromEntries(fields), ...limitTexts(limits), tableTemperature };
}

/** The unit most rows were typed in, if they were all typed in one. */
function unitOf(rows: NonNullable<EntryInputs["lossTable"]>["rows"]): LossUnit {
  const units = Object.keys(lossUnits) as LossUnit[];
  return (
    units.find((unit) => rows.length > 0 && rows.every(({ typed }) => typed?.includes(` ${unit} at `))) ?? "dB/100 m"
  );
}

function rowTexts(rows: NonNullable<EntryInputs["lossTable"]>["rows"], unit: LossUnit): RowTexts[] {
  return rows.map(({ frequencyHz, lossDbPerM, isLeftOut = false, note = "" }) => ({
    frequency: shown(frequencyHz / 1e6),
    loss: shown(lossDbPerM / lossUnits[unit]),
    ...{ isLeftOut, note },
  }));
}

function sourceTexts(provenance: Provenance | undefined): SourceTexts {
  if (!provenance) return emptySource;
  const parts = sourceParts.map((part) => [part, provenance[part] ?? ""] as const);
  return { ...emptySource, ...Object.fromEntries(parts), kind: provenance.kind };
}

function metalOf(construction: Construction | null): EntryTexts["metal"] {
  const resistivity = construction?.conductorResistivityOhmM;
  const found = metals.find((metal) => metal.resistivity === resistivity)?.id;
  return found === "silver" || found === "aluminium" ? found : "copper";
}

export function startTexts(cable: Opened): EntryTexts {
  const { designation, aliases, name, family, construction, build } = cable;
  const inputs = cable.inputs ?? inputsOfFigures(cable.figures);
  const rows = inputs.lossTable?.rows ?? [];
  const lossUnit = unitOf(rows);
  return {
    ...{ designation, aliases: aliases.join(", "), name, family, kind: construction?.kind ?? "none" },
    metal: metalOf(construction),
    hasBuild: build !== null,
    build: build
      ? { ...build, pairCount: String(build.pairCount), jacket: build.jacket ?? "" }
      : { ...emptyTexts.build, conductor: "" },
    figures: figureTexts(cable, inputs),
    tableKind: inputs.lossTable?.kind ?? "nominal",
    ...{ lossUnit, rows: rowTexts(rows, lossUnit), ruling: inputs.ruling ?? emptyTexts.ruling },
    form: formOf(cable),
    instrument: inputs.readings?.instrument ?? "",
    sweep: inputs.sweep ?? null,
    sources: Object.fromEntries(
      sourceWays.map((way) => [way, sourceTexts(inputs.sources?.[way])]),
    ) as EntryTexts["sources"],
  };
}
