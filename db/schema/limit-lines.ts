/** Limit lines of a team's own, beside those of the standards. */
import { sqliteTable, text, uniqueIndex } from "drizzle-orm/sqlite-core";
import { people, teams } from "@/db/schema/team";

export const limitLines = sqliteTable(
  "limit_lines",
  {
    id: text("id").primaryKey(),
    teamId: text("team_id")
      .notNull()
      .references(() => teams.id, { onDelete: "cascade" }),
    name: text("name").notNull(),
    /** title, edition and clause it was taken from */
    source: text("source").notNull(),
    /** the line itself, `lib/limit-lines/schema.ts` */
    line: text("line", { mode: "json" }).$type<unknown>().notNull(),
    addedById: text("added_by_id")
      .notNull()
      .references(() => people.id),
    addedAt: text("added_at").notNull(),
  },
  (table) => [uniqueIndex("limit_lines_name").on(table.teamId, table.name)],
);
