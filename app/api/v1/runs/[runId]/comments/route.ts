import { handle, route } from "@/lib/http/handle";
import { addComment, listComments } from "@/lib/runs/comments/service";
import { addRunComment, listRunComments } from "@/lib/runs/operations";
import { getRun } from "@/lib/runs/service";

export const { GET, POST, PUT, PATCH, DELETE, OPTIONS } = route({
  GET: handle(listRunComments, ({ actor, params }) =>
    Response.json({ items: listComments(actor, params.runId) }, { headers: { "Cache-Control": "no-store" } }),
  ),

  POST: handle(addRunComment, async ({ actor, params, body }) => {
    const { id } = getRun(actor, params.runId);
    return Response.json(addComment(actor, id, (await body()).text), { status: 201 });
  }),
});
