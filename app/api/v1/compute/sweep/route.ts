import { sweepOperation } from "@/lib/compute/operations";
import { computeSweep } from "@/lib/compute/service";
import { handle, route } from "@/lib/http/handle";
import { jsonAnswer } from "@/lib/http/json-answer";

export const { GET, POST, PUT, PATCH, DELETE, OPTIONS } = route({
  POST: handle(sweepOperation, async ({ actor, body }) => jsonAnswer(await computeSweep(actor, await body()))),
});
