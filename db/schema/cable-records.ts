/** What happens to an entry beside its values: every step of its life, what is said of it, complaints and waivers. */
import { index, integer, real, sqliteTable, text, uniqueIndex } from "drizzle-orm/sqlite-core";
import type { Figure } from "@/lib/cables/schema";
import { cables, revisionReference } from "@/db/schema/cables";
import { runs } from "@/db/schema/runs";
import { people } from "@/db/schema/team";

const ofCable = () =>
  text("cable_id")
    .notNull()
    .references(() => cables.id, { onDelete: "cascade" });
const byPerson = (name: string) =>
  text(name)
    .notNull()
    .references(() => people.id);

/** One step in the life of a revision. Rows are added and never changed: the state on any date follows from them. */
export const cableEvents = sqliteTable(
  "cable_events",
  {
    id: integer("id").primaryKey({ autoIncrement: true }),
    cableId: ofCable(),
    revision: integer("revision").notNull(),
    at: text("at").notNull(),
    personId: byPerson("person_id"),
    step: text("step", {
      enum: [
        "begin",
        "edit",
        "submit",
        "approve",
        "return",
        "restrict",
        "quarantine",
        "release",
        "supersede",
        "withdraw",
        "prefer",
        "unprefer",
      ],
    }).notNull(),
    /** the state the revision was in after it */
    state: text("state", {
      enum: ["draft", "inReview", "approved", "restricted", "quarantined", "superseded", "withdrawn"],
    }).notNull(),
    condition: text("condition"),
    note: text("note").notNull(),
    /** a reviewer's answers to what the checks asked, by check */
    answers: text("answers", { mode: "json" }).$type<Record<string, string>>(),
  },
  (table) => [index("cable_events_by_cable").on(table.cableId, table.at)],
);

export const cableComments = sqliteTable(
  "cable_comments",
  {
    id: text("id").primaryKey(),
    cableId: text("cable_id").notNull(),
    revision: integer("revision").notNull(),
    personId: byPerson("person_id"),
    saidAt: text("said_at").notNull(),
    text: text("text").notNull(),
  },
  (table) => [
    index("cable_comments_by_cable").on(table.cableId, table.saidAt),
    revisionReference(table, "cable_comments_revision").onDelete("cascade"),
  ],
);

/** "Report a problem with this cable", from anybody who may read it, until a librarian has settled it. */
export const cableReports = sqliteTable(
  "cable_reports",
  {
    id: text("id").primaryKey(),
    cableId: ofCable(),
    revision: integer("revision").notNull(),
    personId: byPerson("person_id"),
    reportedAt: text("reported_at").notNull(),
    text: text("text").notNull(),
    settledAt: text("settled_at"),
    settledById: text("settled_by_id").references(() => people.id),
    outcome: text("outcome", { enum: ["quarantined", "corrected", "noFault"] }),
    answer: text("answer"),
  },
  (table) => [index("cable_reports_by_cable").on(table.cableId, table.reportedAt)],
);

/** Lets one run have one cable that it otherwise could not, until a date. */
export const cableWaivers = sqliteTable(
  "cable_waivers",
  {
    id: text("id").primaryKey(),
    cableId: ofCable(),
    runId: text("run_id")
      .notNull()
      .references(() => runs.id, { onDelete: "cascade" }),
    reason: text("reason").notNull(),
    /** the last day it holds, a date */
    until: text("until").notNull(),
    givenById: byPerson("given_by_id"),
    givenAt: text("given_at").notNull(),
    endedAt: text("ended_at"),
  },
  (table) => [index("cable_waivers_by_cable").on(table.cableId), index("cable_waivers_by_run").on(table.runId)],
);

/** A delivery, measured: kept apart from what is nominal. */
export const cableLots = sqliteTable(
  "cable_lots",
  {
    id: text("id").primaryKey(),
    cableId: ofCable(),
    /** the maker's lot, and the reel of it where the figures are one reel's */
    lot: text("lot").notNull(),
    reel: text("reel").notNull().default(""),
    lengthM: real("length_m"),
    /** z0Ohm, velocityFactor, loopResistanceOhmPerM, lossDbPerM at a frequency: figures of kind measured */
    figures: text("figures", { mode: "json" }).$type<Figure[]>().notNull(),
    note: text("note").notNull().default(""),
    measuredAt: text("measured_at").notNull(),
    addedById: byPerson("added_by_id"),
    addedAt: text("added_at").notNull(),
  },
  (table) => [uniqueIndex("cable_lots_name").on(table.cableId, table.lot, table.reel)],
);

/** The reel a run is to be cut from. */
export const runReels = sqliteTable(
  "run_reels",
  {
    runId: text("run_id")
      .notNull()
      .references(() => runs.id, { onDelete: "cascade" }),
    lotId: text("lot_id")
      .notNull()
      .references(() => cableLots.id, { onDelete: "cascade" }),
  },
  (table) => [uniqueIndex("run_reels_once").on(table.runId, table.lotId)],
);
