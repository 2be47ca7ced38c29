import { createDraft } from "@/lib/cables/drafts/service";
import { proposeCable, searchCatalogue } from "@/lib/cables/operations";
import { listCables } from "@/lib/cables/service";
import { handle, route } from "@/lib/http/handle";
import { pageResponse } from "@/lib/http/list";

export const { GET, POST, PUT, PATCH, DELETE, OPTIONS } = route({
  GET: handle(searchCatalogue, ({ actor, request, query }) => pageResponse(request, listCables(actor, query))),

  POST: handle(proposeCable, async ({ actor, body }) => {
    const cable = createDraft(actor, await body());
    return Response.json(cable, { status: 201, headers: { Location: `/api/v1/cables/${cable.id}` } });
  }),
});
