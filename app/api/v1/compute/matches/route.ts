import { matchesOperation } from "@/lib/compute/operations";
import { computeMatches } from "@/lib/compute/service";
import { handle, route } from "@/lib/http/handle";

export const { GET, POST, PUT, PATCH, DELETE, OPTIONS } = route({
  POST: handle(matchesOperation, async ({ actor, body }) => Response.json(computeMatches(actor, await body()))),
});
