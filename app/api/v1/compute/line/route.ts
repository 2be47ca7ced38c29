import { lineOperation } from "@/lib/compute/operations";
import { computeLine } from "@/lib/compute/service";
import { handle, route } from "@/lib/http/handle";
import { jsonAnswer } from "@/lib/http/json-answer";

export const { GET, POST, PUT, PATCH, DELETE, OPTIONS } = route({
  POST: handle(lineOperation, async ({ actor, body }) => jsonAnswer(await computeLine(actor, await body()))),
});
