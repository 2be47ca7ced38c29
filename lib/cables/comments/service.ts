/** Comments on revisions. Whoever may read a revision reads them; nobody changes what was said. */
import { and, asc, count, eq } from "drizzle-orm";
import { database } from "@/db/client";
import { cableComments } from "@/db/schema/cable-records";
import { cableRevisions, cables } from "@/db/schema/cables";
import { people } from "@/db/schema/team";
import type { Actor } from "@/lib/auth/actor";
import { requirePermission } from "@/lib/auth/permission";
import { readableCables } from "@/lib/auth/visibility/service";
import type { CableComment, NewCableComment } from "@/lib/cables/comments/schema";
import { findOpenNumber, getCurrentRevision, getRevision } from "@/lib/cables/revisions/service";
import { AppError } from "@/lib/http/errors";

const mostComments = 500;

const revisionOf = and(
  eq(cableRevisions.cableId, cableComments.cableId),
  eq(cableRevisions.revision, cableComments.revision),
);

/** What was said of the revisions that the actor may read, the oldest first. */
export function listCableComments(actor: Actor, cableId: string): CableComment[] {
  requirePermission(actor, "cables.read");
  return database()
    .select({
      id: cableComments.id,
      revision: cableComments.revision,
      personName: people.name,
      saidAt: cableComments.saidAt,
      text: cableComments.text,
    })
    .from(cableComments)
    .innerJoin(people, eq(people.id, cableComments.personId))
    .innerJoin(cables, eq(cables.id, cableComments.cableId))
    .innerJoin(cableRevisions, revisionOf)
    .where(and(readableCables(actor), eq(cables.id, cableId)))
    .orderBy(asc(cableComments.saidAt), asc(cableComments.id))
    .all();
}

/** The revision a comment is about where it does not say: the one that is being talked over. */
function usualRevision(actor: Actor, cableId: string): number {
  return findOpenNumber(actor, cableId) ?? getCurrentRevision(actor, cableId).revision;
}

/** @throws AppError `forbidden`, `not_found`; `conflict` where an entry has all the comments it can hold */
export function addCableComment(
  actor: Actor,
  cableId: string,
  { text, revision: asked }: NewCableComment,
): CableComment {
  requirePermission(actor, "cables.comment");
  const { revision } = getRevision(actor, cableId, asked ?? usualRevision(actor, cableId));
  const held = database().select({ n: count() }).from(cableComments).where(eq(cableComments.cableId, cableId)).get();
  if ((held?.n ?? 0) >= mostComments)
    throw new AppError("conflict", `An entry holds at most ${mostComments} comments.`);
  const comment = { id: crypto.randomUUID(), revision, saidAt: new Date().toISOString(), text };
  database()
    .insert(cableComments)
    .values({ ...comment, cableId, personId: actor.personId })
    .run();
  return { ...comment, personName: actor.name };
}
