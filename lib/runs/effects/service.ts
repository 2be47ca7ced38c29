/** Finds the runs that use a cable, and has them worked out with another revision of it. */
import { and, count, desc, eq, inArray } from "drizzle-orm";
import { database } from "@/db/client";
import { runCables, runs } from "@/db/schema/runs";
import { people } from "@/db/schema/team";
import type { Actor } from "@/lib/auth/actor";
import { may, requirePermission } from "@/lib/auth/permission";
import { visibleRuns } from "@/lib/auth/visibility/service";
import { getCurrentRevision, getRevision } from "@/lib/cables/revisions/service";
import type { Cable } from "@/lib/cables/schema";
import { cableFinder } from "@/lib/cables/service";
import { computeApart } from "@/lib/compute/apart/compute-apart";
import { computed } from "@/lib/compute/refuse";
import type { Circuit as EngineCircuit } from "@/lib/line/element";
import { cableRefsOf, type CableRef, resolveCircuit } from "@/lib/runs/circuit";
import type { RunBothWays } from "@/lib/runs/effects/answer";
import { type Pinned, pinnedRef } from "@/lib/runs/pins";

/** The most runs that are worked out at once. */
const most = 500;

type Row = { run: typeof runs.$inferSelect; ownerName: string };
type Find = (ref: CableRef) => Cable | undefined;

/** The runs of the actor's to see that use a cable, the last changed first. */
function findUsing(actor: Actor, cableId: string): { total: number; rows: Row[] } {
  const db = database();
  const using = db.select({ runId: runCables.runId }).from(runCables).where(eq(runCables.cableId, cableId));
  const isOwn = may(actor, "cables.readUnapproved") ? undefined : eq(runs.ownerId, actor.personId);
  const where = and(visibleRuns(actor), inArray(runs.id, using), isOwn);
  const rows = db
    .select({ run: runs, ownerName: people.name })
    .from(runs)
    .innerJoin(people, eq(people.id, runs.ownerId))
    .where(where)
    .orderBy(desc(runs.changedAt), desc(runs.id))
    .limit(most)
    .all();
  return { total: db.select({ total: count() }).from(runs).where(where).get()?.total ?? 0, rows };
}

function pinsOf(runIds: string[]): Map<string, Pinned> {
  const rows = database().select().from(runCables).where(inArray(runCables.runId, runIds)).all();
  const pins = new Map<string, Pinned>(runIds.map((id) => [id, []]));
  for (const { runId, cableId, revision } of rows) pins.get(runId)?.push({ cableId, revision });
  return pins;
}

/** A run's circuit with its lines found; a line that is none where one is not, which the engine refuses. */
function found({ circuit }: Row["run"], toRevision: (ref: CableRef) => CableRef, find: Find): EngineCircuit {
  const resolved = resolveCircuit(circuit, (ref) => {
    const cable = find(toRevision(ref));
    return cable && { cableId: cable.id, revision: cable.revision, label: cable.designation, model: cable.model };
  });
  if ("circuit" in resolved) return resolved.circuit;
  throw new Error(`found: ${resolved.faults.map(({ path }) => path).join(", ")} of a run lead nowhere`);
}

/** Runs as they stand and as `toRevision` would have them. */
export function bothWays(
  actor: Actor,
  rows: readonly Row[],
  toRevision: (ref: CableRef) => CableRef,
  about: (row: Row, pins: Pinned) => Pick<RunBothWays["about"], "revisions" | "isAffected">,
): RunBothWays[] {
  const pins = pinsOf(rows.map(({ run }) => run.id));
  const find = cableFinder(
    actor,
    rows.flatMap(({ run }) => cableRefsOf(run.circuit).map(({ ref }) => ref)),
  );
  return rows.map((row) => {
    const { id: runId, number, name, state, targets, designHz, bandHz, availablePowerW, temperatureC } = row.run;
    const pinned = pins.get(runId) ?? [];
    const asPinned = (ref: CableRef) => pinnedRef(ref, pinned);
    return {
      about: { runId, number, name, state, ownerName: row.ownerName, ...about(row, pinned) },
      ...{ targets, conditions: { designHz, bandHz, availablePowerW, temperatureC } },
      now: found(row.run, asPinned, find),
      then: found(row.run, (ref) => toRevision(asPinned(ref)), find),
    };
  });
}

/**
 * Where a cable is used, worked out with a revision of it; without one, with that people see.
 * @returns JSON
 * @throws AppError `forbidden`, `not_found`; `invalid_input` where it takes too long
 */
export function computeUses(actor: Actor, cableId: string, asked?: number): Promise<Uint8Array<ArrayBuffer>> {
  requirePermission(actor, "cables.readUses");
  const current = getCurrentRevision(actor, cableId);
  const { revision, designation } = asked === undefined ? current : getRevision(actor, cableId, asked);
  const { total, rows } = findUsing(actor, cableId);
  const toRevision = (ref: CableRef) => (ref.cableId === cableId ? { cableId, revision } : ref);
  const given = bothWays(actor, rows, toRevision, ({ run }, pins) => {
    const revisions = pins.filter((pin) => pin.cableId === cableId).map((pin) => pin.revision);
    const isBehind = current.approvedAt !== null && revisions.some((each) => each < current.revision);
    return { revisions, isAffected: run.state !== "draft" && isBehind };
  });
  return computed(computeApart("effects", { cableId, designation, revision, total }, given));
}
