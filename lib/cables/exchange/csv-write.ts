/** Entries -> rows of our own CSV (RFC 4180: commas, CRLF, quotation marks doubled). Pure. */
import type { CatalogueEntry } from "@/lib/cables/exchange/catalogue";
import { listText, ownColumns, type OwnColumn } from "@/lib/cables/exchange/csv-columns";
import { shiftedText } from "@/lib/cables/exchange/decimal";
import { guarded } from "@/lib/cables/exchange/formula-guard";
import { derivedFigures } from "@/lib/cables/model";

/** Tells spreadsheets that the file is UTF-8. */
export const byteOrderMark = "\ufeff";

function quoted(cell: string): string {
  return /[",;\r\n\t]|^\s|\s$/.test(cell) ? `"${cell.replaceAll('"', '""')}"` : cell;
}

function at(value: unknown, keys: readonly string[]): unknown {
  let inner = value;
  for (const key of keys) {
    if (typeof inner !== "object" || inner === null) return undefined;
    inner = (inner as Record<string, unknown>)[key];
  }
  return inner;
}

const digitsOfDerived = 5;

function cellText(column: OwnColumn, value: unknown): string {
  if (value === undefined || value === null) return "";
  switch (column.as) {
    case "number":
      return shiftedText(value as number, column.shift);
    case "derived":
      return shiftedText(Number((value as number).toPrecision(digitsOfDerived)), column.shift);
    case "flag":
      return value === true ? "yes" : "no";
    case "json":
      return Array.isArray(value) && value.length === 0 ? "" : guarded(JSON.stringify(value));
    case "list":
      return guarded(listText(value as string[]));
    case "words":
      return (value as string[]).join(" ");
    case "text":
      return guarded(value as string);
  }
}

const cells = ownColumns.map((column) => ({ column, keys: column.path.split(".") }));

/** The first line. */
export function csvHead(): string {
  return `${ownColumns.map(({ head }) => quoted(head)).join(",")}\r\n`;
}

/** One entry as a line; `entry` as `entryInOrder` gives it. */
export function csvRow(entry: CatalogueEntry): string {
  const derived = derivedFigures(entry.model, entry.construction, entry.limits);
  const whole = { ...entry, derived };
  return `${cells.map(({ column, keys }) => quoted(cellText(column, at(whole, keys)))).join(",")}\r\n`;
}
