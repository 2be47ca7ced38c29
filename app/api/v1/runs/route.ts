import { entityTag } from "@/lib/http/etag";
import { handle, route } from "@/lib/http/handle";
import { pageResponse } from "@/lib/http/list";
import { listRuns } from "@/lib/runs/list/service";
import { searchRuns, startRun } from "@/lib/runs/operations";
import { createRun } from "@/lib/runs/service";

export const { GET, POST, PUT, PATCH, DELETE, OPTIONS } = route({
  GET: handle(searchRuns, ({ actor, request, query }) => pageResponse(request, listRuns(actor, query))),

  POST: handle(startRun, async ({ actor, body }) => {
    const run = createRun(actor, await body());
    return Response.json(run, {
      status: 201,
      headers: { ETag: entityTag(run.version), Location: `/api/v1/runs/${run.id}` },
    });
  }),
});
