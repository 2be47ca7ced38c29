import { stepOperation } from "@/lib/compute/step/operations";
import { computeStep } from "@/lib/compute/step/service";
import { handle, route } from "@/lib/http/handle";
import { jsonAnswer } from "@/lib/http/json-answer";

export const { GET, POST, PUT, PATCH, DELETE, OPTIONS } = route({
  POST: handle(stepOperation, async ({ actor, body }) => jsonAnswer(await computeStep(actor, await body()))),
});
