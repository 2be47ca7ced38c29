/** Runs, every saved state of them, the cables in them and the installers they are given to. */
import { index, integer, primaryKey, real, sqliteTable, text, uniqueIndex } from "drizzle-orm/sqlite-core";
import type { Run, Target } from "@/lib/runs/schema";
import { revisionReference } from "@/db/schema/cables";
import { people, teams } from "@/db/schema/team";

export const runs = sqliteTable(
  "runs",
  {
    id: text("id").primaryKey(),
    teamId: text("team_id")
      .notNull()
      .references(() => teams.id, { onDelete: "cascade" }),
    /** sheet number within the team, for example R1 */
    number: text("number").notNull(),
    name: text("name").notNull(),
    site: text("site").notNull(),
    folder: text("folder").notNull(),
    state: text("state", { enum: ["draft", "issued", "verified"] }).notNull(),
    condition: text("condition"),
    ownerId: text("owner_id")
      .notNull()
      .references(() => people.id),
    circuit: text("circuit", { mode: "json" }).$type<Run["circuit"]>().notNull(),
    temperatureC: real("temperature_c").notNull(),
    designHz: real("design_hz").notNull(),
    availablePowerW: real("available_power_w"),
    bandHz: text("band_hz", { mode: "json" }).$type<[number, number]>(),
    targets: text("targets", { mode: "json" }).$type<Target[]>().notNull(),
    sourceName: text("source_name").notNull(),
    loadName: text("load_name").notNull(),
    /** from 1, one more at each save */
    version: integer("version").notNull(),
    createdAt: text("created_at").notNull(),
    changedAt: text("changed_at").notNull(),
    changedById: text("changed_by_id")
      .notNull()
      .references(() => people.id),
    /** a removed run is out of sight; its number and its history stay */
    removedAt: text("removed_at"),
    removedById: text("removed_by_id").references(() => people.id),
  },
  (table) => [
    uniqueIndex("runs_number").on(table.teamId, table.number),
    index("runs_by_change").on(table.teamId, table.changedAt, table.id),
  ],
);

/** Each save: who, when, what in a sentence, and the whole run as it then stood. */
export const runRevisions = sqliteTable(
  "run_revisions",
  {
    runId: text("run_id")
      .notNull()
      .references(() => runs.id, { onDelete: "cascade" }),
    version: integer("version").notNull(),
    savedAt: text("saved_at").notNull(),
    savedById: text("saved_by_id")
      .notNull()
      .references(() => people.id),
    sentence: text("sentence").notNull(),
    content: text("content", { mode: "json" }).$type<Run>().notNull(),
  },
  (table) => [primaryKey({ columns: [table.runId, table.version] })],
);

/** Where used: the revisions of cables a run now uses. */
export const runCables = sqliteTable(
  "run_cables",
  {
    runId: text("run_id")
      .notNull()
      .references(() => runs.id, { onDelete: "cascade" }),
    cableId: text("cable_id").notNull(),
    revision: integer("revision").notNull(),
  },
  (table) => [
    primaryKey({ columns: [table.runId, table.cableId, table.revision] }),
    revisionReference(table, "run_cables_revision"),
    index("run_cables_by_cable").on(table.cableId),
  ],
);

export const runAssignees = sqliteTable(
  "run_assignees",
  {
    runId: text("run_id")
      .notNull()
      .references(() => runs.id, { onDelete: "cascade" }),
    personId: text("person_id")
      .notNull()
      .references(() => people.id, { onDelete: "cascade" }),
  },
  (table) => [
    primaryKey({ columns: [table.runId, table.personId] }),
    index("run_assignees_by_person").on(table.personId),
  ],
);

/** What people say about a run. Never changed; what was said stands beside the run's history. */
export const runComments = sqliteTable(
  "run_comments",
  {
    id: text("id").primaryKey(),
    runId: text("run_id")
      .notNull()
      .references(() => runs.id, { onDelete: "cascade" }),
    personId: text("person_id")
      .notNull()
      .references(() => people.id),
    /** ISO 8601 */
    saidAt: text("said_at").notNull(),
    text: text("text").notNull(),
  },
  (table) => [index("run_comments_by_run").on(table.runId, table.saidAt)],
);
