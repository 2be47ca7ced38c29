/**
 * Text that a spreadsheet would run. On the way out such a text gets an apostrophe before it; on the way in that one
 * apostrophe is taken off again, so that nothing is lost. A text that starts with apostrophes followed by a formula is
 * guarded too: then there is always exactly one to take off. Pure.
 */

// Blanks before the sign do not stop every spreadsheet; full-width signs are taken for the plain ones by some.
const formula = /^(?:[\s\u00a0\ufeff]*[=+\-@\uff1d\uff0b\uff0d\uff20]|[\t\r\n])/;
const plainNumber = /^\s*[+-]?(?:\d+(?:[.,]\d*)?|[.,]\d+)(?:e[+-]?\d+)?\s*$/i;

/** Whether a spreadsheet may take a text for a formula; a plain number, with its sign, is none. */
export function readsAsFormula(text: string): boolean {
  return formula.test(text) && !plainNumber.test(text);
}

const needsGuard = (text: string) => formula.test(text.replace(/^'+/, ""));

/** The text as it may stand in a cell of a CSV file. */
export function guarded(text: string): string {
  return needsGuard(text) ? `'${text}` : text;
}

/** Undoes `guarded`: for every text, `unguarded(guarded(text))` is the text. */
export function unguarded(cell: string): string {
  return cell.startsWith("'") && needsGuard(cell.slice(1)) ? cell.slice(1) : cell;
}
