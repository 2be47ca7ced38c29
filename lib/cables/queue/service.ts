/** What waits for the team's reviewers: revisions in review, entries due for another look, problems reported. */
import { and, asc, count, desc, eq, inArray, lte } from "drizzle-orm";
import { alias } from "drizzle-orm/sqlite-core";
import { database } from "@/db/client";
import { cableEvents } from "@/db/schema/cable-records";
import { cableRevisions, cables } from "@/db/schema/cables";
import { people } from "@/db/schema/team";
import type { Actor } from "@/lib/auth/actor";
import { may, requirePermission } from "@/lib/auth/permission";
import { cannotDecide } from "@/lib/cables/decision";
import { listEditors } from "@/lib/cables/events/service";
import type { DueEntry, ReviewQueue, SettledRevision, WaitingRevision } from "@/lib/cables/queue/schema";
import { listOpenReports } from "@/lib/cables/reports/service";
import { countGiven, differences } from "@/lib/cables/revisions/differences";
import { getCurrentRevision, getRevision } from "@/lib/cables/revisions/service";
import { currentRevision } from "@/lib/cables/rows/service";
import { rulesInForce } from "@/lib/team/rules/service";

const most = 200;
const fewLately = 8;
const lookAheadDays = 90;

const open = alias(cableRevisions, "open_revisions");

const inReview = (actor: Actor) => and(eq(cables.teamId, actor.teamId), eq(open.state, "inReview"));

/** How many revisions wait for a reviewer; 0 for those who do not review. */
export function countWaiting(actor: Actor): number {
  if (!may(actor, "cables.review")) return 0;
  const db = database();
  const rows = db.select({ n: count() }).from(open).innerJoin(cables, eq(cables.id, open.cableId));
  return rows.where(inReview(actor)).get()?.n ?? 0;
}

function listWaiting(actor: Actor): WaitingRevision[] {
  const rules = rulesInForce(actor);
  const rows = database()
    .select({ designation: cables.designation, current: cableRevisions, revision: open, authorName: people.name })
    .from(open)
    .innerJoin(cables, eq(cables.id, open.cableId))
    .innerJoin(cableRevisions, currentRevision)
    .innerJoin(people, eq(people.id, open.authorId))
    .where(inReview(actor))
    .orderBy(asc(open.submittedAt), asc(open.cableId))
    .limit(most)
    .all();
  return rows.map(({ designation, current, revision, authorName }) => {
    const { cableId, family, construction, build, outerDiameterMm, authorId, createdAt } = revision;
    const isNew = current.revision === revision.revision;
    const writers = [authorId, ...listEditors(cableId, revision.revision)];
    return {
      ...{
        cableId,
        designation,
        revision: revision.revision,
        family,
        construction,
        build,
        outerDiameterMm,
        authorName,
      },
      submittedAt: revision.submittedAt ?? createdAt,
      changedFields: isNew ? null : countGiven(differences(current, revision)),
      refusal: cannotDecide(actor, "approve", writers, rules),
    };
  });
}

function listSettled(actor: Actor): SettledRevision[] {
  return database()
    .select({
      cableId: cables.id,
      designation: cables.designation,
      revision: cableEvents.revision,
      at: cableEvents.at,
      personName: people.name,
      step: cableEvents.step,
    })
    .from(cableEvents)
    .innerJoin(cables, eq(cables.id, cableEvents.cableId))
    .innerJoin(people, eq(people.id, cableEvents.personId))
    .where(and(eq(cables.teamId, actor.teamId), inArray(cableEvents.step, ["approve", "return"])))
    .orderBy(desc(cableEvents.at), desc(cableEvents.id))
    .limit(fewLately)
    .all();
}

function listDue(actor: Actor): DueEntry[] {
  const now = new Date();
  const until = new Date(now.getTime() + lookAheadDays * 86_400_000).toISOString();
  const rows = database()
    .select({
      cableId: cables.id,
      designation: cables.designation,
      revision: cables.currentRevision,
      due: cables.reviewDueAt,
    })
    .from(cables)
    .where(and(eq(cables.teamId, actor.teamId), lte(cables.reviewDueAt, until)))
    .orderBy(asc(cables.reviewDueAt), asc(cables.id))
    .limit(most)
    .all();
  return rows.flatMap(({ due, ...entry }) =>
    due === null ? [] : [{ ...entry, reviewDueAt: due, isOverdue: due <= now.toISOString() }],
  );
}

/** @throws AppError `forbidden` */
export function getQueue(actor: Actor): ReviewQueue {
  requirePermission(actor, "cables.readUnapproved");
  const waiting = listWaiting(actor);
  const db = database();
  const total = db.select({ n: count() }).from(open).innerJoin(cables, eq(cables.id, open.cableId));
  return {
    waiting,
    waitingTotal: total.where(inReview(actor)).get()?.n ?? waiting.length,
    settled: listSettled(actor),
    due: listDue(actor),
    reports: listOpenReports(actor),
  };
}

/**
 * A revision in review with what it takes the place of, and why the actor may not decide on it; null where nothing of the
 * entry is in review, or not any more.
 */
export function getReviewed(actor: Actor, cableId: string) {
  requirePermission(actor, "cables.readUnapproved");
  const row = database()
    .select({ revision: open.revision })
    .from(open)
    .innerJoin(cables, eq(cables.id, open.cableId))
    .where(and(inReview(actor), eq(cables.id, cableId)))
    .get();
  if (!row) return null;
  const after = getRevision(actor, cableId, row.revision);
  const before = after.isCurrent ? null : getCurrentRevision(actor, cableId);
  const writers = [after.authorId, ...listEditors(cableId, row.revision)];
  const rules = rulesInForce(actor);
  const refusals = {
    approve: cannotDecide(actor, "approve", writers, rules),
    return: cannotDecide(actor, "return", writers, rules),
  };
  return { before, after, refusals };
}
