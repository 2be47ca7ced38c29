import { stepAnswer } from "@/app/api/v1/cables/[cableId]/step-answer";
import { deleteDraft } from "@/lib/cables/drafts/service";
import { getCableOn } from "@/lib/cables/history/service";
import { readCable, takeBackCable } from "@/lib/cables/operations";
import { changeDraft } from "@/lib/cables/revising/service";
import { changeCable } from "@/lib/cables/revisions/operations";
import { getCurrentRevision, getOpenRevision } from "@/lib/cables/revisions/service";
import { getCable } from "@/lib/cables/service";
import { entityTag } from "@/lib/http/etag";
import { handle, route } from "@/lib/http/handle";

export const { GET, POST, PUT, PATCH, DELETE, OPTIONS } = route({
  GET: handle(readCable, ({ actor, params: { cableId }, query: { on } }) => {
    if (on !== undefined) return Response.json(getCableOn(actor, cableId, on));
    const cable = getCable(actor, cableId);
    const { version } = getCurrentRevision(actor, cableId);
    return Response.json(cable, { headers: { ETag: entityTag(version), "Cache-Control": "no-store" } });
  }),

  PATCH: handle(changeCable, (asked) => stepAnswer(asked, getOpenRevision, changeDraft)),

  DELETE: handle(takeBackCable, ({ actor, params }) => {
    deleteDraft(actor, params.cableId);
    return new Response(null, { status: 204 });
  }),
});
