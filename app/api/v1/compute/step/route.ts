import { stepOperation } from "@/lib/compute/step/operations";
import { computeStep } from "@/lib/compute/step/service";
import { handle, route } from "@/lib/http/handle";

export const { GET, POST, PUT, PATCH, DELETE, OPTIONS } = route({
  POST: handle(stepOperation, async ({ actor, body }) => Response.json(computeStep(actor, await body()))),
});
