/** The text of a CSV file -> its rows, within bounds. Pure. */
import Papa from "papaparse";
import { mostEntries } from "@/lib/cables/exchange/catalogue";

export interface Table {
  head: string[];
  /** with its number in the file, from 1, the head counted; empty rows are left out */
  rows: { row: number; cells: string[] }[];
  delimiter: string;
}

const mostColumns = 300;
const mostCellCharacters = 200_000;
const delimiters = [";", "\t", ",", "|"];

const refusal = (sentence: string) => new RangeError(`parseTable: ${sentence}`);
const isEmpty = (cells: readonly string[]) => cells.every((cell) => cell.trim() === "");

/** What parts the cells: the sign that parts the head into most. A decimal comma further down has no say in it. */
function delimiterOf(text: string): string {
  const head = /^\s*([^\r\n]*)/.exec(text)?.[1]?.replace(/"[^"]*"/g, "") ?? "";
  const counts = delimiters.map((sign) => ({ sign, count: head.split(sign).length }));
  return counts.reduce((most, each) => (each.count > most.count ? each : most)).sign;
}

function checkRow(row: number, cells: readonly string[]): void {
  if (cells.length > mostColumns)
    throw refusal(`Row ${row} has ${cells.length} columns; a table has at most ${mostColumns}.`);
  if (cells.some((cell) => cell.length > mostCellCharacters))
    throw refusal(`A cell of row ${row} has more than ${mostCellCharacters.toLocaleString("en")} characters.`);
}

/**
 * @throws RangeError a sentence: too many rows or columns, a quotation mark that is never closed, nothing in the file
 */
export function parseTable(text: string): Table {
  const rows: Table["rows"] = [];
  const delimiter = delimiterOf(text);
  let row = 0;
  let refused: RangeError | undefined;
  Papa.parse<string[]>(text, {
    delimiter,
    step: ({ data, errors }, parser) => {
      row++;
      try {
        const quotes = errors.find(({ type }) => type === "Quotes");
        if (quotes) throw refusal(`Row ${row} has a quotation mark that is never closed, or stands inside a cell.`);
        checkRow(row, data);
        if (isEmpty(data)) return;
        if (rows.length > mostEntries)
          throw refusal(
            `The file has more than ${mostEntries.toLocaleString("en")} rows, which is the most one import brings in; part it.`,
          );
        rows.push({ row, cells: data });
      } catch (error) {
        refused = error as RangeError;
        parser.abort();
      }
    },
  });
  if (refused) throw refused;
  const [head, ...rest] = rows;
  if (!head) throw refusal("The file is empty.");
  if (rest.length === 0) throw refusal("The file has a head and no rows under it.");
  return { head: head.cells, rows: rest, delimiter };
}
