import { readCable } from "@/lib/cables/operations";
import { getCable } from "@/lib/cables/service";
import { handle, route } from "@/lib/http/handle";

export const { GET, POST, PUT, PATCH, DELETE, OPTIONS } = route({
  GET: handle(readCable, ({ actor, params }) => {
    return Response.json(getCable(actor, params.cableId), { headers: { "Cache-Control": "no-store" } });
  }),
});
