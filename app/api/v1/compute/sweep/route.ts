import { sweepOperation } from "@/lib/compute/operations";
import { computeSweep } from "@/lib/compute/service";
import { handle, route } from "@/lib/http/handle";

export const { GET, POST, PUT, PATCH, DELETE, OPTIONS } = route({
  POST: handle(sweepOperation, async ({ actor, body }) => Response.json(computeSweep(actor, await body()))),
});
