/** What stands in the editor's fields -> what is entered of a cable, with a sentence for each field that cannot be read. */
import {
  constructionFigures,
  figureFields,
  type FigureName,
  figureNames,
  nominalInputs,
  readingInputs,
} from "@/lib/cables/editor/fields";
import { readFigure } from "@/lib/cables/editor/read-figure";
import { type ReadRows, readRows } from "@/lib/cables/editor/read-rows";
import { type EntryTexts, sourceParts, type SourceTexts, sourceWays } from "@/lib/cables/editor/texts";
import type { EntryInputs } from "@/lib/cables/inputs";
import { newCableSchema } from "@/lib/cables/new-cable";
import type { Provenance } from "@/lib/cables/provenance";
import type { Build, Construction, Limits } from "@/lib/cables/schema";
import { metals } from "@/lib/line/materials";

export interface ReadEntry {
  designation: string;
  aliases: string[];
  name: string;
  construction: Construction | null;
  build: Build | null;
  limits: Limits;
  inputs: EntryInputs;
  table: ReadRows;
  /** by the field's path */
  faults: Record<string, string>;
  /** what was understood of a figure typed in another unit */
  understood: Partial<Record<FigureName, string>>;
}

type Values = Partial<Record<FigureName, number>>;

const bare = /^[\s\d.,+\-\u2212e]*$/i;

function readFigures(texts: Record<FigureName, string>) {
  const values: Values = {};
  const faults: Record<string, string> = {};
  const understood: ReadEntry["understood"] = {};
  for (const name of figureNames) {
    const read = readFigure(name, texts[name]);
    if (!read) continue;
    if (!read.ok) faults[`figures.${name}`] = read.message;
    else values[name] = read.value;
    const isWorthSaying = read.ok && (!bare.test(texts[name]) || read.understood.includes("read as"));
    if (isWorthSaying) understood[name] = `= ${read.understood}`;
  }
  return { values, faults, understood };
}

/** Texts of figures that were given, each under its name: kept so that they come back as they were typed. */
function typedOf(texts: Record<FigureName, string>, names: readonly (readonly [FigureName, string])[]) {
  return Object.fromEntries(
    names.flatMap(([name, as]) => (texts[name].trim() === "" ? [] : [[as, withUnit(name, texts[name])] as const])),
  );
}

/** Values under the names that inputs have for them. */
function valuesOf<Name extends FigureName, As extends string>(values: Values, names: Record<Name, As>) {
  const pairs = (Object.entries(names) as [Name, As][]).map(([name, as]) => [as, values[name]] as const);
  return given(Object.fromEntries(pairs) as Record<As, number | undefined>);
}

function withUnit(name: FigureName, text: string): string {
  const { unit } = figureFields[name];
  return (bare.test(text) && unit !== "" ? `${text.trim()} ${unit}` : text.trim()).slice(0, 120);
}

const mm = (value: number | undefined) => (value === undefined ? undefined : Number((value * 1000).toPrecision(12)));
const given = <T extends object>(values: T): T =>
  Object.fromEntries(Object.entries(values).filter(([, value]) => value !== undefined)) as T;

function constructionOf({ kind, metal }: EntryTexts, values: Values): Construction | null {
  const { conductor, insulation, permittivity, tangent = 0, outer, screenBore } = values;
  if (kind === "none" || conductor === undefined || insulation === undefined || permittivity === undefined) return null;
  const [size, around] = [mm(conductor) ?? NaN, mm(insulation) ?? NaN];
  const resistivity = metal === "copper" ? undefined : metals.find(({ id }) => id === metal)?.resistivity;
  const shared = { lossTangent: tangent, conductorResistivityOhmM: resistivity, outerDiameterMm: mm(outer) };
  if (kind === "coax")
    return given<Construction>({
      ...{ kind, innerMm: size, dielectricMm: around, relativePermittivity: permittivity, ...shared },
      ...{ shieldThicknessMm: mm(values.shield), strandFactor: values.strandFactor, braidFactor: values.braidFactor },
    });
  return given<Construction>({
    ...{ kind, wireMm: size, spacingMm: around, effectivePermittivity: permittivity, ...shared },
    ...{ layMm: mm(values.lay), screen: screenBore === undefined ? undefined : { innerMm: mm(screenBore) ?? NaN } },
  });
}

function nominalOf(texts: EntryTexts, values: Values): EntryInputs["nominal"] {
  const typed = typedOf(texts.figures, Object.entries(nominalInputs) as [FigureName, string][]);
  return Object.keys(typed).length === 0 ? undefined : { ...valuesOf(values, nominalInputs), typed };
}

function readingsOf(texts: EntryTexts, values: Values): EntryInputs["readings"] {
  if (values.sample === undefined) return undefined;
  const instrument = texts.instrument.trim().slice(0, 200);
  return {
    ...valuesOf(values, readingInputs),
    lengthM: values.sample,
    ...(instrument && { instrument }),
    typed: typedOf(texts.figures, Object.entries(readingInputs) as [FigureName, string][]),
  };
}

function sourceOf(texts: SourceTexts, enteredBy: string | undefined): Provenance | undefined {
  const parts = Object.fromEntries(
    sourceParts.flatMap((part) => (texts[part].trim() ? [[part, texts[part].trim()]] : [])),
  );
  return texts.kind === "" ? undefined : { kind: texts.kind, ...parts, ...(enteredBy && { enteredBy }) };
}

function buildOf({ hasBuild, build }: EntryTexts): Build | null {
  if (!hasBuild) return null;
  const pairCount = Math.min(100, Math.max(1, Math.round(Number(build.pairCount)) || 1));
  return { ...build, pairCount, jacket: build.jacket.trim() || null };
}

/**
 * Reads the whole editor. What cannot be read is left out and told.
 * @param enteredBy - who types, for the sources
 */
export function readTexts(texts: EntryTexts, enteredBy?: string): ReadEntry {
  const { values, faults, understood } = readFigures(texts.figures);
  const table = readRows(texts.rows, texts.lossUnit);
  const { ruling, form } = texts;
  const sources = given(Object.fromEntries(sourceWays.map((way) => [way, sourceOf(texts.sources[way], enteredBy)])));
  const constructionTyped = typedOf(
    texts.figures,
    texts.kind === "none" ? [] : constructionFigures[texts.kind].map((name) => [name, name] as const),
  );
  const inputs: EntryInputs = given({
    nominal: nominalOf(texts, values),
    lossTable:
      table.rows.length === 0
        ? undefined
        : { temperatureC: values.tableTemperature ?? 20, kind: texts.tableKind, rows: table.rows },
    readings: readingsOf(texts, values),
    sweep: texts.sweep ?? undefined,
    ...{ ruling, form: form || undefined, constructionTyped },
    sources: Object.keys(sources).length > 0 ? sources : undefined,
  });
  const aliases = texts.aliases
    .split(/[,;]/)
    .map((alias) => alias.trim())
    .filter(Boolean);
  const named = namedFaults({ designation: texts.designation, aliases, name: texts.name });
  return {
    ...{ designation: texts.designation.trim(), aliases, name: texts.name.trim() },
    construction: constructionOf(texts, values),
    build: buildOf(texts),
    limits: given({
      ...{ maxFrequencyHz: values.maxFrequency, maxVoltageV: values.maxVoltage, minBendMm: mm(values.minBend) },
      ...{ minTemperatureC: values.minTemperature, maxTemperatureC: values.maxTemperature },
    }),
    ...{ inputs, table, understood },
    faults: { ...named, ...faults, ...table.faults },
  };
}

const namesSchema = newCableSchema.pick({ designation: true, aliases: true, name: true });

function namedFaults(names: { designation: string; aliases: string[]; name: string }): Record<string, string> {
  const read = namesSchema.safeParse(names);
  return Object.fromEntries((read.error?.issues ?? []).map(({ path, message }) => [String(path[0]), message]));
}
