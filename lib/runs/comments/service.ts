/** Comments on runs. Whoever may see a run reads them; nobody changes what was said. */
import { asc, count, eq } from "drizzle-orm";
import { database } from "@/db/client";
import { runComments } from "@/db/schema/runs";
import { people } from "@/db/schema/team";
import type { Actor } from "@/lib/auth/actor";
import { requirePermission } from "@/lib/auth/permission";
import { AppError } from "@/lib/http/errors";
import type { Comment } from "@/lib/runs/comments/schema";
import { getRun } from "@/lib/runs/service";

const mostComments = 500;

/** @throws AppError `not_found` where the run is not theirs to see */
export function listComments(actor: Actor, runId: string): Comment[] {
  getRun(actor, runId);
  return database()
    .select({ id: runComments.id, personName: people.name, saidAt: runComments.saidAt, text: runComments.text })
    .from(runComments)
    .innerJoin(people, eq(people.id, runComments.personId))
    .where(eq(runComments.runId, runId))
    .orderBy(asc(runComments.saidAt), asc(runComments.id))
    .all();
}

/** @throws AppError `forbidden`, `not_found`; `conflict` where a run has all the comments it can hold */
export function addComment(actor: Actor, runId: string, text: string): Comment {
  requirePermission(actor, "runs.comment");
  getRun(actor, runId);
  const held = database().select({ n: count() }).from(runComments).where(eq(runComments.runId, runId)).get()?.n ?? 0;
  if (held >= mostComments) throw new AppError("conflict", `A run holds at most ${mostComments} comments.`);
  const comment = { id: crypto.randomUUID(), saidAt: new Date().toISOString(), text };
  database()
    .insert(runComments)
    .values({ ...comment, runId, personId: actor.personId })
    .run();
  return { ...comment, personName: actor.name };
}
