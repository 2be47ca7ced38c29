/** Where a cable is used, as far as the reader may see. */
import { and, count, desc, eq, inArray } from "drizzle-orm";
import { database } from "@/db/client";
import { runCables, runs } from "@/db/schema/runs";
import type { Actor } from "@/lib/auth/actor";
import { requirePermission } from "@/lib/auth/permission";
import { visibleRuns } from "@/lib/auth/visibility/service";
import type { RunState } from "@/lib/runs/schema";
import { placesIn, type CableUse } from "@/lib/runs/uses";

export interface RunUse extends CableUse {
  runId: string;
  number: string;
  name: string;
  state: RunState;
}

/** The most runs that are told one by one. */
const most = 40;

/** The runs that use a cable, the last changed first: how many there are, and up to forty of them. */
export function listUses(actor: Actor, cableId: string): { total: number; items: RunUse[] } {
  requirePermission(actor, "runs.read");
  const db = database();
  const using = db.select({ runId: runCables.runId }).from(runCables).where(eq(runCables.cableId, cableId));
  const where = and(visibleRuns(actor), inArray(runs.id, using));
  const rows = db.select().from(runs).where(where).orderBy(desc(runs.changedAt), desc(runs.id)).limit(most).all();
  return {
    total: db.select({ total: count() }).from(runs).where(where).get()?.total ?? 0,
    items: rows.map(({ id, number, name, state, circuit }) => ({
      ...{ runId: id, number, name, state },
      ...placesIn(circuit, cableId),
    })),
  };
}
