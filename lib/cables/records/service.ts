/** Who may add to what is kept beside an entry's values: its evidence, its measured lots. */
import { desc, eq } from "drizzle-orm";
import { database } from "@/db/client";
import { cableRevisions } from "@/db/schema/cables";
import type { Actor } from "@/lib/auth/actor";
import { may, requirePermission } from "@/lib/auth/permission";
import { getCable } from "@/lib/cables/service";
import { AppError } from "@/lib/http/errors";

/** The newest revision of an entry, whose work what is added now belongs to. */
function newestRevision(cableId: string) {
  const newest = database()
    .select({ revision: cableRevisions.revision, state: cableRevisions.state, authorId: cableRevisions.authorId })
    .from(cableRevisions)
    .where(eq(cableRevisions.cableId, cableId))
    .orderBy(desc(cableRevisions.revision))
    .get();
  if (!newest) throw new Error(`newestRevision: ${cableId} has none`);
  return newest;
}

/** Whether the actor may add records to an entry they may read: a librarian, an admin, or the author of its open draft. */
export function mayAddRecords(actor: Actor, cableId: string): boolean {
  if (may(actor, "cables.review")) return true;
  const { state, authorId } = newestRevision(cableId);
  return may(actor, "cables.propose") && state === "draft" && authorId === actor.personId;
}

/**
 * That records may be added, before anything has been read of what is sent.
 * @returns the revision they belong to
 * @throws AppError `not_found`, `forbidden`
 */
export function requireRecords(actor: Actor, cableId: string): number {
  requirePermission(actor, "cables.propose");
  getCable(actor, cableId);
  if (!mayAddRecords(actor, cableId))
    throw new AppError("forbidden", "Records are added by the author of the draft, a librarian or an admin.");
  return newestRevision(cableId).revision;
}
