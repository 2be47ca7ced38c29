/** Binding a run to the reels it is to be cut from. */
import { and, eq } from "drizzle-orm";
import { database } from "@/db/client";
import { cableLots, runReels } from "@/db/schema/cable-records";
import type { Actor } from "@/lib/auth/actor";
import { requirePermission } from "@/lib/auth/permission";
import { selectLots } from "@/lib/cables/lots/service";
import { listReferredCables } from "@/lib/cables/service";
import { AppError } from "@/lib/http/errors";
import type { ReelList } from "@/lib/runs/reels/schema";
import type { Run } from "@/lib/runs/schema";
import { getRun } from "@/lib/runs/service";

function reelsOf(actor: Actor, run: Run): ReelList {
  const bound = database()
    .select({ lotId: runReels.lotId, cableId: cableLots.cableId })
    .from(runReels)
    .innerJoin(cableLots, eq(cableLots.id, runReels.lotId))
    .where(eq(runReels.runId, run.id))
    .all();
  const cables = new Map(listReferredCables(actor, run.pinned).map((cable) => [cable.id, cable]));
  const items = bound.flatMap(({ lotId, cableId }) => {
    // A cable that the run no longer uses takes its reel with it.
    const cable = cables.get(cableId);
    const [lot] = cable ? selectLots(cableId, cable.model, lotId) : [];
    return cable && lot ? [{ cableId, designation: cable.designation, lot }] : [];
  });
  return { items };
}

/** @throws AppError `not_found` */
export function listReels(actor: Actor, runId: string): ReelList {
  requirePermission(actor, "runs.read");
  return reelsOf(actor, getRun(actor, runId));
}

/**
 * @throws AppError `not_found`; `invalid_input` where the run does not use the lot's cable; `conflict` where it is bound to
 * another reel of the same cable
 */
export function bindReel(actor: Actor, runId: string, lotId: string): ReelList {
  requirePermission(actor, "runs.write");
  return database().transaction(
    (tx) => {
      const run = getRun(actor, runId);
      const lot = tx.select().from(cableLots).where(eq(cableLots.id, lotId)).get();
      if (!lot || !run.pinned.some(({ cableId }) => cableId === lot.cableId))
        throw new AppError("invalid_input", "The run uses no cable with this lot.", {
          lotId: ["No lot of a cable that the run uses."],
        });
      const other = reelsOf(actor, run).items.find(({ cableId }) => cableId === lot.cableId);
      if (other && other.lot.id !== lotId)
        throw new AppError(
          "conflict",
          `The run is bound to lot ${other.lot.lot} of ${other.designation}; free it first.`,
        );
      tx.insert(runReels).values({ runId, lotId }).onConflictDoNothing().run();
      return reelsOf(actor, run);
    },
    { behavior: "immediate" },
  );
}

/** Freeing one that is not bound is no fault. @throws AppError `not_found` */
export function freeReel(actor: Actor, runId: string, lotId: string): void {
  requirePermission(actor, "runs.write");
  getRun(actor, runId);
  database()
    .delete(runReels)
    .where(and(eq(runReels.runId, runId), eq(runReels.lotId, lotId)))
    .run();
}
