/** One cell of a foreign table -> a number in SI, with what was understood. Pure. */
import { inSi, isUnitOf, siOf } from "@/lib/cables/exchange/unit";
import { readVelocityFactor } from "@/lib/format/read-velocity-factor";
import type { QuantityKind } from "@/lib/format/unit-spelling";

export type DecimalSign = "." | "," | "either";

export type CellRead =
  | { ok: true; valueSi: number; toleranceSi?: number; asTyped: string; isOtherUnit: boolean; unit: string }
  | { ok: false; fault: string };

const surelyComma = /^[+-]?(?:0,\d+|\d+,(?:\d{1,2}|\d{4,}))(?!\d|,)/;
const surelyPoint = /^[+-]?(?:0?\.\d+|0\.\d+|\d+\.(?:\d{1,2}|\d{4,}))(?!\d|\.)/;

/** Which sign parts the decimals of a file, from its cells; "either" where both are there or none tells. */
export function decimalSignOf(cells: Iterable<string>): DecimalSign {
  let [hasComma, hasPoint] = [false, false];
  for (const cell of cells) {
    const text = cell.trim();
    hasComma ||= surelyComma.test(text);
    hasPoint ||= surelyPoint.test(text);
    if (hasComma && hasPoint) return "either";
  }
  return hasComma ? "," : hasPoint ? "." : "either";
}

/** Thousands parted in threes and one decimal sign, as a number with a point; null where it could be two numbers. */
export function plainNumber(text: string, decimal: DecimalSign): string | null | undefined {
  const bare = text.replace(/(?<=\d)[ \u00a0\u202f'’](?=\d{3}(?!\d))/g, "").replace(/\u2212/g, "-");
  if (/^[+-]?\d{1,3}(,\d{3})+\.\d+$/.test(bare)) return bare.replaceAll(",", "");
  if (/^[+-]?\d{1,3}(\.\d{3})+,\d+$/.test(bare)) return bare.replaceAll(".", "").replace(",", ".");
  if (/^[+-]?[1-9]\d{0,2},\d{3}$/.test(bare)) return decimal === "," ? bare.replace(",", ".") : null;
  if (/^[+-]?[1-9]\d{0,2}\.\d{3}$/.test(bare) && decimal === ",") return null;
  const number = bare.replace(",", ".");
  return /^[+-]?(\d+\.?\d*|\.\d+)(e[+-]?\d+)?$/i.test(number) ? number : undefined;
}

const cellPattern =
  /^([+\-\u2212]?[\d.,][\d.,' \u00a0\u202f’]*(?:e[+-]?\d+)?)\s*(?:(?:±|\+\/-|\+-)\s*([\d.,]+)\s*(%)?)?\s*(.*)$/is;

const quotedCell = (cell: string) => `“${cell.length > 40 ? `${cell.slice(0, 40)}…` : cell}”`;

/**
 * @param head - the column's, for the sentence
 * @param unit - of the column; undefined where the head has none and none is usual
 */
export function readCell(
  kind: QuantityKind,
  cell: string,
  head: string,
  unit: string | undefined,
  decimal: DecimalSign,
): CellRead {
  const found = cellPattern.exec(cell.trim());
  const refuse = (what: string): CellRead => ({ ok: false, fault: `“${head}”: ${what}` });
  if (!found) return refuse(`${quotedCell(cell)} is not a number.`);
  const [, figure = "", plusMinus, percent, behind = ""] = found;
  const number = plainNumber(figure.trim(), decimal);
  if (number === null)
    return refuse(`is ${quotedCell(figure.trim())} a thousand or a decimal? Nothing in the file tells.`);
  if (number === undefined) return refuse(`${quotedCell(cell)} is not a number.`);
  const own = behind.trim();
  if (own !== "" && !isUnitOf(kind, own)) return refuse(`${quotedCell(own)} is not a unit for it.`);
  const used = own === "" ? (kind === "number" ? "" : unit) : own;
  if (used === undefined) return refuse(`neither the head nor ${quotedCell(cell)} says in which unit.`);
  const valueSi = inSi(kind, number, used);
  if (!Number.isFinite(valueSi)) return refuse(`${quotedCell(cell)} is too large to work with.`);
  const spread = plusMinus === undefined ? undefined : plainNumber(plusMinus, decimal);
  const toleranceSi = !spread
    ? undefined
    : percent
      ? (Math.abs(valueSi) * Number(spread)) / 100
      : inSi(kind, spread, used);
  const asTyped = own === "" && used !== "" ? `${cell.trim()} ${used}` : cell.trim();
  const isOtherUnit = own !== "" && unit !== undefined && siOf(kind, own)?.factor !== siOf(kind, unit)?.factor;
  return { ok: true, valueSi, ...(toleranceSi !== undefined && { toleranceSi }), asTyped, isOtherUnit, unit: used };
}

/** A velocity factor: a fraction, per cent or 1/VF. */
export function readVelocityCell(cell: string, head: string, unit: string | undefined): CellRead {
  const text = cell.trim();
  const asTyped = unit && !text.includes("%") ? `${text} ${unit}` : text;
  const read = readVelocityFactor(unit && /^(%|per ?cent)$/i.test(unit) && !/[%c]/i.test(text) ? `${text} %` : text);
  if (!read.ok) return { ok: false, fault: `“${head}”: ${read.message}` };
  return { ok: true, valueSi: read.value, asTyped, isOtherUnit: false, unit: unit ?? "" };
}
