import { addEvidenceOperation, listEvidenceOperation } from "@/lib/cables/evidence/operations";
import { addEvidence, listEvidence } from "@/lib/cables/evidence/service";
import { requireRecords } from "@/lib/cables/records/service";
import { readForm } from "@/lib/http/form";
import { handle, route } from "@/lib/http/handle";

export const { GET, POST, PUT, PATCH, DELETE, OPTIONS } = route({
  GET: handle(listEvidenceOperation, ({ actor, params }) => Response.json(listEvidence(actor, params.cableId))),

  POST: handle(addEvidenceOperation, async ({ actor, params, request }) => {
    requireRecords(actor, params.cableId); // before a single byte is read
    const added = addEvidence(actor, params.cableId, await readForm(request));
    const Location = `/api/v1/cables/${params.cableId}/evidence/${added.id}`;
    return Response.json(added, { status: 201, headers: { Location } });
  }),
});
