import { handle, route } from "@/lib/http/handle";
import { freeReelOperation } from "@/lib/runs/reels/operations";
import { freeReel } from "@/lib/runs/reels/service";

export const { GET, POST, PUT, PATCH, DELETE, OPTIONS } = route({
  DELETE: handle(freeReelOperation, ({ actor, params }) => {
    freeReel(actor, params.runId, params.lotId);
    return new Response(null, { status: 204 });
  }),
});
