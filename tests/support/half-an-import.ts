/**
 * A process of its own that brings in a file and stops half way through writing it, to be killed there: a trigger of the
 * test's calls back after so many entries, says so, and never returns.
 */
import { writeSync } from "node:fs";
import { database } from "@/db/client";
import { readRows } from "@/lib/cables/exchange/read-rows";
import { writeImport } from "@/lib/cables/imports/write/service";
import { actor } from "@/tests/support/people";

const [count, stopAfter] = process.argv.slice(2).map(Number) as [number, number];
const lines = Array.from({ length: count }, (_, i) => `HALF-${i},50,0.85,coax`);
const bytes = new TextEncoder().encode(["Type,Z0,VF,family", ...lines].join("\n"));
const rows = [...readRows(bytes, { as: "csv", fileName: "half.csv" })].flatMap((part) =>
  "rows" in part ? part.rows : [],
);

const { $client: client } = database();
let written = 0;
client.function("half_way", () => {
  if (++written < stopAfter) return 0;
  writeSync(1, "half way\n");
  Atomics.wait(new Int32Array(new SharedArrayBuffer(4)), 0, 0);
  return 0;
});
client.exec("CREATE TEMP TRIGGER half_way AFTER INSERT ON cables BEGIN SELECT half_way(); END");
writeImport(actor("librarian"), "half.csv", count, rows);
writeSync(1, "done\n");
