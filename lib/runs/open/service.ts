/** A run opened for work: the run, every cable it may be worked with, and whether this person may change it. */
import type { Actor } from "@/lib/auth/actor";
import { may } from "@/lib/auth/permission";
import { lineOf, type CableLine } from "@/lib/cables/line";
import { listReferredCables, listUsableCables } from "@/lib/cables/service";
import { listPossibleOwners, mayHandOver, type PossibleOwner } from "@/lib/runs/owner/service";
import { getRun } from "@/lib/runs/service";
import type { Run } from "@/lib/runs/schema";

/** Of a large catalogue a run is opened with this many; any other is fetched when it is chosen. */
const mostOthers = 300;

export interface OpenedRun {
  run: Run;
  lines: CableLine[];
  /** a sentence; null when the run can be changed */
  cannotEditBecause: string | null;
  people: { personId: string; owners: PossibleOwner[]; canHandOver: boolean; canComment: boolean };
}

function refusal(actor: Actor, run: Run): string | null {
  if (run.state !== "draft")
    return `${run.state === "issued" ? "Issued" : "Verified"}, revision ${run.version}: it can no longer be changed`;
  return may(actor, "runs.write") ? null : "You are reading; your role changes nothing";
}

/**
 * @throws AppError `not_found`: unknown, another team's, or not given to this installer
 */
export function openRun(actor: Actor, runId: string): OpenedRun {
  const run = getRun(actor, runId);
  const pinned = listReferredCables(actor, run.pinned);
  const others = may(actor, "cables.readCatalogue") ? listUsableCables(actor, mostOthers) : [];
  const ids = new Set(pinned.map(({ id }) => id));
  const lines = [...pinned, ...others.filter(({ id }) => !ids.has(id))].map(lineOf);
  const canHandOver = mayHandOver(actor, run);
  const people = {
    personId: actor.personId,
    owners: canHandOver ? listPossibleOwners(actor) : [],
    canHandOver,
    canComment: may(actor, "runs.comment"),
  };
  return { run, lines, cannotEditBecause: refusal(actor, run), people };
}
