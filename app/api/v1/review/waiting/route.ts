import { countReviews } from "@/lib/cables/queue/operations";
import { countWaiting } from "@/lib/cables/queue/service";
import { handle, route } from "@/lib/http/handle";

export const { GET, POST, PUT, PATCH, DELETE, OPTIONS } = route({
  GET: handle(countReviews, ({ actor }) =>
    Response.json({ waiting: countWaiting(actor) }, { headers: { "Cache-Control": "no-store" } }),
  ),
});
