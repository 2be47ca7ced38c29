import { entityTag, requireMatch } from "@/lib/http/etag";
import { handle, route } from "@/lib/http/handle";
import { handOverRun } from "@/lib/runs/operations";
import { handOver } from "@/lib/runs/owner/service";
import { getRun, staleRun } from "@/lib/runs/service";

export const { GET, POST, PUT, PATCH, DELETE, OPTIONS } = route({
  POST: handle(handOverRun, async ({ actor, request, params, body }) => {
    const before = getRun(actor, params.runId);
    const version = requireMatch(request, before.version, () => staleRun(before));
    const run = handOver(actor, params.runId, version, (await body()).ownerId);
    return Response.json(run, { headers: { ETag: entityTag(run.version) } });
  }),
});
