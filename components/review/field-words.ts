/** What the fields of a revision are called, and how their values are shown. */
import { figureValue, quantityName } from "@/components/cables/figure-words";
import { familyWords } from "@/components/cables/words";
import type { Family } from "@/lib/cables/schema";
import {
  digits,
  frequency,
  inWords,
  notComputed,
  significantDigits,
  withoutTrailingZeros,
} from "@/lib/format/quantity";
import type { Difference } from "@/lib/cables/revisions/differences";

interface Named {
  name: string;
  unit: string;
  /** the field's own unit times this is the unit shown */
  factor?: number;
  show?: (value: number) => string;
}

/** What somebody gave, without zeros that they did not give. */
const asGiven = (value: number) => withoutTrailingZeros(significantDigits(value, 4));

const mm = (name: string): Named => ({ name, unit: "mm", show: asGiven });

const known: Record<string, Named> = {
  "entry.name": { name: "Name", unit: "" },
  "entry.family": { name: "Family", unit: "" },
  "construction.kind": { name: "Kind", unit: "" },
  "construction.innerMm": mm("Inner conductor"),
  "construction.dielectricMm": mm("Dielectric diameter"),
  "construction.relativePermittivity": { name: "Dielectric constant", unit: "" },
  "construction.effectivePermittivity": { name: "Dielectric constant", unit: "" },
  "construction.lossTangent": { name: "Loss tangent", unit: "", show: (value) => significantDigits(value, 2) },
  "construction.conductorResistivityOhmM": { name: "Resistivity", unit: "nΩm", factor: 1e9 },
  "construction.strandFactor": { name: "Strand factor", unit: "" },
  "construction.braidFactor": { name: "Braid factor", unit: "" },
  "construction.shieldThicknessMm": mm("Shield thickness"),
  "construction.outerDiameterMm": mm("Outer diameter"),
  "construction.wireMm": mm("Wire"),
  "construction.spacingMm": mm("Spacing of the wires"),
  "construction.layMm": mm("Lay"),
  "construction.screen": { name: "Screen", unit: "" },
  "build.conductor": { name: "Inner conductor, in words", unit: "" },
  "build.isStranded": { name: "Stranded", unit: "" },
  "build.dielectric": { name: "Kind of dielectric", unit: "" },
  "build.dielectricName": { name: "Dielectric, in words", unit: "" },
  "build.screen": { name: "Screen layers", unit: "" },
  "build.screenName": { name: "Screen, in words", unit: "" },
  "build.jacket": { name: "Jacket", unit: "" },
  "build.pairCount": { name: "Pairs", unit: "", show: asGiven },
  "limits.maxFrequencyHz": { name: "Highest frequency", unit: "MHz", factor: 1e-6, show: asGiven },
  "limits.maxVoltageV": { name: "Highest voltage", unit: "V", show: asGiven },
  "limits.minBendMm": { name: "Least bend radius", unit: "mm", show: asGiven },
  "limits.minTemperatureC": { name: "Lowest temperature", unit: "°C", show: asGiven },
  "limits.maxTemperatureC": { name: "Highest temperature", unit: "°C", show: asGiven },
  "model.lInfHPerM": { name: "Model: inductance", unit: "nH/m", factor: 1e9 },
  "model.cFPerM": { name: "Model: capacitance", unit: "pF/m", factor: 1e12 },
  "model.lossTangent": { name: "Model: loss tangent", unit: "", show: (value) => significantDigits(value, 2) },
  "model.g0SPerM": { name: "Model: leakage", unit: "S/m" },
  "model.temperatureCoefficientPerK": { name: "Model: over temperature", unit: "per K" },
  "model.conductors": { name: "Model: conductors", unit: "" },
  "model.lossSlopes": { name: "Model: loss over temperature", unit: "" },
  "derived.z0Ohm": { name: "Impedance", unit: "Ω", show: (value) => digits(value, 1) },
  "derived.velocityFactor": { name: "Velocity factor", unit: "", show: (value) => digits(value, 3) },
  "derived.capacitanceFPerM": { name: "Capacitance", unit: "pF/m", factor: 1e12, show: (value) => digits(value, 1) },
  "derived.loopResistanceOhmPerM": { name: "Loop resistance, dc", unit: "mΩ/m", factor: 1e3 },
  "derived.lossDbPer100m": { name: "Loss", unit: "dB/100 m", show: (value) => digits(value, 2) },
};

export interface FieldWords {
  name: string;
  before: string;
  after: string;
  unit: string;
}

const quantityOf = (field: string) => field.split(".")[1] ?? field;

/** A model's conductors in words: "sqrt 2.15 mΩ/m, corner 12.99 kHz". */
function conductorWords(text: string): string {
  const terms = JSON.parse(text) as { form: string; r0OhmPerM: number; skinCornerRadPerS?: number }[];
  return terms
    .map(({ form, r0OhmPerM, skinCornerRadPerS: corner }) => {
      const resistance = `${form} ${significantDigits(r0OhmPerM * 1000, 4)} mΩ/m`;
      return corner === undefined
        ? resistance
        : `${resistance}, corner ${significantDigits(corner / (2000 * Math.PI), 4)} kHz`;
    })
    .join("; ");
}

/** A text, a choice or a list of an entry as it is said. */
function textWords(field: string, text: string): string {
  switch (field) {
    case "model.conductors":
      return conductorWords(text);
    case "entry.family":
      return Object.hasOwn(familyWords, text) ? familyWords[text as Family] : text;
    case "construction.kind":
      return text === "coax" ? "Coaxial" : "Pair";
    case "construction.screen":
      return `${asGiven((JSON.parse(text) as { innerMm: number }).innerMm)} mm inside`;
    case "build.isStranded":
      return text === "true" ? "yes" : "no";
    case "build.screen":
      return (JSON.parse(text) as string[]).join(" and ") || "none";
    default:
      return text;
  }
}

/** Figures are set in figures, words in words. */
export const valueClass = (value: Difference["before"]) => (typeof value === "string" ? "" : "figures");

function shown(field: string, value: Difference["before"], named: Named | undefined): string {
  if (value === null) return notComputed;
  if (typeof value === "string") return textWords(field, value);
  const scaledValue = value * (named?.factor ?? 1);
  return named?.show?.(scaledValue) ?? significantDigits(scaledValue, 4);
}

/** The words of a figure: its quantity and kind, and where it holds. */
function figureWords({ field, before, after, atHz }: Difference): FieldWords {
  const quantity = quantityOf(field);
  const kind = field.split(".")[2] ?? "";
  const value = (si: Difference["before"]) => (typeof si === "number" ? figureValue(quantity, si).digits : notComputed);
  const at = atHz === null ? "" : ` at ${inWords(frequency(atHz))}`;
  const name = `${quantityName(quantity)}${at}${kind === "nominal" || kind === "" ? "" : `, ${kind}`}`;
  return { name, before: value(before), after: value(after), unit: figureValue(quantity, 1).unit };
}

/** What a field is called, and its two values in one unit. */
export function fieldWords(difference: Difference, lossAtHz: number): FieldWords {
  const { field, before, after } = difference;
  if (field.startsWith("figure.")) return figureWords(difference);
  const named = Object.hasOwn(known, field) ? known[field] : undefined;
  const at = field === "derived.lossDbPer100m" ? ` at ${inWords(frequency(lossAtHz))}` : "";
  return {
    name: `${named?.name ?? field}${at}`,
    before: shown(field, before, named),
    after: shown(field, after, named),
    unit: named?.unit ?? "",
  };
}
