/** A row of a foreign table -> what it states of a cable, each figure with how it was typed. Pure. */
import type { ColumnRead } from "@/lib/cables/exchange/csv-head";
import { readCell, readVelocityCell, type CellRead, type DecimalSign } from "@/lib/cables/exchange/csv-number";
import { readsAsFormula, unguarded } from "@/lib/cables/exchange/formula-guard";
import type { Meaning } from "@/lib/cables/exchange/head-names";
import { readList } from "@/lib/cables/exchange/csv-columns";
import type { Family } from "@/lib/cables/schema";

export interface StatedFigure {
  valueSi: number;
  toleranceSi?: number;
  asTyped: string;
}

export interface StatedLoss extends StatedFigure {
  frequencyHz: number;
  isLimit: boolean;
}

export interface StatedRow {
  texts: { designation: string; aliases: string[]; name: string; source: string | undefined };
  family: Family | undefined;
  figures: Partial<Record<Meaning, StatedFigure>>;
  losses: StatedLoss[];
  faults: string[];
  notes: string[];
}

const families: [RegExp, Family][] = [
  [/^(coax(ial)?s?|coaxial cable)$/i, "coaxial"],
  [/^twin ?ax(ial)?$/i, "twinaxial"],
  [/^(twisted ?pairs?|pairs?|twistedPair|symmetrical|balanced|u\/?utp|f\/?utp|s\/?ftp)$/i, "twistedPair"],
];

type Foreign = Extract<ColumnRead, { is: "foreign" }>;
const isText = (meaning: Meaning) => ["designation", "aliases", "name", "family", "source"].includes(meaning);

/** Numbers that stand for nothing given. */
const isBlank = (cell: string) => /^\s*(-|–|—|n\/?a|none|\?|unknown|tbd)?\s*$/i.test(cell);

function putText({ texts, faults, ...row }: StatedRow, column: Foreign, cell: string): Family | undefined {
  if (readsAsFormula(cell)) {
    faults.push(
      `“${column.head}”: “${cell.slice(0, 40)}” reads as a formula; put an apostrophe before it if it is a name.`,
    );
    return row.family;
  }
  const text = unguarded(cell);
  if (column.meaning === "aliases") texts.aliases = readList(text);
  else if (column.meaning === "family") {
    const family = families.find(([pattern]) => pattern.test(text.trim()))?.[1];
    if (!family)
      faults.push(`“${column.head}”: “${text.slice(0, 40)}” is no family; say coaxial, twisted pair or twinaxial.`);
    return family;
  } else if (column.meaning === "designation" || column.meaning === "name" || column.meaning === "source")
    texts[column.meaning] = text;
  return row.family;
}

function numberOf({ meaning, kind, head, unit }: Foreign, cell: string, decimal: DecimalSign): CellRead {
  if (meaning === "velocityFactor") return readVelocityCell(cell, head, unit);
  return readCell(kind ?? "number", cell, head, unit, decimal);
}

/** @param decimal - what parts the decimals of the file */
export function statedRow(cells: readonly string[], columns: readonly ColumnRead[], decimal: DecimalSign): StatedRow {
  const row: StatedRow = {
    texts: { designation: "", aliases: [], name: "", source: undefined },
    family: undefined,
    figures: {},
    losses: [],
    faults: [],
    notes: [],
  };
  for (const column of columns) {
    const cell = cells[column.at] ?? "";
    if (column.is !== "foreign" || cell.trim() === "") continue;
    if (isText(column.meaning)) row.family = putText(row, column, cell);
    else if (!isBlank(cell)) putNumber(row, column, numberOf(column, cell, decimal));
  }
  return row;
}

function putNumber(row: StatedRow, column: Foreign, read: CellRead): void {
  if (!read.ok) {
    row.faults.push(read.fault);
    return;
  }
  const { valueSi, toleranceSi, asTyped, isOtherUnit, unit } = read;
  if (isOtherUnit) row.notes.push(`“${column.head}”: read in ${unit}, not in the unit of the head.`);
  const figure = { valueSi, ...(toleranceSi !== undefined && { toleranceSi }), asTyped };
  const { meaning, frequencyHz, isLimit = false } = column;
  if (meaning === "loss" && frequencyHz !== undefined) row.losses.push({ ...figure, frequencyHz, isLimit });
  else if (row.figures[meaning]) row.notes.push(`“${column.head}” stands there twice; the first is taken.`);
  else row.figures[meaning] = figure;
}
