import { mkdtempSync, mkdirSync, rmSync, statSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import path from "node:path";
import { afterEach, beforeEach, describe, expect, test } from "vitest";
import { type Database, database, databaseFile, openDatabase } from "@/db/client";
import { migrateDatabase } from "@/db/migrate";
import { seedDemo } from "@/seeds/index";
import { withDatabase } from "@/tests/support/database";

let folder: string;
beforeEach(() => {
  folder = mkdtempSync(path.join(tmpdir(), "ropewalk-"));
});
afterEach(() => rmSync(folder, { recursive: true }));

/** Writes migrations as drizzle-kit does: SQL files and a journal. */
function writeMigrations(files: string[], firstAt = 1): string {
  const out = path.join(folder, "migrations");
  mkdirSync(path.join(out, "meta"), { recursive: true });
  const entries = files.map((_, idx) => ({ idx, version: "6", when: firstAt + idx, tag: `${idx}`, breakpoints: true }));
  writeFileSync(path.join(out, "meta/_journal.json"), JSON.stringify({ version: "7", dialect: "sqlite", entries }));
  files.forEach((sql, i) => writeFileSync(path.join(out, `${i}.sql`), sql));
  return out;
}

const cablesOnReels = `
CREATE TABLE reel (id integer PRIMARY KEY, place text NOT NULL);
--> statement-breakpoint
CREATE TABLE length (id integer PRIMARY KEY, reel_id integer NOT NULL REFERENCES reel(id) ON DELETE CASCADE);`;

// As drizzle-kit writes a change that SQLite cannot make in place (here: place may be null).
const rebuildReels = `
PRAGMA foreign_keys=OFF;
--> statement-breakpoint
CREATE TABLE __new_reel (id integer PRIMARY KEY, place text);
--> statement-breakpoint
INSERT INTO __new_reel(id, place) SELECT id, place FROM reel;
--> statement-breakpoint
DROP TABLE reel;
--> statement-breakpoint
ALTER TABLE __new_reel RENAME TO reel;
--> statement-breakpoint
PRAGMA foreign_keys=ON;`;

test("Rows that hang on a table by a cascade survive the table's rebuild", () => {
  const database = openDatabase(":memory:");
  migrateDatabase(database, writeMigrations([cablesOnReels]));
  database.$client.exec("INSERT INTO reel VALUES (1, 'store'); INSERT INTO length VALUES (1, 1), (2, 1);");
  migrateDatabase(database, writeMigrations([cablesOnReels, rebuildReels]));
  expect(database.$client.prepare("SELECT count(*) AS n FROM length").get()).toEqual({ n: 2 });
  // The rebuild did happen.
  database.$client.exec("INSERT INTO reel VALUES (2, NULL);");
});

test("Foreign keys hold again after a migration", () => {
  const database = openDatabase(":memory:");
  migrateDatabase(database, writeMigrations([cablesOnReels]));
  expect(() => database.$client.exec("INSERT INTO length VALUES (1, 99);")).toThrow(/FOREIGN KEY/);
});

test("A migration that leaves rows pointing at nothing is reported, and foreign keys hold again all the same", () => {
  const database = openDatabase(":memory:");
  migrateDatabase(database, writeMigrations([cablesOnReels]));
  database.$client.exec("INSERT INTO reel VALUES (1, 'store'); INSERT INTO length VALUES (1, 1);");
  const loss = writeMigrations([cablesOnReels, "DELETE FROM reel;"]);
  expect(() => migrateDatabase(database, loss)).toThrow(/1 rows point at nothing .* length/);
  expect(database.$client.pragma("foreign_keys", { simple: true })).toBe(1);
});

/** Tables of the real schema, without SQLite's own, the journal and the insides of the full-text table. */
function tablesOf({ $client: client }: Database): string[] {
  const rows = client.prepare("SELECT name FROM sqlite_master WHERE type = 'table' ORDER BY name").all() as {
    name: string;
  }[];
  return rows.map(({ name }) => name).filter((name) => !/^(sqlite_|__drizzle|cable_search)/.test(name));
}

function rebuildOf({ $client: client }: Database, table: string): string {
  const { sql } = client.prepare("SELECT sql FROM sqlite_master WHERE name = ?").get(table) as { sql: string };
  return [
    sql.replace(`\`${table}\``, `\`__new_${table}\``),
    `INSERT INTO __new_${table} SELECT * FROM ${table}`,
    `DROP TABLE ${table}`,
    `ALTER TABLE __new_${table} RENAME TO ${table}`,
  ].join(";\n--> statement-breakpoint\n");
}

describe("The real schema, filled with the demo", () => {
  withDatabase(seedDemo);

  test("keeps every row of every table when any one of its tables is rebuilt", () => {
    const tables = tablesOf(database());
    expect(tables).toContain("run_revisions");
    const counts = () =>
      tables.map((table) => [table, database().$client.prepare(`SELECT count(*) AS n FROM ${table}`).get()]);
    const before = counts();
    tables.forEach((table, i) => {
      // Later than every migration there is, so that the migrator takes it for the next one.
      migrateDatabase(database(), writeMigrations([rebuildOf(database(), table)], Date.now() + (i + 1) * 1e9));
      expect(counts(), `after rebuilding ${table}`).toEqual(before);
    });
  });
});

test("Migrating twice changes nothing", () => {
  const database = openDatabase(":memory:");
  migrateDatabase(database);
  const schema = () => database.$client.prepare("SELECT name, sql FROM sqlite_master ORDER BY name").all();
  const before = schema();
  migrateDatabase(database);
  expect(schema()).toEqual(before);
});

test("A database file is made for its owner alone, and opened with write-ahead logging and foreign keys", () => {
  const file = path.join(folder, "deep/er/ropewalk.db");
  const { $client: client } = openDatabase(file);
  expect(client.pragma("journal_mode", { simple: true })).toBe("wal");
  expect(client.pragma("foreign_keys", { simple: true })).toBe(1);
  client.close();
  expect(statSync(file).mode & 0o777).toBe(0o600);
});

test("DATABASE_FILE says where the data lives; without it, a folder of the project", () => {
  const before = process.env.DATABASE_FILE;
  process.env.DATABASE_FILE = "/somewhere/else.db";
  expect(databaseFile()).toBe("/somewhere/else.db");
  delete process.env.DATABASE_FILE;
  expect(databaseFile()).toBe(path.join(process.cwd(), "data/ropewalk.db"));
  if (before !== undefined) process.env.DATABASE_FILE = before;
});
