/** How every step with an entry is answered: which version is meant, then the body, then the step. */
import type { Actor } from "@/lib/auth/actor";
import type { CableRevision } from "@/lib/cables/revisions/schema";
import { staleRevision } from "@/lib/cables/revisions/service";
import { entityTag, requireMatch } from "@/lib/http/etag";

interface Asked<Body> {
  actor: Actor;
  request: Request;
  params: { cableId: string };
  body: () => Promise<Body>;
}

export function revisionAnswer(revision: CableRevision, status = 200): Response {
  const headers = { ETag: entityTag(revision.version), "Cache-Control": "no-store" };
  return Response.json(revision, { status, headers });
}

/** @param meant - the revision that the step is taken with */
export async function stepAnswer<Body>(
  { actor, request, params: { cableId }, body }: Asked<Body>,
  meant: (actor: Actor, cableId: string) => CableRevision,
  step: (actor: Actor, cableId: string, version: number, given: Body) => CableRevision,
): Promise<Response> {
  const before = meant(actor, cableId);
  const version = requireMatch(request, before.version, () => staleRevision(before));
  return revisionAnswer(step(actor, cableId, version, await body()));
}
