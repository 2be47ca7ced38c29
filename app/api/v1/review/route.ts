import { readReviewQueue } from "@/lib/cables/queue/operations";
import { getQueue } from "@/lib/cables/queue/service";
import { handle, route } from "@/lib/http/handle";

export const { GET, POST, PUT, PATCH, DELETE, OPTIONS } = route({
  GET: handle(readReviewQueue, ({ actor }) =>
    Response.json(getQueue(actor), { headers: { "Cache-Control": "no-store" } }),
  ),
});
