import { fitOperation } from "@/lib/compute/fit/operations";
import { computeFit } from "@/lib/compute/fit/service";
import { handle, route } from "@/lib/http/handle";
import { jsonAnswer } from "@/lib/http/json-answer";

export const { GET, POST, PUT, PATCH, DELETE, OPTIONS } = route({
  POST: handle(fitOperation, async ({ actor, body }) => jsonAnswer(await computeFit(actor, await body()))),
});
