/** The figures that are typed of a cable: their names, units and bounds. One list for the form, the reader and the words. Pure. */
import type { EntryInputs } from "@/lib/cables/inputs";
import type { QuantityBounds } from "@/lib/format/bounds";
import type { QuantityKind } from "@/lib/format/unit-spelling";

export interface FigureField {
  label: string;
  /** "velocity" is a fraction, a percentage or 1/VF */
  kind: QuantityKind | "velocity";
  /** taken where a figure is typed without one */
  unit: string;
  /** SI of one of the unit, where that is a mere factor: lets a bare figure be read without the reader of units */
  perUnit?: number;
  bounds: QuantityBounds;
}

const positive = { isPositive: true } as const;
const notNegative = { isNotNegative: true } as const;
const millimetre = (label: string): FigureField => ({
  label,
  kind: "length",
  unit: "mm",
  perUnit: 1e-3,
  bounds: positive,
});
const number = (label: string, bounds: QuantityBounds): FigureField => ({
  label,
  kind: "number",
  unit: "",
  perUnit: 1,
  bounds,
});
const celsius = (label: string): FigureField => ({
  ...{ label, kind: "temperature", unit: "°C", perUnit: 1, bounds: { least: -200, most: 400 } },
});

export const figureFields = {
  conductor: millimetre("Conductor diameter"),
  insulation: millimetre("Dielectric diameter, or spacing"),
  permittivity: number("Permittivity", { least: 1 }),
  tangent: number("Loss tangent of the dielectric", { isNotNegative: true, most: 1 }),
  shield: millimetre("Shield thickness"),
  screenBore: millimetre("Bore of the screen"),
  lay: millimetre("Lay"),
  outer: millimetre("Outer diameter"),
  strandFactor: number("Strand factor", positive),
  braidFactor: number("Braid factor", positive),

  z0: { label: "Impedance", kind: "resistance", unit: "Ω", perUnit: 1, bounds: positive },
  z0Tolerance: { label: "Tolerance of impedance", kind: "resistance", unit: "Ω", perUnit: 1, bounds: notNegative },
  velocity: { label: "Velocity factor", kind: "velocity", unit: "", bounds: positive },
  velocityTolerance: number("Tolerance of velocity factor", notNegative),
  c: { label: "Capacitance", kind: "capacitancePerLength", unit: "pF/m", perUnit: 1e-12, bounds: positive },
  cTolerance: {
    label: "Tolerance of capacitance",
    kind: "capacitancePerLength",
    unit: "pF/m",
    perUnit: 1e-12,
    bounds: notNegative,
  },
  l: { label: "Inductance", kind: "inductancePerLength", unit: "nH/m", perUnit: 1e-9, bounds: positive },
  loop: { label: "Dc resistance, loop", kind: "resistancePerLength", unit: "Ω/km", perUnit: 1e-3, bounds: notNegative },
  core: {
    label: "Dc resistance, one conductor",
    kind: "resistancePerLength",
    unit: "Ω/km",
    perUnit: 1e-3,
    bounds: notNegative,
  },
  nominalTangent: number("Loss tangent", { isNotNegative: true, most: 1 }),

  tableTemperature: celsius("Temperature of the loss table"),

  sample: { label: "Length of the sample", kind: "length", unit: "m", perUnit: 1, bounds: positive },
  openC: { label: "Capacitance, far end open", kind: "capacitance", unit: "pF", perUnit: 1e-12, bounds: positive },
  shortL: { label: "Inductance, far end short", kind: "inductance", unit: "nH", perUnit: 1e-9, bounds: positive },
  shortR: { label: "Resistance, far end short", kind: "resistance", unit: "Ω", perUnit: 1, bounds: notNegative },
  delay: { label: "Delay, one way", kind: "time", unit: "ns", perUnit: 1e-9, bounds: positive },
  roundTrip: { label: "Delay, there and back", kind: "time", unit: "ns", perUnit: 1e-9, bounds: positive },
  meterHz: { label: "Frequency of the meter", kind: "frequency", unit: "kHz", perUnit: 1e3, bounds: positive },
  sampleTemperature: celsius("Temperature of the sample"),

  maxFrequency: { label: "Highest frequency", kind: "frequency", unit: "GHz", perUnit: 1e9, bounds: positive },
  maxVoltage: { label: "Highest voltage", kind: "voltage", unit: "V", perUnit: 1, bounds: positive },
  minBend: millimetre("Smallest bend radius"),
  minTemperature: celsius("Lowest temperature"),
  maxTemperature: celsius("Highest temperature"),
} as const satisfies Record<string, FigureField>;

export type FigureName = keyof typeof figureFields;
export const figureNames = Object.keys(figureFields) as FigureName[];

/** The figures of a construction by its kind. */
export const constructionFigures = {
  coax: ["conductor", "insulation", "permittivity", "tangent", "shield", "outer", "strandFactor", "braidFactor"],
  pair: ["conductor", "insulation", "permittivity", "tangent", "screenBore", "lay", "outer"],
} as const satisfies Record<string, readonly FigureName[]>;

/** Nominal figures, and the names they have among an entry's inputs. */
export const nominalInputs = {
  z0: "z0Ohm",
  z0Tolerance: "z0ToleranceOhm",
  velocity: "velocityFactor",
  velocityTolerance: "velocityFactorTolerance",
  c: "cFPerM",
  cTolerance: "cToleranceFPerM",
  l: "lInfHPerM",
  loop: "loopResistanceOhmPerM",
  core: "conductorResistanceOhmPerM",
  nominalTangent: "lossTangent",
} as const satisfies Partial<Record<FigureName, keyof NonNullable<EntryInputs["nominal"]>>>;

/** Readings of a sample, and the names they have among an entry's inputs. */
export const readingInputs = {
  sample: "lengthM",
  openC: "openCapacitanceF",
  shortL: "shortInductanceH",
  shortR: "shortResistanceOhm",
  delay: "oneWayDelayS",
  roundTrip: "roundTripS",
  meterHz: "meterHz",
  sampleTemperature: "temperatureC",
} as const satisfies Partial<Record<FigureName, keyof NonNullable<EntryInputs["readings"]>>>;

export const nominalFigures = Object.keys(nominalInputs) as (keyof typeof nominalInputs)[];
export const readingFigures = Object.keys(readingInputs) as (keyof typeof readingInputs)[];
