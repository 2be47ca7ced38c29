/** What people are told: notices in the product, and the letters that go out by e-mail. */
import { index, integer, sqliteTable, text } from "drizzle-orm/sqlite-core";
import { people, teams } from "@/db/schema/team";

const ofTeam = () =>
  text("team_id")
    .notNull()
    .references(() => teams.id, { onDelete: "cascade" });

export const notices = sqliteTable(
  "notices",
  {
    id: text("id").primaryKey(),
    teamId: ofTeam(),
    personId: text("person_id")
      .notNull()
      .references(() => people.id, { onDelete: "cascade" }),
    at: text("at").notNull(),
    kind: text("kind", {
      enum: [
        "reviewAsked",
        "returned",
        "approved",
        "restricted",
        "quarantined",
        "released",
        "superseded",
        "withdrawn",
        "reported",
        "settled",
      ],
    }).notNull(),
    /** a sentence */
    text: text("text").notNull(),
    /** address within the product */
    link: text("link").notNull(),
    readAt: text("read_at"),
  },
  (table) => [index("notices_by_person").on(table.personId, table.teamId, table.at)],
);

/** Letters waiting to be sent, sent, or given up; where no mail server is set they stay here, to be read. */
export const letters = sqliteTable(
  "letters",
  {
    id: text("id").primaryKey(),
    teamId: ofTeam(),
    toAddress: text("to_address").notNull(),
    subject: text("subject").notNull(),
    body: text("body").notNull(),
    writtenAt: text("written_at").notNull(),
    state: text("state", { enum: ["waiting", "sent", "givenUp"] }).notNull(),
    tries: integer("tries").notNull().default(0),
    nextTryAt: text("next_try_at").notNull(),
    sentAt: text("sent_at"),
    /** what the mail server said last */
    error: text("error"),
  },
  (table) => [
    index("letters_due").on(table.state, table.nextTryAt),
    index("letters_by_team").on(table.teamId, table.writtenAt),
  ],
);
