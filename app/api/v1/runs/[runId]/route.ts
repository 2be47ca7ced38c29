import { entityTag, requireMatch } from "@/lib/http/etag";
import { handle, route } from "@/lib/http/handle";
import { changeRun, readRun, removeRun } from "@/lib/runs/operations";
import { deleteRun, getRun, staleRun, updateRun } from "@/lib/runs/service";

export const { GET, POST, PUT, PATCH, DELETE, OPTIONS } = route({
  GET: handle(readRun, ({ actor, params }) => {
    const run = getRun(actor, params.runId);
    return Response.json(run, { headers: { ETag: entityTag(run.version), "Cache-Control": "no-store" } });
  }),

  PATCH: handle(changeRun, async ({ actor, request, params, body }) => {
    const before = getRun(actor, params.runId);
    const version = requireMatch(request, before.version, () => staleRun(before));
    const run = updateRun(actor, params.runId, version, await body());
    return Response.json(run, { headers: { ETag: entityTag(run.version) } });
  }),

  DELETE: handle(removeRun, ({ actor, request, params }) => {
    const before = getRun(actor, params.runId);
    deleteRun(
      actor,
      params.runId,
      requireMatch(request, before.version, () => staleRun(before)),
    );
    return new Response(null, { status: 204 });
  }),
});
