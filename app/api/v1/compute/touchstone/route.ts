import { touchstoneOperation } from "@/lib/compute/touchstone/operations";
import { computeTouchstone } from "@/lib/compute/touchstone/service";
import { handle, route } from "@/lib/http/handle";

export const { GET, POST, PUT, PATCH, DELETE, OPTIONS } = route({
  POST: handle(touchstoneOperation, async ({ actor, body }) => Response.json(computeTouchstone(actor, await body()))),
});
