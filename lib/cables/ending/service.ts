/** The end of an entry: superseded by another, or withdrawn; and the mark of those that are preferred. */
import { eq } from "drizzle-orm";
import { database } from "@/db/client";
import { cables } from "@/db/schema/cables";
import type { Actor } from "@/lib/auth/actor";
import { recordEvent } from "@/lib/cables/events/service";
import { isUsable } from "@/lib/cables/model";
import type { CableRevision } from "@/lib/cables/revisions/schema";
import { getCurrentRevision, getRevision } from "@/lib/cables/revisions/service";
import type { Cable } from "@/lib/cables/schema";
import { cableFinder } from "@/lib/cables/service";
import type { Preference, Supersession } from "@/lib/cables/steps/schema";
import { decided, getReviewable, take } from "@/lib/cables/steps/service";
import { tellOwners } from "@/lib/cables/told/service";
import { AppError } from "@/lib/http/errors";

const equivalences: Record<Supersession["equivalence"], string> = {
  dropIn: "a drop-in replacement",
  electricallyEqual: "electrically equal",
  needsRedesign: "runs need a redesign",
};

const refused = (sentence: string) =>
  new AppError("invalid_input", "The entry was not superseded.", { successorId: [sentence] });

/** @throws AppError `invalid_input` for a successor that is none: unknown, itself, not approved, or superseded by this one */
function getSuccessor(actor: Actor, cableId: string, successorId: string): Cable {
  if (successorId === cableId) throw refused("A cable is not its own successor.");
  const successor = cableFinder(actor, [{ cableId: successorId }])({ cableId: successorId });
  if (!successor) throw refused("There is no such cable in the catalogue.");
  // A chain of successors that leads back here would leave nothing to use; what is usable has no successor.
  if (!isUsable(successor.state) || successor.successor)
    throw refused(`${successor.designation} is not approved; a successor is.`);
  return successor;
}

/** Changes an entry's own columns and answers with the revision people see. */
function written(actor: Actor, cableId: string, columns: Partial<typeof cables.$inferInsert>): CableRevision {
  database().update(cables).set(columns).where(eq(cables.id, cableId)).run();
  return getCurrentRevision(actor, cableId);
}

/**
 * Names what takes the place of an entry.
 * @throws AppError `not_found`, `forbidden`, `stale`, `conflict`, `invalid_input` for a successor that is none
 */
export function supersede(actor: Actor, cableId: string, version: number, given: Supersession): CableRevision {
  return decided(() => {
    const before = getReviewable(actor, cableId, version);
    const { successorId, equivalence, note } = given;
    const successor = getSuccessor(actor, cableId, successorId);
    take(actor, "supersede", before, { note, condition: before.condition });
    const superseded = written(actor, cableId, { successorId, equivalence, preferred: false, reviewDueAt: null });
    const text = `${superseded.designation} is superseded by ${successor.designation}: ${equivalences[equivalence]}.`;
    tellOwners(actor, cableId, { kind: "superseded", text });
    return superseded;
  });
}

/**
 * Takes an entry out of use for good.
 * @throws AppError `not_found`, `forbidden`, `stale`, `conflict`
 */
export function withdraw(actor: Actor, cableId: string, version: number, { note }: { note: string }): CableRevision {
  return decided(() => {
    const before = getReviewable(actor, cableId, version);
    take(actor, "withdraw", before, { note, condition: before.condition });
    const withdrawn = written(actor, cableId, { preferred: false, reviewDueAt: null });
    tellOwners(actor, cableId, { kind: "withdrawn", text: `${withdrawn.designation} is withdrawn: ${note}` });
    return withdrawn;
  });
}

/**
 * Marks an entry as one to take before others, or takes the mark away.
 * @throws AppError `not_found`, `forbidden`, `stale`; `conflict` for an entry that is not approved
 */
export function prefer(actor: Actor, cableId: string, version: number, { preferred, note }: Preference): CableRevision {
  return decided(() => {
    const before = getReviewable(actor, cableId, version);
    if (before.preferred === preferred) return before;
    if (preferred && !isUsable(before.state))
      throw new AppError("conflict", "Only what is approved or restricted can be preferred.");
    const { revision, state, condition } = before;
    recordEvent(actor, { cableId, revision, step: preferred ? "prefer" : "unprefer", state, condition, note });
    written(actor, cableId, { preferred });
    return getRevision(actor, cableId, revision);
  });
}
