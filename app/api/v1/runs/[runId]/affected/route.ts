import { handle, route } from "@/lib/http/handle";
import { getAffected } from "@/lib/runs/affected/service";
import { readAffected } from "@/lib/runs/effects/operations";

export const { GET, POST, PUT, PATCH, DELETE, OPTIONS } = route({
  GET: handle(readAffected, async ({ actor, params }) => Response.json(await getAffected(actor, params.runId))),
});
