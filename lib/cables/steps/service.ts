/** Steps in the life of a revision, but for its approval and its end. Each stands with its event and what people are told. */
import { and, eq } from "drizzle-orm";
import { database } from "@/db/client";
import { cableRevisions } from "@/db/schema/cables";
import type { Actor } from "@/lib/auth/actor";
import { requirePermission } from "@/lib/auth/permission";
import { cannotDecide } from "@/lib/cables/decision";
import { listEditors, recordEvent } from "@/lib/cables/events/service";
import { cannotTake, type LifeStep, stateAfter } from "@/lib/cables/lifecycle";
import type { CableRevision } from "@/lib/cables/revisions/schema";
import {
  findOpenNumber,
  getCurrentRevision,
  getOpenRevision,
  getRevision,
  nextVersion,
  requireVersion,
} from "@/lib/cables/revisions/service";
import { listReviewers, tellOwners } from "@/lib/cables/told/service";
import { AppError } from "@/lib/http/errors";
import { notify } from "@/lib/notices/service";
import { rulesInForce } from "@/lib/team/rules/service";

type Changed = Partial<typeof cableRevisions.$inferInsert>;

export interface Taken {
  note?: string;
  condition?: string | null;
  answers?: Record<string, string>;
  /** columns that change beside the state */
  changed?: Changed;
}

export const reviewLink = (cableId: string) => `/review?cable=${encodeURIComponent(cableId)}`;
export const entryLink = (cableId: string) => `/cables/${encodeURIComponent(cableId)}`;

/**
 * Brings a revision one step on. Call inside a transaction.
 * @throws AppError `conflict` where the step does not start from its state
 */
export function take(actor: Actor, step: LifeStep, revision: CableRevision, given: Taken = {}): CableRevision {
  const refusal = cannotTake(step, revision.state);
  if (refusal) throw new AppError("conflict", refusal);
  const { note, condition = null, answers, changed } = given;
  const { id: cableId, revision: number, approvedAt } = revision;
  const state = stateAfter(step, { wasApproved: approvedAt !== null, condition });
  database()
    .update(cableRevisions)
    .set({ ...changed, state, condition, version: nextVersion(cableId) })
    .where(and(eq(cableRevisions.cableId, cableId), eq(cableRevisions.revision, number)))
    .run();
  recordEvent(actor, { cableId, revision: number, step, state, condition, note, answers });
  return getRevision(actor, cableId, number);
}

/** In one immediate transaction: nobody writes between what is looked at and what is decided. */
export function decided<Result>(decide: () => Result): Result {
  return database().transaction(decide, { behavior: "immediate" });
}

/** The revision people see, in the version the actor has looked at, for somebody who may review. */
export function getReviewable(actor: Actor, cableId: string, version: number): CableRevision {
  requirePermission(actor, "cables.review");
  const revision = getCurrentRevision(actor, cableId);
  requireVersion(revision, version);
  return revision;
}

/**
 * Sends the open draft to the reviewers. By its author.
 * @throws AppError `not_found`, `forbidden`, `stale`, `conflict`
 */
export function submit(actor: Actor, cableId: string, version: number, { note }: { note: string }): CableRevision {
  requirePermission(actor, "cables.propose");
  return decided(() => {
    const draft = getOpenRevision(actor, cableId);
    if (draft.authorId !== actor.personId) throw new AppError("forbidden", "A draft is sent for review by its author.");
    requireVersion(draft, version);
    const sent = take(actor, "submit", draft, { note, changed: { submittedAt: new Date().toISOString() } });
    const text = `${actor.name} sent revision ${sent.revision} of ${sent.designation} for review.`;
    notify(actor, listReviewers(actor), { kind: "reviewAsked", text, link: reviewLink(cableId) });
    return sent;
  });
}

/**
 * The revision in review, in the version the actor has looked at, where they may decide on it.
 * @throws AppError `forbidden` for who wrote it, while the house rule of two persons holds
 */
export function getDecidable(
  actor: Actor,
  cableId: string,
  version: number,
  step: "approve" | "return",
): CableRevision {
  requirePermission(actor, "cables.review");
  const revision = getOpenRevision(actor, cableId);
  const writers = [revision.authorId, ...listEditors(cableId, revision.revision)];
  const refusal = cannotDecide(actor, step, writers, rulesInForce(actor));
  if (refusal) throw new AppError("forbidden", refusal);
  requireVersion(revision, version);
  return revision;
}

/**
 * Gives a revision back to its author, with what has to change.
 * @throws AppError `not_found`, `forbidden`, `stale`, `conflict`
 */
export function returnRevision(actor: Actor, cableId: string, version: number, { note }: { note: string }) {
  return decided(() => {
    const returned = take(actor, "return", getDecidable(actor, cableId, version, "return"), { note });
    const text = `${actor.name} returned revision ${returned.revision} of ${returned.designation}: ${note}`;
    notify(actor, [returned.authorId], { kind: "returned", text, link: entryLink(cableId) });
    return returned;
  });
}

/** Lets a revision be used under a condition only. */
export function restrict(actor: Actor, cableId: string, version: number, given: { condition: string; note: string }) {
  return decided(() => {
    const restricted = take(actor, "restrict", getReviewable(actor, cableId, version), given);
    const text = `${restricted.designation} is now restricted: ${given.condition}`;
    tellOwners(actor, cableId, { kind: "restricted", text });
    return restricted;
  });
}

/** Stops a revision from being used anew; runs that use it stay readable. */
export function quarantine(actor: Actor, cableId: string, version: number, { note }: { note: string }) {
  return decided(() => {
    const before = getReviewable(actor, cableId, version);
    const quarantined = take(actor, "quarantine", before, { note, condition: before.condition });
    const text = `${quarantined.designation} is quarantined: ${note}`;
    tellOwners(actor, cableId, { kind: "quarantined", text });
    return quarantined;
  });
}

/** Lifts a restriction or ends a quarantine; what was never approved goes back to its author as a draft. */
export function release(actor: Actor, cableId: string, version: number, { note }: { note: string }) {
  return decided(() => {
    const before = getReviewable(actor, cableId, version);
    const open = findOpenNumber(actor, cableId);
    if (before.approvedAt === null && open !== undefined)
      throw new AppError("conflict", `Revision ${open} is being worked on in its place; that one goes on.`);
    const released = take(actor, "release", before, { note });
    const text = `${released.designation} is released: ${note}`;
    tellOwners(actor, cableId, { kind: "released", text });
    return released;
  });
}
