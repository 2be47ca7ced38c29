/** Numbers as a spreadsheet of any country writes them. Pure. */

/** How commas are meant throughout one paste. */
export type CommaMeaning = "decimal" | "thousands";

const bare = /^[+-]?(?:\d+|\d{1,3}(?:[ \u00a0\u202f']\d{3})+)?(?:[.,]\d*)*(?:e[+-]?\d+)?$/i;

/** A cell's number and what follows it: "10 MHz" is 10 and MHz. null for a cell that does not begin with a number. */
export function splitCell(cell: string): { number: string; rest: string } | null {
  const text = cell.trim().replace(/\u2212/g, "-");
  const found = /^[+-]?[\d.,]+(?:[ \u00a0\u202f']\d{3}(?!\d))*(?:[.,]\d+)?(?:e[+-]?\d+)?/i.exec(text);
  if (!found || !/\d/.test(found[0])) return null;
  return { number: found[0], rest: text.slice(found[0].length).trim() };
}

export const isNumeric = (cell: string) => splitCell(cell) !== null;

/**
 * What the commas of all numbers mean together; null where they can mean both. A comma with one, two or four and more
 * digits after it is a decimal one; with a point in the same paste it stands between thousands.
 */
export function commaMeaning(numbers: readonly string[]): CommaMeaning | null | "mixed" {
  const withComma = numbers.filter((number) => number.includes(","));
  if (withComma.length === 0) return "thousands";
  const both = withComma.filter((number) => number.includes("."));
  const isDecimal = (number: string) =>
    number.includes(".")
      ? number.lastIndexOf(",") > number.lastIndexOf(".")
      : !/^[+-]?[1-9]\d{0,2}(,\d{3})+$/.test(number);
  const decimal = withComma.some(isDecimal);
  const thousands =
    both.some((number) => number.lastIndexOf(".") > number.lastIndexOf(",")) ||
    withComma.some((number) => (number.match(/,/g)?.length ?? 0) > 1) ||
    (!decimal && numbers.some((number) => /^[+-]?\d*\.\d+$/.test(number)));
  if (decimal && thousands) return "mixed";
  if (decimal) return "decimal";
  return thousands ? "thousands" : null;
}

/** The number itself; NaN where it is none. */
export function numberOf(number: string, commas: CommaMeaning): number {
  if (!bare.test(number)) return NaN;
  const joined = number.replace(/[ \u00a0\u202f']/g, "");
  if (commas === "decimal") return Number(joined.replace(/\.(?=\d{3}(?:\D|$))/g, "").replace(",", "."));
  return Number(joined.replace(/,/g, ""));
}
