/** Units of a table, looked up once each: the house's reader of quantities knows their spellings. Pure; loads mathjs. */
import { moved } from "@/lib/cables/exchange/decimal";
import { readQuantity } from "@/lib/format/read-quantity";
import type { QuantityKind } from "@/lib/format/unit-spelling";

/** What one of the unit is in SI; with `shift` where that is a power of ten. */
interface Si {
  factor: number;
  shift?: number;
}

const known = new Map<string, Si | undefined>();
const mostKnown = 10_000;

function lookUp(kind: QuantityKind, unit: string): Si | undefined {
  // Degrees have no factor; a unit with a figure of its own in it is no unit.
  if (unit.length > 30 || /^[\d.,]/.test(unit)) return undefined;
  const one = readQuantity(kind, `1 ${unit}`);
  if (!one.ok || !(one.value > 0)) return undefined;
  const shift = Math.round(Math.log10(one.value));
  return { factor: one.value, ...(Number(`1e${shift}`) === one.value && { shift }) };
}

/** @returns undefined where the text is no unit of the kind */
export function siOf(kind: QuantityKind, unit: string): Si | undefined {
  const key = `${kind} ${unit}`;
  if (!known.has(key) && known.size < mostKnown) known.set(key, lookUp(kind, unit));
  return known.get(key);
}

/** A plain number, its decimal point a point, in a unit -> SI. Powers of ten move the point, so no digit goes astray. */
export function inSi(kind: QuantityKind, number: string, unit: string): number {
  if (kind === "temperature") {
    const read = readQuantity(kind, `${number} ${unit}`);
    return read.ok ? read.value : NaN;
  }
  if (kind === "number" && unit === "") return moved(number, 0);
  const si = siOf(kind, unit);
  if (!si) return NaN;
  return si.shift === undefined ? Number((moved(number, 0) * si.factor).toPrecision(15)) : moved(number, si.shift);
}
