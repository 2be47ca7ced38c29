/** Whether cables of a run have moved on since, and what taking their current revisions would change. */
import { and, eq, inArray, isNotNull } from "drizzle-orm";
import { database } from "@/db/client";
import { cableRevisions, cables } from "@/db/schema/cables";
import { runs } from "@/db/schema/runs";
import type { Actor } from "@/lib/auth/actor";
import { requirePermission } from "@/lib/auth/permission";
import { currentRevision } from "@/lib/cables/rows/service";
import { computeApart } from "@/lib/compute/apart/compute-apart";
import { computed } from "@/lib/compute/refuse";
import type { CableRef } from "@/lib/runs/circuit";
import type { AffectedRun } from "@/lib/runs/affected/schema";
import type { CableUses } from "@/lib/runs/effects/schema";
import { bothWays } from "@/lib/runs/effects/service";
import type { Pinned } from "@/lib/runs/pins";
import { getRun } from "@/lib/runs/service";

/** The cables of a run whose approved revision is a later one than the run uses. */
function movedOn(actor: Actor, pinned: Pinned): AffectedRun["cables"] {
  if (pinned.length === 0) return [];
  const ids = pinned.map(({ cableId }) => cableId);
  const rows = database()
    .select({
      cableId: cables.id,
      designation: cables.designation,
      current: cables.currentRevision,
      reason: cableRevisions.reason,
    })
    .from(cables)
    .innerJoin(cableRevisions, currentRevision)
    .where(and(eq(cables.teamId, actor.teamId), inArray(cables.id, ids), isNotNull(cableRevisions.approvedAt)))
    .all();
  return pinned.flatMap(({ cableId, revision: uses }) => {
    const row = rows.find((each) => each.cableId === cableId);
    return row && row.current > uses ? [{ ...row, uses }] : [];
  });
}

/** @throws AppError `forbidden`, `not_found` where the run is not theirs to see */
export async function getAffected(actor: Actor, runId: string): Promise<AffectedRun> {
  requirePermission(actor, "runs.read");
  const { pinned, state, ownerName } = getRun(actor, runId);
  const moved = movedOn(actor, pinned);
  const isAffected = moved.length > 0 && state !== "draft";
  const run = database().select().from(runs).where(eq(runs.id, runId)).get();
  if (moved.length === 0 || !run) return { isAffected, cables: moved, effect: null };
  const current = new Map(moved.map(({ cableId, current: revision }) => [cableId, revision]));
  const toCurrent = ({ cableId, revision }: CableRef) => ({ cableId, revision: current.get(cableId) ?? revision });
  const revisions = moved.map(({ uses }) => uses);
  const given = bothWays(actor, [{ run, ownerName }], toCurrent, () => ({ revisions, isAffected }));
  const [first] = moved;
  const uses = { cableId: first?.cableId ?? "", designation: first?.designation ?? "", revision: 1, total: 1 };
  const json = await computed(computeApart("effects", uses, given));
  const { items } = JSON.parse(new TextDecoder().decode(json)) as CableUses;
  return { isAffected, cables: moved, effect: items[0] ?? null };
}
