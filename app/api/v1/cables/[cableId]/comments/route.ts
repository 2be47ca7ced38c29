import { readCableComments, sayOfCable } from "@/lib/cables/comments/operations";
import { addCableComment, listCableComments } from "@/lib/cables/comments/service";
import { getCable } from "@/lib/cables/service";
import { handle, route } from "@/lib/http/handle";

export const { GET, POST, PUT, PATCH, DELETE, OPTIONS } = route({
  GET: handle(readCableComments, ({ actor, params }) => {
    getCable(actor, params.cableId);
    return Response.json({ items: listCableComments(actor, params.cableId) });
  }),

  POST: handle(sayOfCable, async ({ actor, params, body }) => {
    getCable(actor, params.cableId);
    return Response.json(addCableComment(actor, params.cableId, await body()), { status: 201 });
  }),
});
