/** How an entry stands for whoever looks at it: what they may do with it. */
import type { Actor } from "@/lib/auth/actor";
import { may } from "@/lib/auth/permission";
import type { EntryStanding } from "@/lib/cables/possible-steps";
import { findOpenNumber, getCurrentRevision, getRevision } from "@/lib/cables/revisions/service";
import { AppError } from "@/lib/http/errors";

/** The open revision, unless it is somebody else's draft that the actor may not read. */
function readableOpen(actor: Actor, cableId: string, revision: number): EntryStanding["open"] {
  try {
    const { version, state, authorId, submittedAt } = getRevision(actor, cableId, revision);
    return { revision, version, state, isOwn: authorId === actor.personId, wasSubmitted: submittedAt !== null };
  } catch (error) {
    if (error instanceof AppError && error.code === "forbidden") return null;
    throw error;
  }
}

/** @throws AppError `not_found`, `forbidden` as for the entry itself */
export function getStanding(actor: Actor, cableId: string): EntryStanding {
  const { revision, version, state, preferred } = getCurrentRevision(actor, cableId);
  const open = findOpenNumber(actor, cableId);
  return {
    current: { revision, version, state, preferred },
    open: open === undefined ? null : readableOpen(actor, cableId, open),
    hasOpen: open !== undefined,
    mayPropose: may(actor, "cables.propose"),
    mayReview: may(actor, "cables.review"),
    mayReport: may(actor, "cables.report"),
  };
}
