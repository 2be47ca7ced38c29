/** Which entries of the catalogue an actor may see, as conditions of a query on `cables` joined with `cable_revisions`. */
import { and, eq, exists, isNull, ne, notInArray, or, type SQL } from "drizzle-orm";
import { database } from "@/db/client";
import { cableRevisions, cables } from "@/db/schema/cables";
import { runAssignees, runCables, runs } from "@/db/schema/runs";
import type { Actor } from "@/lib/auth/actor";
import { may } from "@/lib/auth/permission";
import { unapprovedStates } from "@/lib/cables/model";

/** Joins an entry with the revision people see of it. */
export const currentRevision = and(
  eq(cableRevisions.cableId, cables.id),
  eq(cableRevisions.revision, cables.currentRevision),
);

/** Whether the actor has been given an issued run with the cable in it. */
function isInOwnRuns(actor: Actor): SQL {
  return exists(
    database()
      .select({ id: runCables.runId })
      .from(runCables)
      .innerJoin(runs, eq(runs.id, runCables.runId))
      .innerJoin(runAssignees, eq(runAssignees.runId, runCables.runId))
      .where(
        and(
          eq(runCables.cableId, cables.id),
          eq(runAssignees.personId, actor.personId),
          eq(runs.teamId, actor.teamId),
          ne(runs.state, "draft"),
          isNull(runs.removedAt),
        ),
      ),
  );
}

/** Of the team's entries, those whose existence the actor may know. */
export function known(actor: Actor): SQL | undefined {
  return and(eq(cables.teamId, actor.teamId), may(actor, "cables.readCatalogue") ? undefined : isInOwnRuns(actor));
}

/** Of the known ones, those the actor may read: drafts and reviews are for their author and for whoever reviews. */
export function readable(actor: Actor): SQL | undefined {
  if (may(actor, "cables.readUnapproved")) return known(actor);
  return and(
    known(actor),
    or(notInArray(cableRevisions.state, unapprovedStates), eq(cableRevisions.authorId, actor.personId)),
  );
}
