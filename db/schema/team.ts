/** Who there is: teams, people, which role a person has in a team, and what proves who is asking. */
import { index, integer, primaryKey, sqliteTable, text } from "drizzle-orm/sqlite-core";
import type { HouseRules } from "@/lib/team/rules";

export const teams = sqliteTable("teams", {
  id: text("id").primaryKey(),
  name: text("name").notNull(),
  /** what the next run is numbered; only ever grows, so that a sheet's number is never given twice */
  nextRunNumber: integer("next_run_number").notNull().default(1),
  /** one more whenever a word of the team's catalogue changes (kept by triggers): tells a stale vocabulary */
  wordsVersion: integer("words_version").notNull().default(0),
  /** one more whenever an entry of the team or a revision changes (kept by triggers): tells a stale copy in memory */
  catalogueVersion: integer("catalogue_version").notNull().default(0),
  /** what the team has agreed on; null: as usual (`lib/team/rules.ts`) */
  rules: text("rules", { mode: "json" }).$type<HouseRules>(),
  /** ISO 8601 */
  createdAt: text("created_at").notNull(),
});

export const people = sqliteTable("people", {
  id: text("id").primaryKey(),
  name: text("name").notNull(),
  /** lower case */
  email: text("email").notNull().unique(),
  /** argon2id, in its own encoded form */
  passwordHash: text("password_hash").notNull(),
  createdAt: text("created_at").notNull(),
});

export const members = sqliteTable(
  "members",
  {
    teamId: text("team_id")
      .notNull()
      .references(() => teams.id, { onDelete: "cascade" }),
    personId: text("person_id")
      .notNull()
      .references(() => people.id, { onDelete: "cascade" }),
    role: text("role", { enum: ["designer", "librarian", "admin", "installer", "auditor"] }).notNull(),
  },
  (table) => [primaryKey({ columns: [table.teamId, table.personId] }), index("members_by_person").on(table.personId)],
);

/** Signed-in browsers. The cookie holds the sealed key; here is only its hash, so that the table alone signs nobody in. */
export const sessions = sqliteTable(
  "sessions",
  {
    /** SHA-256 of the key, hexadecimal */
    id: text("id").primaryKey(),
    personId: text("person_id")
      .notNull()
      .references(() => people.id, { onDelete: "cascade" }),
    teamId: text("team_id")
      .notNull()
      .references(() => teams.id, { onDelete: "cascade" }),
    createdAt: text("created_at").notNull(),
    /** milliseconds since 1970 */
    expiresAtMs: integer("expires_at_ms").notNull(),
  },
  (table) => [index("sessions_by_person").on(table.personId)],
);

/** Sign-ins begun and not succeeded, counted by where they come from and whom they are for. */
export const signInAttempts = sqliteTable(
  "sign_in_attempts",
  {
    id: integer("id").primaryKey({ autoIncrement: true }),
    /** SHA-256 of the network address, hexadecimal */
    addressHash: text("address_hash").notNull(),
    /** SHA-256 of the mail address typed, hexadecimal */
    accountHash: text("account_hash").notNull(),
    /** milliseconds since 1970 */
    atMs: integer("at_ms").notNull(),
  },
  (table) => [
    index("sign_in_attempts_by_address").on(table.addressHash, table.atMs),
    index("sign_in_attempts_by_account").on(table.accountHash, table.atMs),
  ],
);

/** Bearer tokens of scripts; each acts as one member. */
export const tokens = sqliteTable(
  "tokens",
  {
    id: text("id").primaryKey(),
    teamId: text("team_id")
      .notNull()
      .references(() => teams.id, { onDelete: "cascade" }),
    personId: text("person_id")
      .notNull()
      .references(() => people.id, { onDelete: "cascade" }),
    name: text("name").notNull(),
    /** SHA-256 of the token, hexadecimal */
    hash: text("hash").notNull().unique(),
    createdAt: text("created_at").notNull(),
    /** milliseconds since 1970; null never expires */
    expiresAtMs: integer("expires_at_ms"),
    revokedAt: text("revoked_at"),
  },
  (table) => [index("tokens_by_person").on(table.teamId, table.personId)],
);
