/** Imports of many entries: what was read of each row, kept until it is committed or dropped. */
import { index, integer, primaryKey, sqliteTable, text } from "drizzle-orm/sqlite-core";
import { people, teams } from "@/db/schema/team";

export const cableImports = sqliteTable(
  "cable_imports",
  {
    id: text("id").primaryKey(),
    teamId: text("team_id")
      .notNull()
      .references(() => teams.id, { onDelete: "cascade" }),
    fileName: text("file_name").notNull(),
    startedById: text("started_by_id")
      .notNull()
      .references(() => people.id),
    startedAt: text("started_at").notNull(),
    /** the commit of all rows is one transaction, so there is nothing between */
    committedAt: text("committed_at"),
    rowCount: integer("row_count").notNull(),
    /** how many entries came of it, by the state they were given */
    drafts: integer("drafts").notNull().default(0),
    quarantined: integer("quarantined").notNull().default(0),
    skipped: integer("skipped").notNull().default(0),
  },
  (table) => [index("cable_imports_by_team").on(table.teamId, table.startedAt)],
);

/** Rows of an import that were no entry or one in contradiction: kept with the reason, never dropped. */
export const cableImportRows = sqliteTable(
  "cable_import_rows",
  {
    importId: text("import_id")
      .notNull()
      .references(() => cableImports.id, { onDelete: "cascade" }),
    /** from 1, the head counted */
    row: integer("row").notNull(),
    /** as it stood in the file */
    text: text("text").notNull(),
    /** sentences */
    faults: text("faults", { mode: "json" }).$type<string[]>().notNull(),
    /** the entry that came of it, if any */
    cableId: text("cable_id"),
  },
  (table) => [primaryKey({ columns: [table.importId, table.row] })],
);
