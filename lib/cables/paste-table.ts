/**
 * A loss table pasted from a spreadsheet or a sheet -> rows in SI, with how it was read. What cannot be told is refused
 * with a sentence: a unit is never guessed. Pure.
 */
import { type Cells, cellsOf } from "@/lib/cables/pasting/cells";
import {
  type Body,
  type Columns,
  columnsOf,
  commasOf,
  frequencyUnitOf,
  lossUnitOf,
  type Told,
} from "@/lib/cables/pasting/columns";
import { type CommaMeaning, isNumeric, numberOf, splitCell } from "@/lib/cables/pasting/numbers";
import { Refused } from "@/lib/cables/pasting/refused";
import {
  type FrequencyUnit,
  frequencyUnits,
  frequencyUnitsIn,
  type LossUnit,
  lossUnits,
  lossUnitsIn,
} from "@/lib/cables/pasting/units";

export interface PastedRow {
  frequencyHz: number;
  lossDbPerM: number;
  /** as it stood, with its units */
  typed: string;
}

export interface PastedTable {
  /** ascending in frequency */
  rows: PastedRow[];
  /** "9 rows read as frequency in MHz, loss in dB/100 ft, decimal commas." */
  readAs: string;
  /** of the rows; null where each had its own */
  lossUnit: LossUnit | null;
}

export type PasteRead =
  | { ok: true; table: PastedTable }
  /** `asks` says which unit would settle it */
  | { ok: false; message: string; asks?: "frequencyUnit" | "lossUnit" };

const mostRows = 500;
const mostLetters = 100_000;
/** No row of a table is so long; what is would only take time. */
const longestLine = 2000;

/** Reads a paste. */
export function readPastedTable(text: string, told: Told = {}): PasteRead {
  try {
    return { ok: true, table: tableOf(text, told) };
  } catch (error) {
    if (!(error instanceof Refused)) throw error;
    return { ok: false, message: error.message, ...(error.asks && { asks: error.asks }) };
  }
}

function tableOf(text: string, told: Told): PastedTable {
  if (text.length > mostLetters) throw new Refused("That is more than a loss table: paste at most 500 rows.");
  if (text.split("\n").some((line) => line.length > longestLine))
    throw new Refused("A line of that is too long for a row of a table.");
  const { rows: all, separator } = upright(cellsOf(text));
  const start = all.findIndex(({ cells }) => cells.filter(isNumeric).length >= 2);
  if (start < 0) throw new Refused("No row with a frequency and a loss was found: paste two columns of figures.");
  const head = all.slice(0, start).map(({ cells }) => cells);
  const body = all.slice(start);
  if (body.length > mostRows) throw new Refused(`That is ${body.length} rows; a loss table has at most ${mostRows}.`);
  const columns = columnsOf(head, body);
  const commas = commasOf(body, columns, separator);
  const units = { frequency: frequencyUnitOf(head, body, columns, told), loss: lossUnitOf(head, body, columns, told) };
  const { rows, skipped } = rowsOf(body, columns, commas, units);
  if (rows.length === 0) throw new Refused("No row has both a frequency and a loss.");
  return { rows: inOrder(rows), readAs: readAsWords(rows, skipped, units, commas === "decimal"), lossUnit: units.loss };
}

/** A table that runs across, one line of frequencies and one of losses, set upright. */
function upright(cells: Cells): Cells {
  const [first, second] = cells.rows.filter(({ cells: row }) => row.filter(isNumeric).length >= 3);
  const hasLabel = (row: { cells: string[] }) => !isNumeric(row.cells[0] ?? "");
  const isAlone = cells.rows.filter(({ cells: row }) => row.filter(isNumeric).length >= 2).length === 2;
  const isAcross = isAlone && first && second && hasLabel(first) && hasLabel(second);
  if (!isAcross) return cells;
  const width = Math.max(first.cells.length, second.cells.length);
  const rows = Array.from({ length: width }, (_, i) => ({
    line: first.line,
    cells: [first.cells[i] ?? "", second.cells[i] ?? ""],
  }));
  return { ...cells, rows };
}

interface Units {
  frequency: FrequencyUnit | null;
  loss: LossUnit | null;
}

const isLeftBlank = (cell: string) => /^([-–—*]|n\/?a|)$/i.test(cell.trim());

function rowsOf(body: Body, columns: Columns, commas: CommaMeaning, units: Units) {
  const rows: PastedRow[] = [];
  let skipped = 0;
  for (const { line, cells } of body) {
    const [frequency, loss] = [cells[columns.frequency] ?? "", cells[columns.loss] ?? ""];
    if (isLeftBlank(frequency) || isLeftBlank(loss)) {
      skipped++;
      continue;
    }
    rows.push(rowOf(line, frequency, loss, commas, units));
  }
  return { rows, skipped };
}

function rowOf(line: number, frequencyCell: string, lossCell: string, commas: CommaMeaning, units: Units): PastedRow {
  const read = (cell: string) => {
    const value = numberOf(splitCell(cell)?.number ?? "", commas);
    if (!(value > 0 && value < Infinity))
      throw new Refused(`Line ${line}: “${cell.slice(0, 40)}” is not a figure above 0.`);
    return value;
  };
  const [frequency, loss] = [read(frequencyCell), read(lossCell)];
  const frequencyUnit = frequencyUnitsIn(frequencyCell)[0] ?? units.frequency;
  const lossUnit = lossUnitsIn(lossCell)[0] ?? units.loss;
  if (!frequencyUnit || !lossUnit)
    throw new Refused(`Line ${line} lacks a unit.`, frequencyUnit ? "lossUnit" : "frequencyUnit");
  const exact = (value: number) => Number(value.toPrecision(12));
  const [frequencyHz, lossDbPerM] = [
    exact(frequency * frequencyUnits[frequencyUnit]),
    exact(loss * lossUnits[lossUnit]),
  ];
  if (!(frequencyHz < Infinity && lossDbPerM > 0 && lossDbPerM < Infinity))
    throw new Refused(`Line ${line}: a figure is too large or too small to work with.`);
  return { frequencyHz, lossDbPerM, typed: `${loss} ${lossUnit} at ${frequency} ${frequencyUnit}` };
}

/** Ascending, each frequency once. */
function inOrder(rows: readonly PastedRow[]): PastedRow[] {
  const ordered = [...rows].sort((a, b) => a.frequencyHz - b.frequencyHz);
  return ordered.filter((row, i) => {
    const before = ordered[i - 1];
    if (before?.frequencyHz !== row.frequencyHz) return true;
    if (before.lossDbPerM === row.lossDbPerM) return false;
    throw new Refused(`Two rows of one frequency differ: ${before.typed}, and ${row.typed}.`);
  });
}

function readAsWords(rows: readonly PastedRow[], skipped: number, units: Units, hasDecimalCommas: boolean): string {
  const count = `${rows.length} ${rows.length === 1 ? "row" : "rows"}`;
  const parts = [
    units.frequency ? `frequency in ${units.frequency}` : "frequency in the unit of each row",
    units.loss ? `loss in ${units.loss}` : "loss in the unit of each row",
    hasDecimalCommas && "decimal commas",
    skipped > 0 && `${skipped} without a figure left out`,
  ];
  return `${count} read as ${parts.filter(Boolean).join(", ")}.`;
}
