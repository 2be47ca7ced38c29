import { dcOperation } from "@/lib/compute/dc/operations";
import { computeDc } from "@/lib/compute/dc/service";
import { handle, route } from "@/lib/http/handle";
import { jsonAnswer } from "@/lib/http/json-answer";

export const { GET, POST, PUT, PATCH, DELETE, OPTIONS } = route({
  POST: handle(dcOperation, async ({ actor, body }) => jsonAnswer(await computeDc(actor, await body()))),
});
