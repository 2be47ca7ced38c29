import { handle, route } from "@/lib/http/handle";
import { jsonAnswer } from "@/lib/http/json-answer";
import { readCableUses } from "@/lib/runs/effects/operations";
import { computeUses } from "@/lib/runs/effects/service";

export const { GET, POST, PUT, PATCH, DELETE, OPTIONS } = route({
  GET: handle(readCableUses, async ({ actor, params, query }) =>
    jsonAnswer(await computeUses(actor, params.cableId, query.revision)),
  ),
});
