/** New revisions of an entry, and what is written into them while they are open. */
import { and, eq, max } from "drizzle-orm";
import { database } from "@/db/client";
import { cableRevisions, cables } from "@/db/schema/cables";
import type { Actor } from "@/lib/auth/actor";
import { may, requirePermission } from "@/lib/auth/permission";
import { requireFree } from "@/lib/cables/drafts/service";
import { revisionValues } from "@/lib/cables/drafts/values";
import { listEditors, recordEvent } from "@/lib/cables/events/service";
import type { CableChange, CableRevision } from "@/lib/cables/revisions/schema";
import {
  findOpenNumber,
  getCurrentRevision,
  getOpenRevision,
  getRevision,
  nextVersion,
  requireVersion,
} from "@/lib/cables/revisions/service";
import { AppError } from "@/lib/http/errors";

/** States whose entry is at its end: what comes after them is another entry. */
const ended: Partial<Record<CableRevision["state"], string>> = {
  superseded: "is superseded; work on its successor instead",
  withdrawn: "is withdrawn; enter the cable anew",
};

/**
 * Begins a revision as the actor's draft, copied from the one people see.
 * @throws AppError `not_found`, `forbidden`; `conflict` while another is open or where the entry is at its end
 */
export function beginRevision(actor: Actor, cableId: string, reason: string): CableRevision {
  requirePermission(actor, "cables.propose");
  return database().transaction(
    (tx) => {
      const open = findOpenNumber(actor, cableId);
      if (open !== undefined)
        throw new AppError("conflict", `Revision ${open} is open already: one is worked on at a time.`);
      const { revision: current, state, designation } = getCurrentRevision(actor, cableId);
      if (ended[state]) throw new AppError("conflict", `${designation} ${ended[state]}.`);
      const ofCable = eq(cableRevisions.cableId, cableId);
      const last =
        tx
          .select({ n: max(cableRevisions.revision) })
          .from(cableRevisions)
          .where(ofCable)
          .get()?.n ?? 0;
      const copied = tx
        .select()
        .from(cableRevisions)
        .where(and(ofCable, eq(cableRevisions.revision, current)))
        .get();
      if (!copied) throw new Error(`beginRevision: no revision ${current} of ${cableId}`);
      const revision = last + 1;
      tx.insert(cableRevisions)
        .values({
          ...copied,
          ...{ revision, state: "draft", condition: null, reason, version: nextVersion(cableId) },
          ...{ authorId: actor.personId, createdAt: new Date().toISOString() },
          ...{ submittedAt: null, approvedById: null, approvedAt: null },
        })
        .run();
      recordEvent(actor, { cableId, revision, step: "begin", state: "draft", note: reason });
      return getRevision(actor, cableId, revision);
    },
    { behavior: "immediate" },
  );
}

const isSame = (a: unknown, b: unknown) => JSON.stringify(a) === JSON.stringify(b);

/** What an entry is called is not a matter of one revision: it can change until the entry has been approved once. */
function renamed(actor: Actor, draft: CableRevision, change: CableChange): void {
  const { designation = draft.designation, aliases = draft.aliases } = change;
  const isOther = { designation: designation !== draft.designation, aliases: !isSame(aliases, draft.aliases) };
  if (!isOther.designation && !isOther.aliases) return;
  if (!draft.isCurrent) {
    const field = isOther.designation ? "designation" : "aliases";
    throw new AppError("invalid_input", "The draft was not changed.", {
      [field]: ["What an approved entry is called stays: runs and sheets name it."],
    });
  }
  requireFree(actor, designation, draft.id);
  database().update(cables).set({ designation, aliases }).where(eq(cables.id, draft.id)).run();
}

/**
 * Changes the fields given of the open draft and leaves the rest; a change that changes nothing is none.
 * @param version - the version the change was made to
 * @throws AppError `not_found`, `forbidden`, `stale` with the current revision, `conflict` in review, `invalid_input`
 */
export function changeDraft(actor: Actor, cableId: string, version: number, change: CableChange): CableRevision {
  requirePermission(actor, "cables.propose");
  return database().transaction(
    (tx) => {
      const draft = getOpenRevision(actor, cableId);
      const { revision, state, authorId } = draft;
      if (authorId !== actor.personId && !may(actor, "cables.review"))
        throw new AppError("forbidden", "A draft is changed by its author, a librarian or an admin.");
      requireVersion(draft, version);
      if (state !== "draft")
        throw new AppError(
          "conflict",
          `Revision ${revision} is in review: it no longer changes unless it is returned.`,
        );
      const after = { ...draft, ...change };
      const { inputs } = after;
      if (Object.keys(change).every((key) => isSame(draft[key as keyof CableChange], after[key as keyof CableChange])))
        return draft;
      const values = revisionValues(after);
      renamed(actor, draft, change);
      tx.update(cableRevisions)
        .set({ ...values, inputs, version: nextVersion(cableId) })
        .where(and(eq(cableRevisions.cableId, cableId), eq(cableRevisions.revision, revision)))
        .run();
      const isNewHand = authorId !== actor.personId && !listEditors(cableId, revision).includes(actor.personId);
      if (isNewHand) recordEvent(actor, { cableId, revision, step: "edit", state });
      return getRevision(actor, cableId, revision);
    },
    { behavior: "immediate" },
  );
}
