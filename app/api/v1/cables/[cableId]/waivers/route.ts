import { addWaiver, readWaivers } from "@/lib/cables/waivers/operations";
import { giveWaiver, listWaivers } from "@/lib/cables/waivers/service";
import { getCable } from "@/lib/cables/service";
import { handle, route } from "@/lib/http/handle";

export const { GET, POST, PUT, PATCH, DELETE, OPTIONS } = route({
  GET: handle(readWaivers, ({ actor, params }) => Response.json({ items: listWaivers(actor, params.cableId) })),

  POST: handle(addWaiver, async ({ actor, params, body }) => {
    getCable(actor, params.cableId);
    return Response.json(giveWaiver(actor, params.cableId, await body()), { status: 201 });
  }),
});
