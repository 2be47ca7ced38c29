/** How an entry stood on any day. */
import { asc, eq } from "drizzle-orm";
import { database } from "@/db/client";
import { cableEvents } from "@/db/schema/cable-records";
import { cableRevisions } from "@/db/schema/cables";
import type { Actor } from "@/lib/auth/actor";
import { endOf, standingAt } from "@/lib/cables/history/on-day";
import { cableOf } from "@/lib/cables/revisions/schema";
import { getRevision } from "@/lib/cables/revisions/service";
import type { Cable } from "@/lib/cables/schema";
import { getCable } from "@/lib/cables/service";
import { AppError } from "@/lib/http/errors";

type Step = Parameters<typeof standingAt>[0][number];

/** What the record of a revision's steps lacks because the revision is older than it, as much as its row tells. */
function untold(row: typeof cableRevisions.$inferSelect, told: readonly Step[]): Step[] {
  const { revision, createdAt, approvedAt, state, condition } = row;
  const steps = new Set(told.filter((each) => each.revision === revision).map(({ step }) => step));
  // Without a single step on record the revision still is what it became.
  const became = steps.size === 0 ? { state, condition } : { state: "approved" as const, condition: null };
  const begun: Step = { revision, at: createdAt, step: "begin", state: "draft", condition: null };
  if (approvedAt === null) return steps.has("begin") ? [] : [{ ...begun, state: steps.size === 0 ? state : "draft" }];
  return [
    ...(steps.has("begin") ? [] : [begun]),
    ...(steps.has("approve") ? [] : [{ revision, at: approvedAt, step: "approve" as const, ...became }]),
  ];
}

function stepsOf(cableId: string): Step[] {
  const ofCable = eq(cableEvents.cableId, cableId);
  const told = database().select().from(cableEvents).where(ofCable).orderBy(asc(cableEvents.id)).all();
  const rows = database().select().from(cableRevisions).where(eq(cableRevisions.cableId, cableId)).all();
  return [...rows.flatMap((row) => untold(row, told)), ...told].sort((a, b) => a.at.localeCompare(b.at));
}

/**
 * An entry as people saw it at the end of a day of UTC.
 * @throws AppError `not_found` where there was none yet, or none the actor may know of; `forbidden` for somebody's draft
 */
export function getCableOn(actor: Actor, cableId: string, day: string): Cable {
  const now = getCable(actor, cableId);
  const standing = standingAt(stepsOf(cableId), endOf(day));
  if (!standing) throw new AppError("not_found", `There was no such cable on ${day}.`);
  const cable = cableOf(getRevision(actor, cableId, standing.revision));
  const { state, condition, preferred } = standing;
  const successor = state === "superseded" && standing.revision === now.revision ? now.successor : null;
  return { ...cable, state, condition, preferred, successor };
}
