/** The steps by which the demo's entries came to stand as they do. */
import { and, eq, isNull } from "drizzle-orm";
import { database } from "@/db/client";
import { cableEvents } from "@/db/schema/cable-records";
import { cableRevisions, cables } from "@/db/schema/cables";
import { reviewDueAt, usualRules } from "@/lib/team/rules";
import lives from "@/seeds/data/cable-lives.json";
import team from "@/seeds/data/team.json";

type Event = typeof cableEvents.$inferInsert;
type Revision = typeof cableRevisions.$inferSelect;

const librarian = "libby-thornquist";
const reviewer = "nils-ferrant";
const endedAt = "2026-02-10T11:00:00.000Z";

const daysBefore = (at: string, days: number) => new Date(Date.parse(at) - days * 86_400_000).toISOString();

/** The usual life of a revision: begun, sent, approved, and what became of it. */
function lifeOf(row: Revision): Event[] {
  const { cableId, revision, createdAt, submittedAt, approvedAt, state, condition, reason, authorId } = row;
  const of = { cableId, revision, note: "" };
  const events: Event[] = [{ ...of, at: createdAt, personId: authorId, step: "begin", state: "draft", note: reason }];
  const sentAt = submittedAt ?? (approvedAt === null ? null : daysBefore(approvedAt, 1));
  if (state === "draft") return events;
  if (cableId === lives.import.id) {
    const { createdAt: at, note } = lives.import;
    return [...events, { ...of, at, personId: librarian, step: "quarantine", state, note }];
  }
  events.push({ ...of, at: sentAt ?? createdAt, personId: authorId, step: "submit", state: "inReview" });
  if (approvedAt === null) return events;
  const after = state === "restricted" ? state : "approved";
  events.push({ ...of, at: approvedAt, personId: reviewer, step: "approve", state: after, condition });
  if (state === "superseded") events.push({ ...of, at: endedAt, personId: reviewer, step: "supersede", state });
  if (state === "withdrawn") events.push({ ...of, at: endedAt, personId: reviewer, step: "withdraw", state });
  return events;
}

/** C93-F4 went back once, and was sent again. */
function withReturn(events: Event[]): Event[] {
  const { at, note, sentAgainAt } = lives.returned;
  const of = { cableId: lives.returned.cableId, revision: 1 };
  return [
    ...events,
    { ...of, at, personId: reviewer, step: "return", state: "draft", note },
    { ...of, at: sentAgainAt, personId: librarian, step: "submit", state: "inReview", note: "Marked as an estimate." },
  ];
}

/** A former revision ended with the approval of the next. */
function endOfFormer(rows: readonly Revision[], event: Event): Event {
  const next = rows.find(({ cableId, revision }) => cableId === event.cableId && revision === event.revision + 1);
  if (event.step !== "supersede" || !next?.approvedAt) return event;
  return { ...event, at: next.approvedAt, note: `Revision ${next.revision} was approved in its place.` };
}

/** Writes down the steps of entries that have none, and when each is due for another look. */
export function seedCableEvents(): void {
  database().transaction((tx) => {
    const ofTeam = eq(cables.teamId, team.team.id);
    const entries = tx.select().from(cables).where(ofTeam).all();
    for (const { id, currentRevision } of entries) {
      const isTold = tx.select({ id: cableEvents.id }).from(cableEvents).where(eq(cableEvents.cableId, id)).get();
      if (isTold) continue;
      const rows = tx.select().from(cableRevisions).where(eq(cableRevisions.cableId, id)).all();
      const events = rows.flatMap((row) => {
        const life = lifeOf(row);
        return id === lives.returned.cableId ? withReturn(life) : life;
      });
      const told = events.map((event) => endOfFormer(rows, event)).sort((a, b) => a.at.localeCompare(b.at));
      if (told.length > 0) tx.insert(cableEvents).values(told).run();
      const shown = rows.find(({ revision }) => revision === currentRevision);
      if (!shown?.approvedAt || !["approved", "restricted"].includes(shown.state)) continue;
      const due = { reviewDueAt: reviewDueAt(shown.approvedAt, usualRules) };
      tx.update(cables)
        .set(due)
        .where(and(eq(cables.id, id), isNull(cables.reviewDueAt)))
        .run();
    }
  });
}
