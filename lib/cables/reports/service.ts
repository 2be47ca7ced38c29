/** "Something is wrong with this cable": said by anybody who may read it, settled by who reviews. */
import { and, count, desc, eq, isNull, type SQL } from "drizzle-orm";
import { alias } from "drizzle-orm/sqlite-core";
import { database } from "@/db/client";
import { cableReports } from "@/db/schema/cable-records";
import { cables } from "@/db/schema/cables";
import { people } from "@/db/schema/team";
import type { Actor } from "@/lib/auth/actor";
import { may, requirePermission } from "@/lib/auth/permission";
import { knownCables } from "@/lib/auth/visibility/service";
import type { CableReport, Settlement } from "@/lib/cables/reports/schema";
import { getCurrentRevision } from "@/lib/cables/revisions/service";
import { getCable } from "@/lib/cables/service";
import { decided, entryLink, quarantine } from "@/lib/cables/steps/service";
import { listReviewers } from "@/lib/cables/told/service";
import { AppError } from "@/lib/http/errors";
import { notify } from "@/lib/notices/service";

const settlers = alias(people, "settlers");
const mostOpen = 50;

/** Whoever reviews reads all; anybody else, what they have reported themselves. */
function find(actor: Actor, which: SQL | undefined): CableReport[] {
  requirePermission(actor, "cables.read");
  const own = may(actor, "cables.readUnapproved") ? undefined : eq(cableReports.personId, actor.personId);
  const { personId: _, settledById: __, ...columns } = reportColumns;
  return database()
    .select({ ...columns, designation: cables.designation, personName: people.name, settledByName: settlers.name })
    .from(cableReports)
    .innerJoin(cables, eq(cables.id, cableReports.cableId))
    .innerJoin(people, eq(people.id, cableReports.personId))
    .leftJoin(settlers, eq(settlers.id, cableReports.settledById))
    .where(and(knownCables(actor), own, which))
    .orderBy(desc(cableReports.reportedAt), desc(cableReports.id))
    .all();
}
const { id, cableId, revision, personId, reportedAt, text, settledAt, settledById, outcome, answer } = cableReports;
const reportColumns = { id, cableId, revision, personId, reportedAt, text, settledAt, settledById, outcome, answer };

/** The reports about an entry, the newest first. */
export function listReports(actor: Actor, ofCable: string): CableReport[] {
  return find(actor, eq(cableReports.cableId, ofCable));
}

/** The reports of the team's that nobody has settled. */
export function listOpenReports(actor: Actor): CableReport[] {
  return find(actor, isNull(cableReports.settledAt));
}

/** @throws AppError `not_found` */
export function getReport(actor: Actor, ofCable: string, reportId: string): CableReport {
  const [report] = find(actor, and(eq(cableReports.cableId, ofCable), eq(cableReports.id, reportId)));
  if (!report) throw new AppError("not_found", "There is no such report.");
  return report;
}

/**
 * Reports a problem with a cable; the reviewers are told.
 * @throws AppError `forbidden`, `not_found`; `conflict` where an entry has all the open reports it can hold
 */
export function report(actor: Actor, ofCable: string, said: string): CableReport {
  requirePermission(actor, "cables.report");
  return decided(() => {
    const { revision: shown, designation } = getCable(actor, ofCable);
    const isOpen = and(eq(cableReports.cableId, ofCable), isNull(cableReports.settledAt));
    const held = database().select({ n: count() }).from(cableReports).where(isOpen).get()?.n ?? 0;
    if (held >= mostOpen) throw new AppError("conflict", `${designation} has ${mostOpen} open reports already.`);
    const reportId = crypto.randomUUID();
    const row = { id: reportId, cableId: ofCable, revision: shown, personId: actor.personId, text: said };
    database()
      .insert(cableReports)
      .values({ ...row, reportedAt: new Date().toISOString() })
      .run();
    const sentence = `${actor.name} reported a problem with ${designation}: ${said}`;
    notify(actor, listReviewers(actor), { kind: "reported", text: sentence, link: entryLink(ofCable) });
    return getReport(actor, ofCable, reportId);
  });
}

/**
 * Settles a report; with the outcome `quarantined` the entry is quarantined with it. Who reported it is told.
 * @throws AppError `forbidden`, `not_found`; `conflict` where it is settled, or the entry cannot be quarantined
 */
export function settleReport(actor: Actor, ofCable: string, reportId: string, given: Settlement): CableReport {
  requirePermission(actor, "cables.review");
  return decided(() => {
    const before = getReport(actor, ofCable, reportId);
    if (before.settledAt !== null) throw new AppError("conflict", "This report is settled.");
    const current = getCurrentRevision(actor, ofCable);
    const isNew = given.outcome === "quarantined" && current.state !== "quarantined";
    if (isNew) quarantine(actor, ofCable, current.version, { note: before.text });
    const settled = { settledAt: new Date().toISOString(), settledById: actor.personId, ...given };
    database().update(cableReports).set(settled).where(eq(cableReports.id, reportId)).run();
    const reporter = database()
      .select({ by: cableReports.personId })
      .from(cableReports)
      .where(eq(cableReports.id, reportId))
      .get();
    const sentence = `Your report on ${before.designation} is settled: ${given.answer}`;
    if (reporter) notify(actor, [reporter.by], { kind: "settled", text: sentence, link: entryLink(ofCable) });
    return getReport(actor, ofCable, reportId);
  });
}
