/** A row of our own CSV -> the entry it was written from, before its schema has looked at it. Pure. */
import { ownColumns, readList, type OwnColumn } from "@/lib/cables/exchange/csv-columns";
import { moved } from "@/lib/cables/exchange/decimal";
import { unguarded } from "@/lib/cables/exchange/formula-guard";

/** A column of ours found in a file. */
export interface FoundColumn {
  column: OwnColumn;
  /** place in the row, from 0 */
  at: number;
}

const byHead = new Map(ownColumns.map((column) => [column.head.toLowerCase(), column]));

/** The column of ours that a head names. */
export function ownColumn(head: string): OwnColumn | undefined {
  return byHead.get(head.trim().toLowerCase());
}

type Fields = Record<string, unknown>;

function put(into: Fields, keys: readonly string[], value: unknown): void {
  let inner = into;
  for (const key of keys.slice(0, -1)) inner = (inner[key] ??= {}) as Fields;
  const last = keys.at(-1);
  if (last !== undefined) inner[last] = value;
}

const flags: Record<string, boolean> = { yes: true, no: false, true: true, false: false, "1": true, "0": false };

/** What a cell says; a sentence where it cannot be read. */
function cellValue(column: OwnColumn, cell: string): { value: unknown } | { fault: string } {
  switch (column.as) {
    case "number": {
      const value = moved(cell.trim(), -column.shift);
      return Number.isFinite(value)
        ? { value }
        : { fault: `“${column.head}”: “${cell.slice(0, 40)}” is not a number.` };
    }
    case "flag": {
      const value = flags[cell.trim().toLowerCase()];
      return value === undefined ? { fault: `“${column.head}”: say yes or no.` } : { value };
    }
    case "json":
      try {
        return { value: JSON.parse(unguarded(cell)) };
      } catch {
        return { fault: `“${column.head}” is not whole: it holds JSON, and something has cut or changed it.` };
      }
    case "list":
      return { value: readList(unguarded(cell)) };
    case "words":
      return { value: cell.trim().split(/\s+/) };
    default:
      return { value: unguarded(cell) };
  }
}

/** What must be there as a whole where its mark is: lists and texts that a table leaves empty. */
function completed({ model, build, standing, ...entry }: Fields): Fields {
  const { conductors, ...line } = (model ?? {}) as Fields & { conductors?: Fields };
  const filled = { conductor: "", dielectricName: "", screenName: "", screen: [], jacket: null };
  return {
    ...entry,
    ...(model !== undefined && { model: { ...line, conductors: Object.values(conductors ?? {}) } }),
    ...(build !== undefined && { build: { ...filled, ...build } }),
    ...(standing !== undefined && { standing: { successor: null, ...standing } }),
  };
}

/**
 * @param row - cells as they stand in the file
 * @param found - the columns of ours in it
 */
export function ownRow(row: readonly string[], found: readonly FoundColumn[]): { entry: Fields; faults: string[] } {
  const entry: Fields = {};
  const faults: string[] = [];
  for (const { column, at } of found) {
    const cell = row[at] ?? "";
    if (cell === "" || column.as === "derived") continue;
    const read = cellValue(column, cell);
    if ("fault" in read) faults.push(read.fault);
    else put(entry, column.path.split("."), read.value);
  }
  return { entry: completed(entry), faults };
}
