import "server-only";
import { closeSync, mkdirSync, openSync } from "node:fs";
import path from "node:path";
import Sqlite from "better-sqlite3";
import { drizzle, type BetterSQLite3Database } from "drizzle-orm/better-sqlite3";

export type Database = BetterSQLite3Database & { $client: Sqlite.Database };

// One handle for the process, kept where a reloaded module finds it again.
const kept = globalThis as { ropewalkDatabase?: Database };

/** Where the data lives: `DATABASE_FILE`, else a git-ignored folder of the project. */
export function databaseFile(): string {
  return process.env.DATABASE_FILE || path.join(process.cwd(), "data", "ropewalk.db");
}

/** An empty file that only its owner may read, if there is none yet; SQLite's side files take after it. */
function makeFile(file: string): void {
  mkdirSync(path.dirname(file), { recursive: true });
  closeSync(openSync(file, "a", 0o600));
}

/** Opens a database file (`:memory:` for one in memory), making its folder when missing. Does not migrate it. */
export function openDatabase(file: string): Database {
  if (file !== ":memory:") makeFile(path.resolve(file));
  const client = new Sqlite(file);
  client.pragma("journal_mode = WAL");
  client.pragma("foreign_keys = ON");
  client.pragma("busy_timeout = 5000");
  client.pragma("cache_size = -32000"); // 32 MB
  // SQLite's own lower() knows the letters of ASCII only.
  client.function("lower_unicode", { deterministic: true }, (text) =>
    typeof text === "string" ? text.toLowerCase() : text,
  );
  // Counts the rows where nobody has counted them: without the counts SQLite overlooks the index made for searching.
  client.pragma("optimize = 0x10002");
  return drizzle(client);
}

/** The database of this process, opened at first use, so that importing this file (as a build does) opens nothing. */
export function database(): Database {
  kept.ropewalkDatabase ??= openDatabase(databaseFile());
  return kept.ropewalkDatabase;
}

/** Puts another database in the place of the process's own, or none; the former is left open. For tests. */
export function replaceDatabase(replacement: Database | undefined): void {
  kept.ropewalkDatabase = replacement;
}
