/** A migrated database of its own for each test file. */
import { afterAll, beforeAll } from "vitest";
import { type Database, openDatabase, replaceDatabase } from "@/db/client";
import { migrateDatabase } from "@/db/migrate";

/**
 * Gives the tests of a file an empty database in memory; call at the top of the file or of a describe.
 * @param fill - puts in what every test there needs
 */
export function withDatabase(fill?: (database: Database) => void | Promise<void>): void {
  let database: Database | undefined;
  beforeAll(async () => {
    process.env.DATABASE_FILE = ":memory:";
    database = openDatabase(":memory:");
    migrateDatabase(database);
    replaceDatabase(database);
    await fill?.(database);
  });
  afterAll(() => {
    replaceDatabase(undefined);
    database?.$client.close();
  });
}
