/** What happened to an entry, step by step. Rows are added and never changed. */
import { and, asc, eq } from "drizzle-orm";
import { database } from "@/db/client";
import { cableEvents } from "@/db/schema/cable-records";
import { cableRevisions, cables } from "@/db/schema/cables";
import { people } from "@/db/schema/team";
import type { Actor } from "@/lib/auth/actor";
import { requirePermission } from "@/lib/auth/permission";
import { readableCables } from "@/lib/auth/visibility/service";
import type { CableEvent } from "@/lib/cables/events/schema";

type Row = typeof cableEvents.$inferInsert;
type Happened = Omit<Row, "id" | "at" | "personId" | "note"> & { note?: string };

/** Writes a step down. Call inside the transaction that takes it. */
export function recordEvent(actor: Actor, { note = "", ...event }: Happened): void {
  const at = new Date().toISOString();
  database()
    .insert(cableEvents)
    .values({ ...event, note, at, personId: actor.personId })
    .run();
}

/** The steps of the revisions that the actor may read, the oldest first. */
export function listEvents(actor: Actor, cableId: string): CableEvent[] {
  requirePermission(actor, "cables.read");
  const revision = and(
    eq(cableRevisions.cableId, cableEvents.cableId),
    eq(cableRevisions.revision, cableEvents.revision),
  );
  return database()
    .select({
      revision: cableEvents.revision,
      at: cableEvents.at,
      personName: people.name,
      step: cableEvents.step,
      state: cableEvents.state,
      condition: cableEvents.condition,
      note: cableEvents.note,
      answers: cableEvents.answers,
    })
    .from(cableEvents)
    .innerJoin(people, eq(people.id, cableEvents.personId))
    .innerJoin(cables, eq(cables.id, cableEvents.cableId))
    .innerJoin(cableRevisions, revision)
    .where(and(readableCables(actor), eq(cables.id, cableId)))
    .orderBy(asc(cableEvents.id))
    .all();
}

/** Who has written a revision: whoever changed it, beside its author. */
export function listEditors(cableId: string, revision: number): string[] {
  return database()
    .selectDistinct({ personId: cableEvents.personId })
    .from(cableEvents)
    .where(and(eq(cableEvents.cableId, cableId), eq(cableEvents.revision, revision), eq(cableEvents.step, "edit")))
    .all()
    .map(({ personId }) => personId);
}
