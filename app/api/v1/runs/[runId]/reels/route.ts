import { handle, route } from "@/lib/http/handle";
import { bindReelOperation, listReelsOperation } from "@/lib/runs/reels/operations";
import { bindReel, listReels } from "@/lib/runs/reels/service";
import { getRun } from "@/lib/runs/service";

export const { GET, POST, PUT, PATCH, DELETE, OPTIONS } = route({
  GET: handle(listReelsOperation, ({ actor, params }) => Response.json(listReels(actor, params.runId))),

  POST: handle(bindReelOperation, async ({ actor, params, body }) => {
    getRun(actor, params.runId); // whether there is one is decided before the body is read
    return Response.json(bindReel(actor, params.runId, (await body()).lotId));
  }),
});
