import { mayBeShown } from "@/lib/cables/evidence/media";
import { readEvidenceOperation } from "@/lib/cables/evidence/operations";
import { getEvidence } from "@/lib/cables/evidence/service";
import { fileAnswer } from "@/lib/http/download";
import { handle, route } from "@/lib/http/handle";

export const { GET, POST, PUT, PATCH, DELETE, OPTIONS } = route({
  GET: handle(readEvidenceOperation, ({ actor, params, query }) => {
    const { content, ...file } = getEvidence(actor, params.cableId, params.evidenceId);
    const isShown = query.view === "true" && mayBeShown(file.mediaType);
    return fileAnswer({ ...file, content: new Uint8Array(content) }, isShown ? "inline" : "attachment");
  }),
});
