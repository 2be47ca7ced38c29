/** Waivers, given and taken back by who reviews. */
import { and, desc, eq, gte, isNull } from "drizzle-orm";
import { database } from "@/db/client";
import { cableWaivers } from "@/db/schema/cable-records";
import { runs } from "@/db/schema/runs";
import { people } from "@/db/schema/team";
import type { Actor } from "@/lib/auth/actor";
import { requirePermission } from "@/lib/auth/permission";
import { visibleRuns } from "@/lib/auth/visibility/service";
import { getCurrentRevision } from "@/lib/cables/revisions/service";
import { getCable } from "@/lib/cables/service";
import { decided } from "@/lib/cables/steps/service";
import { holdsOn, type NewWaiver, today, type Waiver } from "@/lib/cables/waivers/schema";
import { AppError } from "@/lib/http/errors";

/** The waivers of an entry for runs that the actor may see, the newest first. */
export function listWaivers(actor: Actor, cableId: string): Waiver[] {
  getCable(actor, cableId);
  const rows = database()
    .select({ waiver: cableWaivers, runNumber: runs.number, runName: runs.name, givenByName: people.name })
    .from(cableWaivers)
    .innerJoin(runs, eq(runs.id, cableWaivers.runId))
    .innerJoin(people, eq(people.id, cableWaivers.givenById))
    .where(and(visibleRuns(actor), eq(cableWaivers.cableId, cableId)))
    .orderBy(desc(cableWaivers.givenAt), desc(cableWaivers.id))
    .all();
  return rows.map(({ waiver, ...names }) => {
    const { id, runId, reason, until, givenAt, endedAt } = waiver;
    return { id, runId, ...names, reason, until, givenAt, endedAt, holds: holdsOn(waiver, today()) };
  });
}

function getWaiver(actor: Actor, cableId: string, waiverId: string): Waiver {
  const waiver = listWaivers(actor, cableId).find(({ id }) => id === waiverId);
  if (!waiver) throw new AppError("not_found", "There is no such waiver.");
  return waiver;
}

const refused = (field: keyof NewWaiver, sentence: string) =>
  new AppError("invalid_input", "The waiver was not given.", { [field]: [sentence] });

/**
 * Lets a run have a cable until a date.
 * @throws AppError `forbidden`, `not_found`; `conflict` for a cable that needs none or was never approved; `invalid_input`
 *   for a run that is not there or an end that has passed
 */
export function giveWaiver(actor: Actor, cableId: string, { runId, reason, until }: NewWaiver): Waiver {
  requirePermission(actor, "cables.review");
  return decided(() => {
    const { state, designation, approvedAt } = getCurrentRevision(actor, cableId);
    if (state === "approved") throw new AppError("conflict", `${designation} is approved: any run may have it.`);
    // A row brought in may be quarantined without ever having been approved.
    if (approvedAt === null) throw new AppError("conflict", `${designation} was never approved; review it instead.`);
    const run = database()
      .select({ id: runs.id })
      .from(runs)
      .where(and(visibleRuns(actor), eq(runs.id, runId)))
      .get();
    if (!run) throw refused("runId", "There is no such run.");
    if (until < today()) throw refused("until", "This day has passed.");
    const id = crypto.randomUUID();
    const given = { givenById: actor.personId, givenAt: new Date().toISOString() };
    database()
      .insert(cableWaivers)
      .values({ id, cableId, runId, reason, until, ...given })
      .run();
    return getWaiver(actor, cableId, id);
  });
}

/**
 * Takes a waiver back before its end.
 * @throws AppError `forbidden`, `not_found`; `conflict` where it was taken back already
 */
export function endWaiver(actor: Actor, cableId: string, waiverId: string): Waiver {
  requirePermission(actor, "cables.review");
  return decided(() => {
    if (getWaiver(actor, cableId, waiverId).endedAt !== null)
      throw new AppError("conflict", "This waiver was taken back already.");
    database()
      .update(cableWaivers)
      .set({ endedAt: new Date().toISOString() })
      .where(eq(cableWaivers.id, waiverId))
      .run();
    return getWaiver(actor, cableId, waiverId);
  });
}

/** The cables that a run may have by a waiver that holds today. */
export function listWaivedCables(runId: string): Set<string> {
  const holds = and(eq(cableWaivers.runId, runId), isNull(cableWaivers.endedAt), gte(cableWaivers.until, today()));
  const rows = database().select({ cableId: cableWaivers.cableId }).from(cableWaivers).where(holds).all();
  return new Set(rows.map(({ cableId }) => cableId));
}
