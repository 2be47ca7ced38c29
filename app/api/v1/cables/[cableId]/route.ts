import { deleteDraft } from "@/lib/cables/drafts/service";
import { readCable, takeBackCable } from "@/lib/cables/operations";
import { getCable } from "@/lib/cables/service";
import { handle, route } from "@/lib/http/handle";

export const { GET, POST, PUT, PATCH, DELETE, OPTIONS } = route({
  GET: handle(readCable, ({ actor, params }) => {
    return Response.json(getCable(actor, params.cableId), { headers: { "Cache-Control": "no-store" } });
  }),

  DELETE: handle(takeBackCable, ({ actor, params }) => {
    deleteDraft(actor, params.cableId);
    return new Response(null, { status: 204 });
  }),
});
