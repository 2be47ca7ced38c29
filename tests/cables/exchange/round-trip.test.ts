import { describe, expect, test } from "vitest";
import { catalogueFormat, catalogueVersion, entryInOrder, type CatalogueEntry } from "@/lib/cables/exchange/catalogue";
import { byteOrderMark, csvHead, csvRow } from "@/lib/cables/exchange/csv-write";
import { readRows, type FileAsked, type RowRead } from "@/lib/cables/exchange/read-rows";
import fc from "@/tests/support/property";
import { arbitraryEntry } from "@/tests/support/arbitrary-entry";

const csv: FileAsked = { as: "csv", fileName: "out.csv" };

function rowsOf(text: string, asked: FileAsked): RowRead[] {
  const parts = [...readRows(new TextEncoder().encode(text), asked)];
  return parts.flatMap((part) => ("rows" in part ? part.rows : []));
}

const csvOf = (entries: readonly CatalogueEntry[]) => byteOrderMark + csvHead() + entries.map(csvRow).join("");
const jsonOf = (entries: readonly CatalogueEntry[]) =>
  JSON.stringify({ format: catalogueFormat, version: catalogueVersion, cables: entries });
const entriesOf = (rows: readonly RowRead[]) =>
  rows.flatMap(({ prepared }) => (prepared ? [entryInOrder(prepared.entry)] : []));

const distinct = fc.uniqueArray(arbitraryEntry, {
  selector: ({ designation }) => designation,
  minLength: 1,
  maxLength: 4,
});

describe("What is taken out comes in again as it was", () => {
  test("as CSV: the same file, byte by byte, and the same values, whatever an entry holds", () => {
    fc.assert(
      fc.property(distinct, (entries) => {
        const file = csvOf(entries);
        const read = rowsOf(file, csv);
        expect(read.map(({ faults }) => faults.filter((fault) => fault.startsWith("“")))).toEqual(
          entries.map(() => []),
        );
        expect(entriesOf(read)).toEqual(entries);
        expect(csvOf(entriesOf(read))).toBe(file);
      }),
      { numRuns: 300 },
    );
  });

  test("as JSON: the same file, byte by byte", () => {
    fc.assert(
      fc.property(distinct, (entries) => {
        const file = jsonOf(entries);
        expect(jsonOf(entriesOf(rowsOf(file, { as: "json", fileName: "out.json" })))).toBe(file);
      }),
      { numRuns: 300 },
    );
  });
});
