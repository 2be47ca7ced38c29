/** The demo's runs. */
import { and, eq, lte, max, or, sql } from "drizzle-orm";
import { database } from "@/db/client";
import { cableRevisions } from "@/db/schema/cables";
import { runAssignees, runCables, runRevisions, runs } from "@/db/schema/runs";
import { people, teams } from "@/db/schema/team";
import { cableIdsOf } from "@/lib/runs/circuit";
import { newRunSchema, runSchema, type Run } from "@/lib/runs/schema";
import data from "@/seeds/data/runs.json";
import team from "@/seeds/data/team.json";

type Seed = (typeof data.runs)[number];

/** The revision of a cable that was approved last when a run was started; a later one leaves the run as it is. */
function revisionThen(cableId: string, startedAt: string): number {
  const approved = and(eq(cableRevisions.cableId, cableId), lte(cableRevisions.approvedAt, startedAt));
  const row = database()
    .select({ revision: max(cableRevisions.revision) })
    .from(cableRevisions)
    .where(approved)
    .get();
  return row?.revision ?? 1;
}

/** The run as the product describes it; the schemas check that the seed is one it would accept. */
function runOf(seed: Seed, ownerName: string): Run {
  const { id, number, ownerId, state, condition, startedAt, assignees: _assignees, ...content } = seed;
  const pinned = cableIdsOf(newRunSchema.parse(content).circuit).map((cableId) => ({
    cableId,
    revision: revisionThen(cableId, startedAt),
  }));
  return runSchema.parse({
    ...{ ...content, id, number, state, condition, ownerId, ownerName, version: 1 },
    ...{ changedAt: startedAt, changedByName: ownerName, pinned },
  });
}

/** Adds the runs that are missing. */
export function seedRuns(): void {
  database().transaction((tx) => {
    for (const seed of data.runs) {
      // A number that somebody has used meanwhile is theirs: the demo's run stays out.
      const isTaken = or(eq(runs.id, seed.id), and(eq(runs.teamId, team.team.id), eq(runs.number, seed.number)));
      if (tx.select({ id: runs.id }).from(runs).where(isTaken).get()) continue;
      const owner = tx.select({ name: people.name }).from(people).where(eq(people.id, seed.ownerId)).get();
      if (!owner) throw new Error(`seedRuns: no person ${seed.ownerId}`);
      const run = runOf(seed, owner.name);
      const { ownerName: _ownerName, changedByName: _changedByName, pinned, ...row } = run;
      tx.insert(runs)
        .values({ ...row, teamId: team.team.id, createdAt: seed.startedAt, changedById: seed.ownerId })
        .run();
      tx.insert(runCables)
        .values(pinned.map((pin) => ({ runId: run.id, ...pin })))
        .run();
      tx.insert(runRevisions)
        .values({
          ...{ runId: run.id, version: 1, savedAt: seed.startedAt, savedById: seed.ownerId },
          ...{ sentence: "Started the run.", content: run },
        })
        .run();
      for (const personId of seed.assignees) tx.insert(runAssignees).values({ runId: run.id, personId }).run();
      tx.update(teams)
        .set({ nextRunNumber: sql`max(${teams.nextRunNumber}, ${Number(seed.number.slice(1)) + 1})` })
        .where(eq(teams.id, team.team.id))
        .run();
    }
  });
}
