import { readingsOperation } from "@/lib/compute/readings/operations";
import { computeReadings } from "@/lib/compute/readings/service";
import { handle, route } from "@/lib/http/handle";
import { jsonAnswer } from "@/lib/http/json-answer";

export const { GET, POST, PUT, PATCH, DELETE, OPTIONS } = route({
  POST: handle(readingsOperation, async ({ actor, body }) => jsonAnswer(await computeReadings(actor, await body()))),
});
