/** The figures of an entry as its inputs give them, each with kind, tolerance, conditions and source. Pure. */
import type { Worked } from "@/lib/cables/from-inputs";
import type { EntryInputs } from "@/lib/cables/inputs";
import { type Provenance, sourceWords } from "@/lib/cables/provenance";
import type { Figure } from "@/lib/cables/schema";
import type { Nominal } from "@/lib/cables/ways/nominal-way";
import { usualMeterHz, type SampleReadings } from "@/lib/cables/ways/readings-way";
import { loopOf, type LossTableInput } from "@/lib/cables/ways/loss-way";
import { nominalFigures } from "@/lib/line/cable";

const unnamed = "the entry names no source";

const shown = (value: number) => String(Number(value.toPrecision(6)));

type Made = Omit<Figure, "source" | "provenance">;

const sourced =
  (provenance: Provenance | undefined, otherwise = unnamed) =>
  (figure: Made): Figure => ({
    ...figure,
    source: sourceWords(provenance, otherwise),
    ...(provenance && { provenance }),
  });

/** A nominal figure: its quantity, the field it is typed in and its tolerance's. */
const nominalFields = [
  { quantity: "z0Ohm", field: "z0Ohm", tolerance: "z0ToleranceOhm", unit: " Ω", perSi: 1 },
  { quantity: "velocityFactor", field: "velocityFactor", tolerance: "velocityFactorTolerance", unit: "", perSi: 1 },
  { quantity: "cFPerM", field: "cFPerM", tolerance: "cToleranceFPerM", unit: " pF/m", perSi: 1e12 },
  { quantity: "lInfHPerM", field: "lInfHPerM", unit: " nH/m", perSi: 1e9 },
  { quantity: "r0OhmPerM", field: "loopResistanceOhmPerM", unit: " Ω/km loop", perSi: 1e3 },
  { quantity: "conductorOhmPerM", field: "conductorResistanceOhmPerM", unit: " Ω/km", perSi: 1e3 },
  { quantity: "lossTangent", field: "lossTangent", unit: "", perSi: 1 },
] as const;

function nominalRows(nominal: Nominal): Made[] {
  return nominalFields.flatMap((row) => {
    const valueSi = nominal[row.field];
    if (valueSi === undefined) return [];
    const toleranceSi = "tolerance" in row ? nominal[row.tolerance] : undefined;
    const asTyped = nominal.typed?.[row.field] ?? `${shown(valueSi * row.perSi)}${row.unit}`;
    return [
      {
        ...{ quantity: row.quantity, valueSi, asTyped, kind: "nominal" as const, temperatureC: 20 },
        ...(toleranceSi !== undefined && { toleranceSi }),
      },
    ];
  });
}

/** A row that is left out of the fit stays among the inputs, and is no figure of the entry. */
function lossRows({ rows, temperatureC, kind }: LossTableInput): Made[] {
  return rows
    .filter(({ isLeftOut }) => !isLeftOut)
    .map(({ frequencyHz, lossDbPerM, typed }) => ({
      ...{ quantity: "lossDbPerM", valueSi: lossDbPerM, kind, temperatureC, fromHz: frequencyHz, toHz: frequencyHz },
      asTyped: typed ?? `${shown(lossDbPerM * 100)} dB/100 m at ${shown(frequencyHz / 1e6)} MHz`,
    }));
}

/** What was read, per metre of the sample. */
function readingRows(readings: SampleReadings): Made[] {
  const { lengthM, meterHz = usualMeterHz, temperatureC = 20, typed } = readings;
  const at = { fromHz: meterHz, toHz: meterHz };
  const delay = readings.oneWayDelayS ?? (readings.roundTripS === undefined ? undefined : readings.roundTripS / 2);
  const rows = [
    { quantity: "cFPerM", field: "openCapacitanceF", of: readings.openCapacitanceF, unit: " pF", perSi: 1e12, ...at },
    {
      quantity: "lMeterHPerM",
      field: "shortInductanceH",
      of: readings.shortInductanceH,
      unit: " nH",
      perSi: 1e9,
      ...at,
    },
    {
      quantity: "rMeterOhmPerM",
      field: "shortResistanceOhm",
      of: readings.shortResistanceOhm,
      unit: " Ω",
      perSi: 1,
      ...at,
    },
    { quantity: "delaySPerM", field: "oneWayDelayS", of: delay, unit: " ns", perSi: 1e9 },
  ];
  return rows.flatMap(({ quantity, field, of, unit, perSi, ...conditions }) => {
    if (of === undefined) return [];
    const text = typed?.[field] ?? `${shown(of * perSi)}${unit}`;
    const asTyped = `${text} on ${shown(lengthM)} m`;
    return [{ quantity, valueSi: of / lengthM, asTyped, kind: "measured" as const, temperatureC, ...conditions }];
  });
}

const derivedUnits = [
  { quantity: "z0Ohm", name: "z0", unit: " Ω", perSi: 1, digits: 4 },
  { quantity: "velocityFactor", name: "velocityFactor", unit: "", perSi: 1, digits: 4 },
  { quantity: "cFPerM", name: "capacitance", unit: " pF/m", perSi: 1e12, digits: 4 },
  { quantity: "lInfHPerM", name: "inductance", unit: " nH/m", perSi: 1e9, digits: 4 },
] as const;

/** What the model has and nobody stated. */
function derivedRows({ model, ruled, uncertainty }: Worked, stated: ReadonlySet<string>): Figure[] {
  if (!model || !ruled || !uncertainty) return [];
  const figures = nominalFigures(model);
  const source = `worked out from ${wayWords[ruled.impedance]}`;
  const spread: Partial<Record<string, number>> = { z0Ohm: uncertainty.z0, velocityFactor: uncertainty.velocityFactor };
  const line = derivedUnits
    .filter(({ quantity }) => !stated.has(quantity))
    .map(({ quantity, name, unit, perSi, digits }): Figure => {
      const valueSi = figures[name];
      const asTyped = `${Number((valueSi * perSi).toPrecision(digits))}${unit}`;
      const share = spread[quantity];
      const toleranceSi = share === undefined ? undefined : share * valueSi;
      return {
        quantity,
        valueSi,
        asTyped,
        kind: "derived",
        temperatureC: 20,
        source,
        ...(toleranceSi && { toleranceSi }),
      };
    });
  const r0 = loopOf(model);
  const loop: Figure[] =
    stated.has("r0OhmPerM") || !ruled.resistance
      ? []
      : [
          {
            ...{ quantity: "r0OhmPerM", valueSi: r0, asTyped: `${shown(r0 * 1e3)} Ω/km loop`, kind: "derived" },
            ...{ temperatureC: 20, source: `worked out from ${wayWords[ruled.resistance]}` },
          },
        ];
  return [...line, ...loop];
}

const wayWords = {
  construction: "the construction",
  nominal: "nominal figures",
  lossTable: "the loss table",
  readings: "meter readings",
  sweep: "a sweep of a sample",
  smoothCopper: "the loss, as smooth copper",
} as const;

const kindsHere: readonly Figure["kind"][] = ["nominal", "typical", "derived", "measured"];
const quantitiesHere = new Set<string>([
  ...nominalFields.map(({ quantity }) => quantity),
  ...["lossDbPerM", "lMeterHPerM", "rMeterOhmPerM", "delaySPerM"],
]);

/** Figures of an entry that none of the ways in makes: limits, and quantities they do not know. They stay as they are. */
export function otherFigures(figures: readonly Figure[], inputs: EntryInputs): Figure[] {
  const tableKind = inputs.lossTable?.kind;
  return figures.filter(({ quantity, kind }) => {
    if (!quantitiesHere.has(quantity)) return true;
    return quantity === "lossDbPerM" ? kind !== tableKind && !kindsHere.includes(kind) : !kindsHere.includes(kind);
  });
}

/** Every figure of the entry: what is stated, read and worked out, and what was there beside it. */
export function figuresOf(inputs: EntryInputs, worked: Worked, others: readonly Figure[] = []): Figure[] {
  const { nominal, lossTable, readings, sources } = inputs;
  const given = [
    ...(nominal ? nominalRows(nominal).map(sourced(sources?.nominal)) : []),
    ...(lossTable ? lossRows(lossTable).map(sourced(sources?.lossTable)) : []),
    ...(readings ? readingRows(readings).map(sourced(sources?.readings, "readings of a sample")) : []),
  ];
  const stated = new Set(given.filter(({ kind }) => kind === "nominal").map(({ quantity }) => quantity));
  return [...given, ...derivedRows(worked, stated), ...others];
}
