import { touchstoneOperation } from "@/lib/compute/touchstone/operations";
import { computeTouchstone } from "@/lib/compute/touchstone/service";
import { handle, route } from "@/lib/http/handle";
import { jsonAnswer } from "@/lib/http/json-answer";

export const { GET, POST, PUT, PATCH, DELETE, OPTIONS } = route({
  POST: handle(touchstoneOperation, async ({ actor, body }) =>
    jsonAnswer(await computeTouchstone(actor, await body())),
  ),
});
