import { handle, route } from "@/lib/http/handle";
import { keepLimitLine, readLimitLines } from "@/lib/limit-lines/operations";
import { addLimitLine, listLimitLines } from "@/lib/limit-lines/service";

export const { GET, POST, PUT, PATCH, DELETE, OPTIONS } = route({
  GET: handle(readLimitLines, ({ actor, query }) =>
    Response.json({ items: listLimitLines(actor, query) }, { headers: { "Cache-Control": "no-store" } }),
  ),

  POST: handle(keepLimitLine, async ({ actor, body }) =>
    Response.json(addLimitLine(actor, await body()), { status: 201 }),
  ),
});
