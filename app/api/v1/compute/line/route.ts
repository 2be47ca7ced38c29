import { lineOperation } from "@/lib/compute/operations";
import { computeLine } from "@/lib/compute/service";
import { handle, route } from "@/lib/http/handle";

export const { GET, POST, PUT, PATCH, DELETE, OPTIONS } = route({
  POST: handle(lineOperation, async ({ actor, body }) => Response.json(computeLine(actor, await body()))),
});
