/** Runs: read, created, changed, removed. Each save is kept as a revision. */
import { and, eq, sql } from "drizzle-orm";
import { alias } from "drizzle-orm/sqlite-core";
import { database } from "@/db/client";
import { runRevisions, runs } from "@/db/schema/runs";
import { people, teams } from "@/db/schema/team";
import type { Actor } from "@/lib/auth/actor";
import { requirePermission } from "@/lib/auth/permission";
import { visibleRuns } from "@/lib/auth/visibility/service";
import { AppError } from "@/lib/http/errors";
import { entityTag } from "@/lib/http/etag";
import { draftOf } from "@/lib/runs/edit";
import { listPinned, pinCables, replacePinned } from "@/lib/runs/cables/service";
import { saveSentence } from "@/lib/runs/revision";
import type { NewRun, Run, RunChange } from "@/lib/runs/schema";

const owners = alias(people, "owners");
const changers = alias(people, "changers");

/**
 * One run.
 * @throws AppError `not_found`: unknown, another team's, or not given to this installer
 */
export function getRun(actor: Actor, runId: string): Run {
  requirePermission(actor, "runs.read");
  const row = database()
    .select({ run: runs, ownerName: owners.name, changedByName: changers.name })
    .from(runs)
    .innerJoin(owners, eq(owners.id, runs.ownerId))
    .innerJoin(changers, eq(changers.id, runs.changedById))
    .where(and(visibleRuns(actor), eq(runs.id, runId)))
    .get();
  if (!row) throw new AppError("not_found", "There is no such run.");
  const { ownerName, changedByName } = row;
  const { id, number, state, condition, ownerId, version, changedAt } = row.run;
  return {
    ...{ id, number, ...draftOf(row.run) },
    ...{ state, condition, ownerId, ownerName, version, changedAt, changedByName },
    pinned: listPinned(id),
  };
}

/** Keeps the run as it now stands, whole. */
export function keepRevision(actor: Actor, run: Run, sentence: string): Run {
  database()
    .insert(runRevisions)
    .values({
      runId: run.id,
      version: run.version,
      savedAt: run.changedAt,
      savedById: actor.personId,
      sentence,
      content: run,
    })
    .run();
  return run;
}

/** The middle of the band, else of the first target's band; 10 MHz where nobody has named a frequency yet. */
function designFrequency(input: NewRun): number {
  const band = input.bandHz ?? input.targets.find((target) => target.bandHz)?.bandHz;
  return input.designHz ?? (band ? (band[0] + band[1]) / 2 : 10e6);
}

function nextNumber(teamId: string): string {
  const row = database()
    .update(teams)
    .set({ nextRunNumber: sql`${teams.nextRunNumber} + 1` })
    .where(eq(teams.id, teamId))
    .returning({ next: teams.nextRunNumber })
    .get();
  if (!row) throw new Error(`nextNumber: no team ${teamId}`);
  return `R${row.next - 1}`;
}

/**
 * Starts a run, owned by the actor.
 * @throws AppError `forbidden`; `invalid_input` where a cable cannot be used
 */
export function createRun(actor: Actor, input: NewRun): Run {
  requirePermission(actor, "runs.write");
  return database().transaction(
    (tx) => {
      const pinned = pinCables(actor, input.circuit, []);
      const now = new Date().toISOString();
      const id = crypto.randomUUID();
      tx.insert(runs)
        .values({
          ...input,
          id,
          teamId: actor.teamId,
          number: nextNumber(actor.teamId),
          state: "draft",
          ownerId: actor.personId,
          designHz: designFrequency(input),
          version: 1,
          createdAt: now,
          changedAt: now,
          changedById: actor.personId,
        })
        .run();
      replacePinned(id, pinned);
      return keepRevision(actor, getRun(actor, id), "Started the run.");
    },
    { behavior: "immediate" },
  );
}

/** The refusal to write over what somebody else has saved; it carries the run as it now stands. */
export function staleRun(current: Run): AppError {
  const message = `${current.changedByName} saved this run meanwhile. Nothing of yours was written; both versions are still there.`;
  return new AppError("stale", message, {}, { headers: { ETag: entityTag(current.version) }, members: { current } });
}

/** The run, when the actor may change it in this version. */
function getChangeable(actor: Actor, runId: string, version: number): Run {
  requirePermission(actor, "runs.write");
  const run = getRun(actor, runId);
  if (run.version !== version) throw staleRun(run);
  if (run.state !== "draft")
    throw new AppError("conflict", `${run.number} is issued: its sheet is out, so it no longer changes.`);
  return run;
}

/**
 * Changes the fields given and leaves the rest. A change that changes nothing is not a save.
 * @param version - the version the change was made to
 * @throws AppError `not_found`, `forbidden`, `stale` with the current run, `conflict` once issued, `invalid_input`
 */
export function updateRun(actor: Actor, runId: string, version: number, change: RunChange): Run {
  return database().transaction(
    (tx) => {
      const before = getChangeable(actor, runId, version);
      const pinned = pinCables(actor, change.circuit ?? before.circuit, before.pinned, runId);
      const sentence = saveSentence(before, { ...before, ...change });
      if (sentence === undefined) return before;
      const changedAt = new Date().toISOString();
      const stamp = { version: version + 1, changedAt, changedById: actor.personId };
      tx.update(runs)
        .set({ ...change, ...stamp })
        .where(eq(runs.id, runId))
        .run();
      replacePinned(runId, pinned);
      return keepRevision(actor, getRun(actor, runId), sentence);
    },
    { behavior: "immediate" },
  );
}

/**
 * Takes a run out of sight; its number is not given again and its history stays.
 * @throws AppError as `updateRun`
 */
export function deleteRun(actor: Actor, runId: string, version: number): void {
  database().transaction(
    (tx) => {
      getChangeable(actor, runId, version);
      const removedAt = new Date().toISOString();
      tx.update(runs).set({ removedAt, removedById: actor.personId }).where(eq(runs.id, runId)).run();
    },
    { behavior: "immediate" },
  );
}
