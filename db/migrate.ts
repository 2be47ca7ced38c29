import path from "node:path";
import { fileURLToPath } from "node:url";
import { migrate } from "drizzle-orm/better-sqlite3/migrator";
import { database, databaseFile, type Database } from "@/db/client";

/**
 * Brings a database to the newest schema. Foreign keys are off meanwhile: the migrator works inside a transaction, where
 * they cannot be switched off, and rebuilding a table with them on deletes every row that hangs on it by a cascade.
 * Renaming is the old, unchecking one, since a trigger that names the table being rebuilt would stop it.
 * @throws Error when a row points at nothing afterwards
 */
export function migrateDatabase(target: Database, folder = path.join(process.cwd(), "drizzle")): void {
  target.$client.pragma("foreign_keys = OFF");
  target.$client.pragma("legacy_alter_table = ON");
  try {
    migrate(target, { migrationsFolder: folder });
    const broken = target.$client.pragma("foreign_key_check") as { table: string }[];
    if (broken.length > 0) {
      const tables = [...new Set(broken.map((row) => row.table))].join(", ");
      throw new Error(`migrateDatabase: ${broken.length} rows point at nothing after the migration, in ${tables}`);
    }
  } finally {
    target.$client.pragma("legacy_alter_table = OFF");
    target.$client.pragma("foreign_keys = ON");
  }
}

if (process.argv[1] === fileURLToPath(import.meta.url)) {
  migrateDatabase(database());
  console.log(`The database ${databaseFile()} has the newest schema.`);
}
