/**
 * A file -> its entries, row by row, each with what was understood and what is wrong. Runs in a thread of its own: it
 * gives its answer in parts of so many rows, so that whoever takes them is never held up. Pure.
 */
import { catalogueFileSchema } from "@/lib/cables/exchange/catalogue";
import { judged, type Judged } from "@/lib/cables/exchange/judge-entry";
import { decodeTable } from "@/lib/cables/exchange/csv-decode";
import { isOwnTable, readHead, type ColumnRead } from "@/lib/cables/exchange/csv-head";
import { decimalSignOf, type DecimalSign } from "@/lib/cables/exchange/csv-number";
import { ownRow, type FoundColumn } from "@/lib/cables/exchange/csv-own-row";
import { parseTable, type Table } from "@/lib/cables/exchange/csv-parse";
import { statedEntry } from "@/lib/cables/exchange/stated-entry";
import { statedRow } from "@/lib/cables/exchange/stated-row";
import { fieldErrorsOf } from "@/lib/http/parse";
import { frequency, inWords } from "@/lib/format/quantity";
import type { Family } from "@/lib/cables/schema";

export interface FileAsked {
  as: "csv" | "json";
  fileName: string;
  charset?: string;
  /** of rows that name none */
  family?: Family;
}

/** What a column was taken for, in words; null where nothing was read of it. */
export interface ColumnWords {
  head: string;
  readAs: string | null;
}

export interface FileHead {
  rowCount: number;
  columns: ColumnWords[];
  /** sentences about the whole file */
  notes: string[];
}

/** One row as it was read. */
export interface RowRead extends Judged {
  /** from 1, the head counted; of JSON the place in the list, from 1 */
  row: number;
  /** as it stood in the file */
  text: string;
}

export type FilePart = { head: FileHead } | { rows: RowRead[] };

/** What is handled in a few milliseconds. */
export const rowsPerPart = 50;

const namesOfMeaning: Record<string, string> = {
  z0: "impedance",
  velocityFactor: "velocity factor",
  coreResistance: "resistance of one core or the inner conductor",
  screenResistance: "resistance of the screen",
  loopResistance: "loop resistance",
  lossTangent: "loss tangent",
  maxFrequency: "highest frequency",
  maxVoltage: "highest voltage",
  minBend: "least bend radius",
  minTemperature: "lowest temperature",
  maxTemperature: "highest temperature",
  outerDiameter: "outer diameter",
};

function columnWords(column: ColumnRead): ColumnWords {
  const { head } = column;
  if (column.is === "unknown") return { head, readAs: null };
  if (column.is === "own")
    return { head, readAs: column.column.as === "derived" ? "worked out; not read" : column.column.head };
  const { meaning, unit, frequencyHz, isLimit } = column;
  const what = namesOfMeaning[meaning] ?? meaning;
  const at = frequencyHz === undefined ? "" : ` at ${inWords(frequency(frequencyHz))}${isLimit ? ", a maximum" : ""}`;
  const isNumber = column.kind !== undefined && column.kind !== "number";
  return { head, readAs: `${what}${at}${unit ? `, ${unit}` : isNumber ? ", each cell with its unit" : ""}` };
}

const decimalNotes: Record<DecimalSign, string[]> = {
  ",": ["Decimals are parted by a comma."],
  ".": [],
  either: [],
};
const delimiterNames: Record<string, string> = { ";": "semicolons", "\t": "tabs", "|": "upright strokes" };

interface ReadRow {
  entry: unknown;
  faults: string[];
  notes: string[];
}

/**
 * How a row of this table becomes an entry: as one of ours where our model stands in it, else as figures stated. A row
 * that somebody has added to a table of ours is one of those.
 */
function rowReader({ head, rows }: Table, asked: FileAsked) {
  const own = isOwnTable(head) ? readHead(head, true) : [];
  const found = own.flatMap((column): FoundColumn[] => (column.is === "own" ? [column] : []));
  const model = found.find(({ column }) => column.path === "model.lInfHPerM");
  const stated = readHead(head, false);
  const decimal = decimalSignOf(cellsToJudge(rows, stated));
  const read = ({ row, cells }: Table["rows"][number]): ReadRow => {
    if (model && cells[model.at]) return { ...ownRow(cells, found), notes: [] };
    const figures = statedRow(cells, stated, decimal);
    const { faults, notes, texts } = figures;
    // What cannot be read must be mended first: without it the rest would be found wanting for no reason of its own.
    if (faults.length > 0) return { entry: { designation: texts.designation }, faults, notes };
    const made = statedEntry(figures, asked.family, `${asked.fileName}, row ${row}`);
    const entry = made.entry ?? { designation: texts.designation };
    return { entry, faults: made.faults, notes: [...notes, ...made.notes] };
  };
  return { read, decimal, columns: model ? own : stated };
}

function* cellsToJudge(rows: Table["rows"], columns: readonly ColumnRead[]): Generator<string> {
  const numeric = columns.filter((column) => column.is === "foreign" && column.kind !== undefined);
  for (const { cells } of rows) for (const { at } of numeric) yield cells[at] ?? "";
}

function* csvRows(bytes: Uint8Array, asked: FileAsked): Generator<FilePart> {
  const { text, encoding } = decodeTable(bytes, asked.charset);
  const table = parseTable(text);
  const { read, decimal, columns } = rowReader(table, asked);
  if (columns.every(({ is }) => is === "unknown"))
    throw new RangeError("csvRows: No column of the first row is one that is understood; it must name them.");
  const notes = [
    ...(encoding === "UTF-8" ? [] : [`The file is in ${encoding}.`]),
    ...(table.delimiter === "," ? [] : [`Its cells are parted by ${delimiterNames[table.delimiter]}.`]),
    ...decimalNotes[decimal],
  ];
  yield { head: { rowCount: table.rows.length, columns: columns.map(columnWords), notes } };
  const judge = judged();
  yield* inParts(table.rows, (row) => {
    const { entry, faults, notes: said } = read(row);
    const raw = row.cells.map((cell) => (/[",\r\n]/.test(cell) ? `"${cell.replaceAll('"', '""')}"` : cell)).join(",");
    return { row: row.row, text: raw, ...judge(entry, faults, said) };
  });
}

function parsedJson(bytes: Uint8Array): unknown {
  try {
    return JSON.parse(new TextDecoder("utf-8", { fatal: true }).decode(bytes));
  } catch {
    throw new RangeError("jsonRows: The file is not JSON in UTF-8.");
  }
}

function* jsonRows(bytes: Uint8Array): Generator<FilePart> {
  const file = catalogueFileSchema.safeParse(parsedJson(bytes));
  if (!file.success) {
    const sentences = Object.entries(fieldErrorsOf(file.error)).map(([path, [first]]) =>
      path ? `${path}: ${first}` : first,
    );
    throw new RangeError(`jsonRows: ${sentences.join(" ")}`);
  }
  const { cables } = file.data;
  if (cables.length === 0) throw new RangeError("jsonRows: There is no entry in the file.");
  yield { head: { rowCount: cables.length, columns: [], notes: [] } };
  const judge = judged();
  let row = 0;
  yield* inParts(cables, (entry) => ({ row: ++row, text: JSON.stringify(entry), ...judge(entry, [], []) }));
}

function* inParts<Item>(items: readonly Item[], read: (item: Item) => RowRead): Generator<FilePart> {
  for (let from = 0; from < items.length; from += rowsPerPart)
    yield { rows: items.slice(from, from + rowsPerPart).map(read) };
}

/**
 * @param bytes - the file
 * @throws RangeError what is wrong with the file as a whole, a sentence
 */
export function readRows(bytes: Uint8Array, asked: FileAsked): Generator<FilePart> {
  return asked.as === "csv" ? csvRows(bytes, asked) : jsonRows(bytes);
}
