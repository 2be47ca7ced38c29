/** Drafts of entries: written by anybody who may propose, taken back while nobody has reviewed them. */
import { and, eq, ne } from "drizzle-orm";
import { database } from "@/db/client";
import { cableEvents } from "@/db/schema/cable-records";
import { cableEvidence } from "@/db/schema/evidence";
import { cableRevisions, cables } from "@/db/schema/cables";
import type { Actor } from "@/lib/auth/actor";
import { may, requirePermission } from "@/lib/auth/permission";
import { revisionValues } from "@/lib/cables/drafts/values";
import { recordEvent } from "@/lib/cables/events/service";
import type { NewCable } from "@/lib/cables/new-cable";
import { findOpenNumber, getCurrentRevision, getRevision, nextVersion } from "@/lib/cables/revisions/service";
import type { Cable } from "@/lib/cables/schema";
import { getCable } from "@/lib/cables/service";
import { AppError } from "@/lib/http/errors";

/**
 * Refuses a designation that another entry of the team has.
 * @throws AppError `conflict`
 */
export function requireFree(actor: Actor, designation: string, cableId = ""): void {
  const isTaken = database()
    .select({ id: cables.id })
    .from(cables)
    .where(and(eq(cables.teamId, actor.teamId), eq(cables.designation, designation), ne(cables.id, cableId)))
    .get();
  if (isTaken)
    throw new AppError("conflict", `The catalogue already has ${designation}.`, {
      designation: ["Already in the catalogue."],
    });
}

/**
 * Adds a draft to the team's catalogue.
 * @throws AppError `forbidden`; `conflict` where the designation is taken; `invalid_input` where the model has no finite figures
 */
export function createDraft(actor: Actor, input: NewCable): Cable {
  requirePermission(actor, "cables.propose");
  const { designation, aliases } = input;
  const values = revisionValues(input);
  return database().transaction(
    (tx) => {
      requireFree(actor, designation);
      const id = crypto.randomUUID();
      const createdAt = new Date().toISOString();
      const reason = "First entry.";
      tx.insert(cables).values({ id, teamId: actor.teamId, designation, aliases, currentRevision: 1, createdAt }).run();
      tx.insert(cableRevisions)
        .values({ cableId: id, revision: 1, state: "draft", reason, authorId: actor.personId, createdAt, ...values })
        .run();
      recordEvent(actor, { cableId: id, revision: 1, step: "begin", state: "draft", note: reason });
      return getCable(actor, id);
    },
    { behavior: "immediate" },
  );
}

/**
 * Takes a draft back, and with its only revision the entry. By its author, a librarian or an admin, and only while it was
 * never submitted.
 * @throws AppError `not_found`, `forbidden`, `conflict`
 */
export function deleteDraft(actor: Actor, cableId: string): void {
  requirePermission(actor, "cables.propose");
  database().transaction(
    (tx) => {
      const open = findOpenNumber(actor, cableId);
      const draft = open === undefined ? undefined : getRevision(actor, cableId, open);
      if (draft?.state !== "draft" || draft.submittedAt !== null)
        throw new AppError("conflict", "Only a draft that was never submitted can be taken back.");
      if (draft.authorId !== actor.personId && !may(actor, "team.tidy"))
        throw new AppError("forbidden", "A draft is taken back by its author, a librarian or an admin.");
      const { revision } = draft;
      if (draft.isCurrent) tx.delete(cables).where(eq(cables.id, cableId)).run();
      else {
        const ofCable = and(eq(cableRevisions.cableId, cableId), eq(cableRevisions.revision, revision));
        const current = getCurrentRevision(actor, cableId).revision;
        // A file that somebody else added meanwhile bears out the entry, and does not go with the draft.
        tx.update(cableEvidence)
          .set({ revision: current })
          .where(
            and(
              eq(cableEvidence.cableId, cableId),
              eq(cableEvidence.revision, revision),
              ne(cableEvidence.addedById, draft.authorId),
            ),
          )
          .run();
        // What nobody was ever shown leaves no trace: its number is given again.
        tx.delete(cableEvents)
          .where(and(eq(cableEvents.cableId, cableId), eq(cableEvents.revision, revision)))
          .run();
        // Its versions are not: a page that still shows it must not fit the next draft.
        tx.update(cableRevisions)
          .set({ version: nextVersion(cableId) })
          .where(and(eq(cableRevisions.cableId, cableId), eq(cableRevisions.revision, current)))
          .run();
        tx.delete(cableRevisions).where(ofCable).run();
      }
    },
    { behavior: "immediate" },
  );
}
