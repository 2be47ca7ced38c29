/** Whom what happens to an entry concerns: those who review, and those whose runs use it. */
import { and, eq, inArray, isNull } from "drizzle-orm";
import { database } from "@/db/client";
import { runCables, runs } from "@/db/schema/runs";
import { members } from "@/db/schema/team";
import type { Actor } from "@/lib/auth/actor";
import { permissions } from "@/lib/auth/permission";
import { notify, type NoticeKind } from "@/lib/notices/service";
import { rulesInForce } from "@/lib/team/rules/service";

/** The members of the actor's team who may decide on a revision. */
export function listReviewers(actor: Actor): string[] {
  const { mayAdminsApprove } = rulesInForce(actor);
  const roles = permissions["cables.review"].filter((role) => role !== "admin" || mayAdminsApprove);
  return database()
    .select({ personId: members.personId })
    .from(members)
    .where(and(eq(members.teamId, actor.teamId), inArray(members.role, roles)))
    .all()
    .map(({ personId }) => personId);
}

/** "R1", "R1 and R4", "R1, R4 and 3 more". */
function listed(numbers: string[]): string {
  if (numbers.length > 4) return `${numbers.slice(0, 3).join(", ")} and ${numbers.length - 3} more`;
  return numbers.length > 1 ? `${numbers.slice(0, -1).join(", ")} and ${numbers.at(-1)}` : (numbers[0] ?? "");
}

interface Told {
  kind: NoticeKind;
  /** a sentence; the runs it concerns are named after it */
  text: string;
  /** only runs that use this revision; else in whatever revision */
  revision?: number;
}

/** Tells the owners of the runs that use a cable, each once with their runs. Call inside the transaction of what is told. */
export function tellOwners(actor: Actor, cableId: string, { kind, text, revision }: Told): void {
  const uses = database()
    .selectDistinct({ ownerId: runs.ownerId, number: runs.number })
    .from(runCables)
    .innerJoin(runs, eq(runs.id, runCables.runId))
    .where(
      and(
        ...[eq(runCables.cableId, cableId), eq(runs.teamId, actor.teamId), isNull(runs.removedAt)],
        revision === undefined ? undefined : eq(runCables.revision, revision),
      ),
    )
    .orderBy(runs.createdAt)
    .all();
  const link = `/cables/${encodeURIComponent(cableId)}`;
  for (const ownerId of new Set(uses.map((use) => use.ownerId))) {
    const numbers = uses.filter((use) => use.ownerId === ownerId).map(({ number }) => number);
    notify(actor, [ownerId], { kind, text: `${text} Used in ${listed(numbers)}.`, link });
  }
}
