/** Which runs an actor may see, as a condition of a query on `runs`. */
import { and, eq, exists, isNull, ne, type SQL } from "drizzle-orm";
import { database } from "@/db/client";
import { runAssignees, runs } from "@/db/schema/runs";
import type { Actor } from "@/lib/auth/actor";
import { may } from "@/lib/auth/permission";

function isAssigned(actor: Actor): SQL | undefined {
  const assignment = database()
    .select({ runId: runAssignees.runId })
    .from(runAssignees)
    .where(and(eq(runAssignees.runId, runs.id), eq(runAssignees.personId, actor.personId)));
  return and(ne(runs.state, "draft"), exists(assignment));
}

/** The team's runs that are not removed; of an installer, those issued and assigned. */
export function visible(actor: Actor): SQL | undefined {
  return and(
    eq(runs.teamId, actor.teamId),
    isNull(runs.removedAt),
    may(actor, "runs.readAll") ? undefined : isAssigned(actor),
  );
}
