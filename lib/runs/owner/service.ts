/** Who owns a run, and handing it over. */
import { and, eq, inArray } from "drizzle-orm";
import { database } from "@/db/client";
import { runs } from "@/db/schema/runs";
import { members, people } from "@/db/schema/team";
import type { Actor } from "@/lib/auth/actor";
import { may, permissions, requirePermission } from "@/lib/auth/permission";
import { AppError } from "@/lib/http/errors";
import type { Run } from "@/lib/runs/schema";
import { getRun, keepRevision, staleRun } from "@/lib/runs/service";

export interface PossibleOwner {
  personId: string;
  name: string;
}

/** The members of the team who may own a run, by name. */
export function listPossibleOwners(actor: Actor): PossibleOwner[] {
  requirePermission(actor, "runs.read");
  return database()
    .select({ personId: people.id, name: people.name })
    .from(members)
    .innerJoin(people, eq(people.id, members.personId))
    .where(and(eq(members.teamId, actor.teamId), inArray(members.role, [...permissions["runs.write"]])))
    .orderBy(people.name)
    .all();
}

/** Whether the actor may give this run to somebody: its owner, and who keeps the team in order. */
export function mayHandOver(actor: Actor, run: Run): boolean {
  return may(actor, "runs.write") && (run.ownerId === actor.personId || may(actor, "team.tidy"));
}

/**
 * Gives a run another owner, in whatever state it is.
 * @param version - the version the actor has seen
 * @throws AppError `not_found`, `forbidden`, `stale` with the current run, `invalid_input` for a person who cannot own runs
 */
export function handOver(actor: Actor, runId: string, version: number, ownerId: string): Run {
  requirePermission(actor, "runs.write");
  return database().transaction(
    (tx) => {
      const before = getRun(actor, runId);
      if (!mayHandOver(actor, before))
        throw new AppError("forbidden", "A run is handed over by its owner, a librarian or an admin.");
      if (before.version !== version) throw staleRun(before);
      const owner = listPossibleOwners(actor).find(({ personId }) => personId === ownerId);
      if (!owner)
        throw new AppError("invalid_input", "The run was not handed over.", {
          ownerId: ["Nobody of the team with this id may own a run."],
        });
      if (owner.personId === before.ownerId) return before;
      const changedAt = new Date().toISOString();
      tx.update(runs)
        .set({ ownerId: owner.personId, version: version + 1, changedAt, changedById: actor.personId })
        .where(eq(runs.id, runId))
        .run();
      return keepRevision(actor, getRun(actor, runId), `Handed over from ${before.ownerName} to ${owner.name}.`);
    },
    { behavior: "immediate" },
  );
}
