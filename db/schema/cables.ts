/** The catalogue: an entry, and the revisions in which its values live. */
import {
  type AnySQLiteColumn,
  foreignKey,
  index,
  integer,
  primaryKey,
  real,
  sqliteTable,
  text,
  uniqueIndex,
} from "drizzle-orm/sqlite-core";
import type { EntryInputs } from "@/lib/cables/inputs";
import type { Build, Construction, Figure, Limits } from "@/lib/cables/schema";
import type { LineModel } from "@/lib/line/element";
import { people, teams } from "@/db/schema/team";

export const cables = sqliteTable(
  "cables",
  {
    id: text("id").primaryKey(),
    teamId: text("team_id")
      .notNull()
      .references(() => teams.id, { onDelete: "cascade" }),
    designation: text("designation").notNull(),
    aliases: text("aliases", { mode: "json" }).$type<string[]>().notNull(),
    preferred: integer("preferred", { mode: "boolean" }).notNull().default(false),
    /** the revision people see: the approved one, or the newest while none has been approved */
    currentRevision: integer("current_revision").notNull(),
    successorId: text("successor_id").references((): AnySQLiteColumn => cables.id),
    equivalence: text("equivalence", { enum: ["dropIn", "electricallyEqual", "needsRedesign"] }),
    /** when the entry should be looked at again, ISO 8601; null before it has been approved */
    reviewDueAt: text("review_due_at"),
    createdAt: text("created_at").notNull(),
  },
  (table) => [uniqueIndex("cables_designation").on(table.teamId, table.designation)],
);

/**
 * One state of an entry's values. Once a revision has been approved its values never change (a trigger refuses it); only
 * its state and condition do.
 */
export const cableRevisions = sqliteTable(
  "cable_revisions",
  {
    cableId: text("cable_id")
      .notNull()
      .references(() => cables.id, { onDelete: "cascade" }),
    /** from 1 */
    revision: integer("revision").notNull(),
    state: text("state", {
      enum: ["draft", "inReview", "approved", "restricted", "quarantined", "superseded", "withdrawn"],
    }).notNull(),
    /** use condition of a restricted revision */
    condition: text("condition"),
    /** why there is this revision */
    reason: text("reason").notNull(),
    authorId: text("author_id")
      .notNull()
      .references(() => people.id),
    createdAt: text("created_at").notNull(),
    approvedById: text("approved_by_id").references(() => people.id),
    approvedAt: text("approved_at"),
    /** one more at every edit and change of state: what If-Match is held against */
    version: integer("version").notNull().default(1),
    submittedAt: text("submitted_at"),
    /** what was typed, by each of the ways in, and which of them rules; the model and figures follow from it */
    inputs: text("inputs", { mode: "json" }).$type<EntryInputs>(),

    name: text("name").notNull(),
    family: text("family", { enum: ["coaxial", "twistedPair", "twinaxial"] }).notNull(),
    model: text("model", { mode: "json" }).$type<LineModel>().notNull(),
    construction: text("construction", { mode: "json" }).$type<Construction>(),
    build: text("build", { mode: "json" }).$type<Build>(),
    figures: text("figures", { mode: "json" }).$type<Figure[]>().notNull(),
    limits: text("limits", { mode: "json" }).$type<Limits>().notNull(),

    /* Derived from the above by `derivedFigures`, kept so that search need not read every model. 20 °C. */
    z0Ohm: real("z0_ohm").notNull(),
    velocityFactor: real("velocity_factor").notNull(),
    capacitanceFPerM: real("capacitance_f_per_m").notNull(),
    delaySPerM: real("delay_s_per_m").notNull(),
    /** at 10 MHz */
    lossLowDbPer100m: real("loss_low_db_per_100m").notNull(),
    /** at 1 GHz */
    lossHighDbPer100m: real("loss_high_db_per_100m").notNull(),
    outerDiameterMm: real("outer_diameter_mm"),
    maxFrequencyHz: real("max_frequency_hz"),
    /** the words an entry is found by, from `cableWords`; triggers copy them into the full-text table `cable_search` */
    words: text("words").notNull(),
  },
  (table) => [
    primaryKey({ columns: [table.cableId, table.revision] }),
    index("cable_revisions_by_state").on(table.state, table.family),
    index("cable_revisions_by_author").on(table.authorId),
    // Holds all that a search filters and sorts by, so that it need not read past the long values of each row.
    index("cable_revisions_facts").on(
      table.cableId,
      table.revision,
      table.state,
      table.authorId,
      table.family,
      table.z0Ohm,
      table.velocityFactor,
      table.capacitanceFPerM,
      table.outerDiameterMm,
      table.maxFrequencyHz,
      table.model,
    ),
  ],
);

/** For tables that point at one revision of a cable. */
export function revisionReference(table: { cableId: AnySQLiteColumn; revision: AnySQLiteColumn }, name: string) {
  return foreignKey({
    name,
    columns: [table.cableId, table.revision],
    foreignColumns: [cableRevisions.cableId, cableRevisions.revision],
  });
}
