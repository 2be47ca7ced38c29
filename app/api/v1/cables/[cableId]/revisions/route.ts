import { revisionAnswer } from "@/app/api/v1/cables/[cableId]/step-answer";
import { beginCableRevision, listCableRevisions } from "@/lib/cables/revisions/operations";
import { listRevisions } from "@/lib/cables/revisions/service";
import { beginRevision } from "@/lib/cables/revising/service";
import { getCable } from "@/lib/cables/service";
import { handle, route } from "@/lib/http/handle";

export const { GET, POST, PUT, PATCH, DELETE, OPTIONS } = route({
  GET: handle(listCableRevisions, ({ actor, params }) => {
    getCable(actor, params.cableId);
    return Response.json({ items: listRevisions(actor, params.cableId) });
  }),

  POST: handle(beginCableRevision, async ({ actor, params, body }) => {
    getCable(actor, params.cableId);
    return revisionAnswer(beginRevision(actor, params.cableId, (await body()).reason), 201);
  }),
});
