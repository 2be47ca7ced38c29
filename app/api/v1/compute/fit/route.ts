import { fitOperation } from "@/lib/compute/fit/operations";
import { computeFit } from "@/lib/compute/fit/service";
import { handle, route } from "@/lib/http/handle";

export const { GET, POST, PUT, PATCH, DELETE, OPTIONS } = route({
  POST: handle(fitOperation, async ({ actor, body }) => Response.json(computeFit(actor, await body()))),
});
