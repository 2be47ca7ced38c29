import { matchesOperation } from "@/lib/compute/operations";
import { computeMatches } from "@/lib/compute/matches/service";
import { handle, route } from "@/lib/http/handle";
import { jsonAnswer } from "@/lib/http/json-answer";

export const { GET, POST, PUT, PATCH, DELETE, OPTIONS } = route({
  POST: handle(matchesOperation, async ({ actor, body }) => jsonAnswer(await computeMatches(actor, await body()))),
});
