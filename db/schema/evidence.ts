/** Files that bear out an entry's figures, kept whole in the database. */
import { blob, index, integer, sqliteTable, text } from "drizzle-orm/sqlite-core";
import { revisionReference } from "@/db/schema/cables";
import { people } from "@/db/schema/team";

export const cableEvidence = sqliteTable(
  "cable_evidence",
  {
    id: text("id").primaryKey(),
    cableId: text("cable_id").notNull(),
    /** the revision it was attached to; later revisions keep it */
    revision: integer("revision").notNull(),
    fileName: text("file_name").notNull(),
    /** what its content was found to be, never what the sender said */
    mediaType: text("media_type").notNull(),
    sizeBytes: integer("size_bytes").notNull(),
    /** SHA-256 of the content, hexadecimal */
    hash: text("hash").notNull(),
    /** title, issue and page, as cited by figures */
    title: text("title").notNull(),
    content: blob("content", { mode: "buffer" }).notNull(),
    addedById: text("added_by_id")
      .notNull()
      .references(() => people.id),
    addedAt: text("added_at").notNull(),
  },
  (table) => [
    index("cable_evidence_by_cable").on(table.cableId, table.addedAt),
    revisionReference(table, "cable_evidence_revision").onDelete("cascade"),
  ],
);
