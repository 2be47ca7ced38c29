/**
 * Which records exist for an actor, as conditions of a query. The one place that says so: it reads the tables of cables
 * and runs, since an installer's cables follow from their runs and neither feature could ask the other without a circle.
 */
import { and, eq, exists, isNull, ne, notInArray, or, type SQL } from "drizzle-orm";
import { database } from "@/db/client";
import { cableRevisions, cables } from "@/db/schema/cables";
import { runAssignees, runCables, runs } from "@/db/schema/runs";
import type { Actor } from "@/lib/auth/actor";
import { may } from "@/lib/auth/permission";
import { unapprovedStates } from "@/lib/cables/model";
import type { CableState } from "@/lib/cables/schema";

function isAssigned(actor: Actor): SQL {
  return exists(
    database()
      .select({ runId: runAssignees.runId })
      .from(runAssignees)
      .where(and(eq(runAssignees.runId, runs.id), eq(runAssignees.personId, actor.personId))),
  );
}

/** On `runs`: the team's that are not removed; of an installer, those issued and assigned to them. */
export function visibleRuns(actor: Actor): SQL | undefined {
  const ownOnly = may(actor, "runs.readAll") ? undefined : and(ne(runs.state, "draft"), isAssigned(actor));
  return and(eq(runs.teamId, actor.teamId), isNull(runs.removedAt), ownOnly);
}

function isInVisibleRun(actor: Actor): SQL {
  return exists(
    database()
      .select({ id: runCables.runId })
      .from(runCables)
      .innerJoin(runs, eq(runs.id, runCables.runId))
      .where(and(eq(runCables.cableId, cables.id), visibleRuns(actor))),
  );
}

/** On `cables`: the team's, known to exist; of an installer, those in their runs. */
export function knownCables(actor: Actor): SQL | undefined {
  return and(eq(cables.teamId, actor.teamId), may(actor, "cables.readCatalogue") ? undefined : isInVisibleRun(actor));
}

/** On `cables` and `cable_revisions`: of the known ones, without drafts and reviews that are not the actor's to read. */
export function readableCables(actor: Actor): SQL | undefined {
  if (may(actor, "cables.readUnapproved")) return knownCables(actor);
  const isOpen = or(notInArray(cableRevisions.state, unapprovedStates), eq(cableRevisions.authorId, actor.personId));
  return and(knownCables(actor), isOpen);
}

/** `readableCables` for entries that have been read already, once it has found which are known to an installer. */
export function readableEntries(actor: Actor): (entry: { id: string; state: CableState; authorId: string }) => boolean {
  if (may(actor, "cables.readUnapproved")) return () => true;
  const isOpen = (entry: { state: CableState; authorId: string }) =>
    !unapprovedStates.includes(entry.state) || entry.authorId === actor.personId;
  if (may(actor, "cables.readCatalogue")) return isOpen;
  const known = database().select({ id: cables.id }).from(cables).where(knownCables(actor)).all();
  const ids = new Set(known.map(({ id }) => id));
  return (entry) => ids.has(entry.id) && isOpen(entry);
}
