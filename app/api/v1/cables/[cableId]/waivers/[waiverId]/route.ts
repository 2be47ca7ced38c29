import { takeBackWaiver } from "@/lib/cables/waivers/operations";
import { endWaiver } from "@/lib/cables/waivers/service";
import { handle, route } from "@/lib/http/handle";

export const { GET, POST, PUT, PATCH, DELETE, OPTIONS } = route({
  DELETE: handle(takeBackWaiver, ({ actor, params }) =>
    Response.json(endWaiver(actor, params.cableId, params.waiverId)),
  ),
});
