/** Approving a revision: the one step by which the values people see change. */
import { eq } from "drizzle-orm";
import { database } from "@/db/client";
import { cables } from "@/db/schema/cables";
import type { Actor } from "@/lib/auth/actor";
import { contradictions, unanswered } from "@/lib/cables/decision";
import type { CableRevision } from "@/lib/cables/revisions/schema";
import { getCurrentRevision } from "@/lib/cables/revisions/service";
import type { Approval } from "@/lib/cables/steps/schema";
import { decided, entryLink, getDecidable, take } from "@/lib/cables/steps/service";
import { tellOwners } from "@/lib/cables/told/service";
import { AppError } from "@/lib/http/errors";
import { notify } from "@/lib/notices/service";
import { reviewDueAt } from "@/lib/team/rules";
import { rulesInForce } from "@/lib/team/rules/service";

/** @throws AppError `conflict` for a contradiction; `invalid_input` for a check to look at that has no answer */
function requireAgreement({ checks }: CableRevision, answers: Record<string, string>): void {
  const against = contradictions(checks);
  if (against.length > 0) {
    const fields = Object.fromEntries(against.map(({ check, sentence }) => [`checks.${check}`, [sentence]]));
    const said = against.map(({ check, sentence }) => `${check}: ${sentence}`).join(" ");
    throw new AppError("conflict", `An entry that contradicts itself is not approved. ${said}`, fields);
  }
  const open = unanswered(checks, answers);
  if (open.length > 0)
    throw new AppError(
      "invalid_input",
      "What the checks ask has to be answered first.",
      Object.fromEntries(
        open.map(({ check, sentence }) => [`answers.${check}`, [`Say what you make of it: ${sentence}`]]),
      ),
    );
}

/** Ends the revision that the approved one takes the place of. */
function endFormer(actor: Actor, former: CableRevision, approved: CableRevision): void {
  const ended = { note: `Revision ${approved.revision} was approved in its place.`, condition: former.condition };
  take(actor, "supersede", former, ended);
  const text = `${approved.designation} has a new revision ${approved.revision}: ${approved.reason} Revision ${former.revision} no longer goes into new runs.`;
  tellOwners(actor, approved.id, { kind: "superseded", text, revision: former.revision });
}

/**
 * Approves the revision in review. The one before is superseded; its restriction carries over unless told otherwise.
 * @throws AppError `not_found`, `forbidden`, `stale`; `conflict` where it is not in review, contradicts itself or the
 *   entry has ended meanwhile; `invalid_input` for a check to look at that has no answer
 */
export function approve(actor: Actor, cableId: string, version: number, given: Approval): CableRevision {
  return decided(() => {
    const revision = getDecidable(actor, cableId, version, "approve");
    const former = getCurrentRevision(actor, cableId);
    const isFirst = former.revision === revision.revision;
    if (!isFirst && (former.state === "superseded" || former.state === "withdrawn"))
      throw new AppError("conflict", `${former.designation} was ${former.state} meanwhile; it takes no new revision.`);
    if (revision.state === "inReview") requireAgreement(revision, given.answers);
    const at = new Date().toISOString();
    const condition = given.condition === undefined && !isFirst ? former.condition : (given.condition ?? null);
    const { note, answers } = given;
    const changed = { approvedById: actor.personId, approvedAt: at };
    const approved = take(actor, "approve", revision, { note, answers, condition, changed });
    database()
      .update(cables)
      .set({ currentRevision: approved.revision, reviewDueAt: reviewDueAt(at, rulesInForce(actor)) })
      .where(eq(cables.id, cableId))
      .run();
    const after = { ...approved, isCurrent: true };
    if (!isFirst) endFormer(actor, former, after);
    const text = `${actor.name} approved revision ${approved.revision} of ${approved.designation}.`;
    notify(actor, [revision.authorId], { kind: "approved", text, link: entryLink(cableId) });
    return after;
  });
}
