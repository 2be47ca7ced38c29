/** The revisions of an entry, read. */
import { and, desc, eq, inArray, max } from "drizzle-orm";
import { alias } from "drizzle-orm/sqlite-core";
import { database } from "@/db/client";
import { cableRevisions, cables } from "@/db/schema/cables";
import { people } from "@/db/schema/team";
import type { Actor } from "@/lib/auth/actor";
import { may, requirePermission } from "@/lib/auth/permission";
import { knownCables, readableCables } from "@/lib/auth/visibility/service";
import { type Check, checksOf } from "@/lib/cables/checks";
import { unapprovedStates } from "@/lib/cables/model";
import type { CableRevision, RevisionLine } from "@/lib/cables/revisions/schema";
import { selectWhole, toCable } from "@/lib/cables/rows/service";
import { AppError } from "@/lib/http/errors";
import { entityTag } from "@/lib/http/etag";

const approvers = alias(people, "approvers");

/** The revisions of an entry that the actor may read, the newest first; none of an entry they do not know of. */
export function listRevisions(actor: Actor, cableId: string): RevisionLine[] {
  requirePermission(actor, "cables.read");
  return database()
    .select({
      revision: cableRevisions.revision,
      state: cableRevisions.state,
      condition: cableRevisions.condition,
      reason: cableRevisions.reason,
      authorName: people.name,
      createdAt: cableRevisions.createdAt,
      submittedAt: cableRevisions.submittedAt,
      approvedByName: approvers.name,
      approvedAt: cableRevisions.approvedAt,
      version: cableRevisions.version,
    })
    .from(cableRevisions)
    .innerJoin(cables, eq(cables.id, cableRevisions.cableId))
    .innerJoin(people, eq(people.id, cableRevisions.authorId))
    .leftJoin(approvers, eq(approvers.id, cableRevisions.approvedById))
    .where(and(readableCables(actor), eq(cables.id, cableId)))
    .orderBy(desc(cableRevisions.revision))
    .all();
}

/** What has no finite number is null on the wire. */
const wired = ({ percent, ...check }: Check) => ({
  ...check,
  ...(percent !== undefined && { percent: Number.isFinite(percent) ? percent : null }),
});

function nameOf(personId: string | null): string | null {
  if (personId === null) return null;
  return database().select({ name: people.name }).from(people).where(eq(people.id, personId)).get()?.name ?? null;
}

/**
 * One revision, whole.
 * @throws AppError `not_found`, also for another team's; `forbidden` for somebody else's draft or review
 */
export function getRevision(actor: Actor, cableId: string, revision: number): CableRevision {
  requirePermission(actor, "cables.read");
  const row = selectWhole()
    .innerJoin(cableRevisions, eq(cableRevisions.cableId, cables.id))
    .where(and(knownCables(actor), eq(cables.id, cableId), eq(cableRevisions.revision, revision)))
    .get();
  if (!row) throw new AppError("not_found", "There is no such revision of a cable.");
  const { reason, authorId, createdAt, submittedAt, approvedById, approvedAt, version, inputs, state } = row.revision;
  const isOpen = may(actor, "cables.readUnapproved") || authorId === actor.personId;
  if (unapprovedStates.includes(state) && !isOpen)
    throw new AppError("forbidden", "Until it is approved, a revision is read by its author and its reviewers.");
  return {
    ...toCable(row),
    ...{ version, isCurrent: row.cable.currentRevision === revision, reason, authorId },
    ...{ authorName: nameOf(authorId) ?? "", createdAt, submittedAt, approvedAt, inputs },
    approvedByName: nameOf(approvedById),
    checks: checksOf(row.revision).map(wired),
  };
}

/** @throws AppError `not_found` where the entry does not exist for the actor */
function getNumbers(actor: Actor, cableId: string): { current: number; open: number | undefined } {
  requirePermission(actor, "cables.read");
  const row = database()
    .select({ current: cables.currentRevision })
    .from(cables)
    .where(and(knownCables(actor), eq(cables.id, cableId)))
    .get();
  if (!row) throw new AppError("not_found", "There is no such cable.");
  const open = database()
    .select({ revision: cableRevisions.revision })
    .from(cableRevisions)
    .where(and(eq(cableRevisions.cableId, cableId), inArray(cableRevisions.state, unapprovedStates)))
    .get();
  return { current: row.current, open: open?.revision };
}

/**
 * The revision people see.
 * @throws AppError as `getRevision`
 */
export function getCurrentRevision(actor: Actor, cableId: string): CableRevision {
  return getRevision(actor, cableId, getNumbers(actor, cableId).current);
}

/** The number of the revision that is being worked on or reviewed, if there is one. */
export function findOpenNumber(actor: Actor, cableId: string): number | undefined {
  return getNumbers(actor, cableId).open;
}

/**
 * The revision that is being worked on or reviewed.
 * @throws AppError as `getRevision`; `conflict` where there is none
 */
export function getOpenRevision(actor: Actor, cableId: string): CableRevision {
  const { open } = getNumbers(actor, cableId);
  if (open === undefined)
    throw new AppError("conflict", "Nothing of this entry is being worked on: begin a new revision first.");
  return getRevision(actor, cableId, open);
}

/** What the next change of any revision of an entry is numbered: no two revisions ever share a version. */
export function nextVersion(cableId: string): number {
  const row = database()
    .select({ last: max(cableRevisions.version) })
    .from(cableRevisions)
    .where(eq(cableRevisions.cableId, cableId))
    .get();
  return (row?.last ?? 0) + 1;
}

/** The refusal to act on what somebody else has changed; it carries the revision as it now stands. */
export function staleRevision(current: CableRevision): AppError {
  const message = `Revision ${current.revision} of ${current.designation} was changed meanwhile. Nothing of yours was written; look at it again.`;
  return new AppError("stale", message, {}, { headers: { ETag: entityTag(current.version) }, members: { current } });
}

/** @throws AppError `stale` unless the revision stands in the version given */
export function requireVersion(revision: CableRevision, version: number): void {
  if (revision.version !== version) throw staleRevision(revision);
}
