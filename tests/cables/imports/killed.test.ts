import { spawn } from "node:child_process";
import { mkdtempSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import path from "node:path";
import { afterAll, expect, test } from "vitest";
import { openDatabase, replaceDatabase } from "@/db/client";
import { migrateDatabase } from "@/db/migrate";
import { addPeople } from "@/tests/support/people";

const folder = mkdtempSync(path.join(tmpdir(), "import-"));
const file = path.join(folder, "team.db");
afterAll(() => {
  replaceDatabase(undefined);
  rmSync(folder, { recursive: true });
});

const tables = ["cables", "cable_revisions", "cable_events", "cable_imports", "cable_import_rows", "cable_search"];

function counts(): number[] {
  const database = openDatabase(file);
  const rows = tables.map(
    (table) => database.$client.prepare(`SELECT count(*) AS n FROM ${table}`).get() as { n: number },
  );
  database.$client.close();
  return rows.map(({ n }) => n);
}

/** Starts the import, and ends it with the signal nothing can catch once it says that it is half way. */
function run(count: number, stopAfter: number): Promise<string> {
  const loader = ["--conditions=react-server", "--import", "tsx", "tests/support/half-an-import.ts"];
  const child = spawn(process.execPath, [...loader, String(count), String(stopAfter)], {
    env: { ...process.env, DATABASE_FILE: file },
  });
  let said = "";
  child.stderr.on("data", (text: Buffer) => (said += text.toString()));
  child.stdout.on("data", (text: Buffer) => {
    said += text.toString();
    if (said.includes("half way")) child.kill("SIGKILL");
  });
  return new Promise((done) => child.on("close", (_, signal) => done(`${said}${signal ?? ""}`)));
}

test(
  "An import that is killed half way leaves nothing, and comes in whole afterwards",
  { timeout: 60_000 },
  async () => {
    const database = openDatabase(file);
    migrateDatabase(database);
    replaceDatabase(database);
    await addPeople();
    database.$client.close();
    expect(await run(400, 200)).toBe("half way\nSIGKILL");
    expect(counts()).toEqual([0, 0, 0, 0, 0, 0]);
    expect(await run(400, 1_000)).toBe("done\n");
    expect(counts()).toEqual([400, 400, 400, 1, 0, 400]);
  },
);
