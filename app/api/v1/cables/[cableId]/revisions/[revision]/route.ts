import { revisionAnswer } from "@/app/api/v1/cables/[cableId]/step-answer";
import { readCableRevision } from "@/lib/cables/revisions/operations";
import { getRevision } from "@/lib/cables/revisions/service";
import { handle, route } from "@/lib/http/handle";

export const { GET, POST, PUT, PATCH, DELETE, OPTIONS } = route({
  GET: handle(readCableRevision, ({ actor, params }) => {
    const number = /^\d{1,9}$/.test(params.revision) ? Number(params.revision) : 0;
    return revisionAnswer(getRevision(actor, params.cableId, number));
  }),
});
