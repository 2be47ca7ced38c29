import { toleranceOperation } from "@/lib/compute/tolerance/operations";
import { computeTolerance } from "@/lib/compute/tolerance/service";
import { handle, route } from "@/lib/http/handle";
import { jsonAnswer } from "@/lib/http/json-answer";

export const { GET, POST, PUT, PATCH, DELETE, OPTIONS } = route({
  POST: handle(toleranceOperation, async ({ actor, body }) => jsonAnswer(await computeTolerance(actor, await body()))),
});
