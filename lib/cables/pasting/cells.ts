/** A pasted text as cells. Pure. */
import { isNumeric } from "@/lib/cables/pasting/numbers";

export interface Cells {
  rows: { line: number; cells: string[] }[];
  /** "tabs", "semicolons" …, for saying how it was read */
  separator: string;
}

interface Line {
  line: number;
  text: string;
}

const trimmedCells = (text: string, by: RegExp) =>
  text.split(by).map((cell) =>
    cell
      .trim()
      .replace(/^"(.*)"$/, "$1")
      .trim(),
  );

/** Numbers of a line that stand apart by spaces: how many there are, units after them not counted. */
function spacedNumbers(text: string): number {
  return text.split(/\s+/).filter((part) => /^[+\-\u2212]?[\d.,]*\d[\d.,]*(e[+-]?\d+)?$/i.test(part)).length;
}

/** Where spaces separate, a unit belongs to the number before it and words of a head belong together. */
function spacedCells(text: string): string[] {
  const wide = text.split(/\s{2,}/).map((cell) => cell.trim());
  if (wide.length > 1) return wide;
  if (spacedNumbers(text) < 1) return trimmedCells(text, /\s+(?=(?:dB|Np|loss|att)\b)/i);
  const cells: string[] = [];
  for (const part of text.split(/\s+/)) {
    if (isNumeric(part) || cells.length === 0 || part === "-" || part === "–") cells.push(part);
    else cells[cells.length - 1] = `${cells.at(-1)} ${part}`;
  }
  return cells;
}

/** The lines of a paste cut into cells: by tabs, bars, semicolons, spaces or commas, whichever it is made of. */
export function cellsOf(text: string): Cells {
  const lines: Line[] = text
    .split(/\r\n?|\n/)
    .map((each, i) => ({ line: i + 1, text: each.replace(/^\s*\|/, "").replace(/\|\s*$/, "") }))
    .filter(({ text: each }) => each.trim() !== "" && !/^[\s|:=_-]+$/.test(each));
  const cut = (separator: string, of: (line: string) => string[]): Cells => ({
    separator,
    rows: lines.map(({ line, text: each }) => ({ line, cells: of(each) })),
  });
  const data = lines.filter(({ text: each }) => /\d/.test(each));
  const has = (character: string) => data.some(({ text: each }) => each.includes(character));
  if (has("\t")) return cut("tabs", (each) => trimmedCells(each, /\t/));
  if (has("|")) return cut("bars", (each) => trimmedCells(each, /\|/));
  if (has(";")) return cut("semicolons", (each) => trimmedCells(each, /;/));
  const isSpaced = data.some(({ text: each }) => spacedNumbers(each) >= 2 && !/,\s/.test(each));
  if (!isSpaced && has(",")) return cut("commas", (each) => trimmedCells(each, /,/));
  return cut("spaces", (each) => spacedCells(each.trim()));
}
