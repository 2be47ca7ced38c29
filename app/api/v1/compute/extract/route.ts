import { extractOperation } from "@/lib/compute/extract/operations";
import { computeExtract } from "@/lib/compute/extract/service";
import { handle, route } from "@/lib/http/handle";
import { jsonAnswer } from "@/lib/http/json-answer";

export const { GET, POST, PUT, PATCH, DELETE, OPTIONS } = route({
  POST: handle(extractOperation, async ({ actor, body }) => jsonAnswer(await computeExtract(actor, await body()))),
});
