import { listEvents } from "@/lib/cables/events/service";
import { listCableEvents } from "@/lib/cables/revisions/operations";
import { getCable } from "@/lib/cables/service";
import { handle, route } from "@/lib/http/handle";

export const { GET, POST, PUT, PATCH, DELETE, OPTIONS } = route({
  GET: handle(listCableEvents, ({ actor, params }) => {
    getCable(actor, params.cableId);
    return Response.json({ items: listEvents(actor, params.cableId) });
  }),
});
