import { readingsOperation } from "@/lib/compute/readings/operations";
import { computeReadings } from "@/lib/compute/readings/service";
import { handle, route } from "@/lib/http/handle";

export const { GET, POST, PUT, PATCH, DELETE, OPTIONS } = route({
  POST: handle(readingsOperation, async ({ actor, body }) => Response.json(computeReadings(actor, await body()))),
});
