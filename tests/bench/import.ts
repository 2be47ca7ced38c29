/** An import of thousands of rows, against its checks alone plus its inserts alone; and whether it grows with the rows. */
import { openDatabase, replaceDatabase } from "@/db/client";
import { migrateDatabase } from "@/db/migrate";
import { cables } from "@/db/schema/cables";
import { checksOf } from "@/lib/cables/checks";
import { readRows, type RowRead } from "@/lib/cables/exchange/read-rows";
import { exportCatalogue } from "@/lib/cables/export/service";
import { derivedFigures } from "@/lib/cables/model";
import { cableWords } from "@/lib/cables/words";
import { importCables } from "@/lib/cables/imports/service";
import { writeImport } from "@/lib/cables/imports/write/service";
import { actor, addPeople, home } from "@/tests/support/people";
import { ms, row, times } from "@/tests/bench/timing";

const librarian = actor("librarian", home);
const head =
  "Type,Description,family,Z0 [Ω],VF [%],C [pF/m],R loop [Ω/km],OD mm,Loss 10 MHz [dB/100 m],Loss 100 MHz [dB/100 m],Loss 1 GHz [dB/100 m]";

/** A list of so many cables as somebody keeps it. */
function sheet(count: number): string {
  const line = (i: number) => {
    const vf = 66 + (i % 25);
    const c = (3335.64 / (50 * (vf / 100))).toFixed(1);
    return `G50-${i},50 ohm feeder number ${i},coax,50,${vf},${c},8.6,10.3,1.27,4.1,14.2`;
  };
  return [head, ...Array.from({ length: count }, (_, i) => line(i))].join("\r\n");
}

const bytesOf = (text: string) => new TextEncoder().encode(text);

function rowsOf(bytes: Uint8Array): RowRead[] {
  const asked = { as: "csv", fileName: "bench.csv" } as const;
  return [...readRows(bytes, asked)].flatMap((part) => ("rows" in part ? part.rows : []));
}

async function timed(task: () => unknown): Promise<number> {
  const start = performance.now();
  await task();
  return performance.now() - start;
}

/** Median of three, each into an empty catalogue. */
async function median(database: ReturnType<typeof openDatabase>, task: () => unknown): Promise<number> {
  const rounds: number[] = [];
  for (let i = 0; i < 3; i++) {
    database.delete(cables).run();
    rounds.push(await timed(task));
  }
  return rounds.sort((a, b) => a - b)[1] ?? NaN;
}

export async function benchImport(): Promise<void> {
  process.env.DATABASE_FILE = ":memory:";
  const database = openDatabase(":memory:");
  migrateDatabase(database);
  replaceDatabase(database);
  await addPeople();
  const run = (bytes: Uint8Array) =>
    importCables(librarian, { bytes, as: "csv", fileName: "bench.csv", isDryRun: false });
  await run(bytesOf(sheet(500))); // the thread starts, code is compiled
  const whole: Record<number, number> = {};
  for (const count of [2_500, 5_000, 10_000]) {
    const bytes = bytesOf(sheet(count));
    whole[count] = await median(database, () => run(bytes));
    if (count !== 5_000) continue;
    const rows = rowsOf(bytes);
    const checks = await median(database, () => rows.forEach(({ prepared }) => prepared && checksOf(prepared.entry)));
    // An insert needs the figures and the words an entry is found by, whoever makes it.
    const insert = await median(database, () => {
      for (const { prepared } of rows) {
        if (!prepared) continue;
        const { entry } = prepared;
        prepared.derived = derivedFigures(entry.model, entry.construction, entry.limits);
        prepared.words = cableWords(entry);
      }
      writeImport(librarian, "bench.csv", count, rows);
    });
    row(
      "Import of 5,000 rows; its checks and inserts alone",
      ms(whole[count]),
      ms(checks + insert),
      times(whole[count] / (checks + insert)),
    );
    row("  of that: checks, inserts", ms(checks), ms(insert));
  }
  row(
    "Import of 10,000 rows; twice that of 5,000",
    ms(whole[10_000] ?? NaN),
    ms(2 * (whole[5_000] ?? NaN)),
    times((whole[10_000] ?? NaN) / (2 * (whole[5_000] ?? NaN))),
  );
  row(
    "Import of 5,000 rows; twice that of 2,500",
    ms(whole[5_000] ?? NaN),
    ms(2 * (whole[2_500] ?? NaN)),
    times((whole[5_000] ?? NaN) / (2 * (whole[2_500] ?? NaN))),
  );
  await benchExport(database);
  replaceDatabase(undefined);
  database.$client.close();
}

async function benchExport(database: ReturnType<typeof openDatabase>): Promise<void> {
  database.delete(cables).run();
  await importCables(librarian, { bytes: bytesOf(sheet(20_000)), as: "csv", fileName: "bench.csv", isDryRun: false });
  let file = "";
  const out = await timed(() => {
    file = [...exportCatalogue(librarian, { format: "csv" })].join("");
  });
  row("Export of 20,000 entries as CSV", ms(out), `${(file.length / 1e6).toFixed(1)} MB`);
  let longest = 0;
  const again = importCables(librarian, {
    bytes: bytesOf(file.slice(0, 20_000_000).replace(/[^\n]*$/, "")),
    as: "csv",
    fileName: "out.csv",
    isDryRun: true,
  });
  let isOver = false;
  const watch = (async () => {
    for (let last = performance.now(); !isOver;) {
      await new Promise((next) => setImmediate(next));
      longest = Math.max(longest, performance.now() - last);
      last = performance.now();
    }
  })();
  const back = await timed(() => again);
  isOver = true;
  await watch;
  row("Dry run of what was taken out; longest that others wait", ms(back), ms(longest));
}
