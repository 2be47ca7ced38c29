/**
 * Units of a table. Spellings are the house's (`lib/format/unit-spelling.ts`); what they are worth stands here, so that a
 * thread that reads files need not load all of mathjs. A test holds it to what the house's reader makes of the same units.
 * Pure.
 */
import { moved } from "@/lib/cables/exchange/decimal";
import { mathUnit, perCount, type QuantityKind } from "@/lib/format/unit-spelling";

/** What one of the unit is in SI; with `shift` where that is a power of ten. */
interface Si {
  factor: number;
  shift?: number;
}

const prefixes: Record<string, number> = {
  ...{ f: -15, p: -12, n: -9, u: -6, m: -3, c: -2, d: -1, "": 0, h: 2, k: 3, M: 6, G: 9 },
  ...{ milli: -3, centi: -2, kilo: 3 },
};
const decimals = ["m", "meter", "ohm", "F", "H", "s", "Hz", "V", "dB"];
/** Units that no power of ten leads to: international foot and yard, neper. */
const others: Record<string, number> = { ft: 0.3048, inch: 0.0254, yard: 0.9144, kft: 304.8, Np: 20 / Math.LN10 };
const nameOf: Record<string, string> = { meter: "m" };

/** What each kind is counted in, and per what. */
const dimensions: Partial<Record<QuantityKind, readonly [string, string?]>> = {
  length: ["m"],
  frequency: ["Hz"],
  resistance: ["ohm"],
  voltage: ["V"],
  lossPerLength: ["dB", "m"],
  capacitancePerLength: ["F", "m"],
  inductancePerLength: ["H", "m"],
  resistancePerLength: ["ohm", "m"],
  timePerLength: ["s", "m"],
};
const lengths = ["ft", "inch", "yard", "kft"];

/** One unit without a stroke, as what and how much. */
function single(unit: string): { base: string; factor: number; shift?: number } | undefined {
  const other = Object.hasOwn(others, unit) ? others[unit] : undefined;
  if (other !== undefined) return { base: lengths.includes(unit) ? "m" : "dB", factor: other };
  for (const base of decimals) {
    const prefix = unit.endsWith(base) ? unit.slice(0, -base.length) : undefined;
    if (prefix === undefined || !Object.hasOwn(prefixes, prefix)) continue;
    const shift = prefixes[prefix] ?? 0;
    return { base: nameOf[base] ?? base, factor: Number(`1e${shift}`), shift };
  }
  return undefined;
}

function lookUp(kind: QuantityKind, text: string): Si | undefined {
  const [over, under] = dimensions[kind] ?? [];
  // A unit with a figure of its own before it is none.
  if (over === undefined || text === "" || text.length > 30 || /^[\d.,]/.test(text)) return undefined;
  const [above = "", below] = mathUnit(kind, text, "").split("/");
  const [top, bottom] = [single(above.trim()), below === undefined ? undefined : single(below.trim())];
  if (top?.base !== over || bottom?.base !== under || (below === undefined) !== (under === undefined)) return undefined;
  const count = perCount(text);
  const tens = Math.log10(count);
  const factor = Number((top.factor / (bottom?.factor ?? 1) / count).toPrecision(15));
  const isDecimal = top.shift !== undefined && (!bottom || bottom.shift !== undefined) && Number.isInteger(tens);
  if (!isDecimal) return { factor };
  const shift = (top.shift ?? 0) - (bottom?.shift ?? 0) - tens;
  return { factor: Number(`1e${shift}`), shift };
}

const known = new Map<string, Si | undefined>();
const mostKnown = 10_000;

/** @returns undefined where the text is no unit of the kind */
export function siOf(kind: QuantityKind, unit: string): Si | undefined {
  const key = `${kind} ${unit}`;
  if (known.has(key)) return known.get(key);
  const si = lookUp(kind, unit);
  if (known.size < mostKnown) known.set(key, si);
  return si;
}

const celsius = /^(°|deg(rees)? ?)?c(elsius)?$/i;
const fahrenheit = /^(°|deg(rees)? ?)?f(ahrenheit)?$/i;

/** Whether a text is a unit of a kind; degrees are, though they have no factor. */
export function isUnitOf(kind: QuantityKind, unit: string): boolean {
  return kind === "temperature" ? celsius.test(unit) || fahrenheit.test(unit) : siOf(kind, unit) !== undefined;
}

/**
 * A plain number, its decimal point a point, in a unit -> SI (temperatures: °C). Powers of ten move the point, so that no
 * digit goes astray.
 */
export function inSi(kind: QuantityKind, number: string, unit: string): number {
  if (kind === "number") return moved(number, 0);
  if (kind === "temperature") {
    const value = moved(number, 0);
    if (celsius.test(unit)) return value;
    return fahrenheit.test(unit) ? Number((((value - 32) * 5) / 9).toPrecision(15)) : NaN;
  }
  const si = siOf(kind, unit);
  if (!si) return NaN;
  return si.shift === undefined ? Number((moved(number, 0) * si.factor).toPrecision(15)) : moved(number, si.shift);
}
