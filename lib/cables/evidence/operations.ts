/** What can be asked of an entry's evidence. */
import {
  evidenceFormSchema,
  evidenceListSchema,
  evidenceQuerySchema,
  evidenceSchema,
} from "@/lib/cables/evidence/schema";
import { operation } from "@/lib/http/operation";

export const listEvidenceOperation = operation({
  id: "listEvidence",
  method: "GET",
  path: "/cables/{cableId}/evidence",
  summary: "The files that bear out an entry's figures.",
  permission: "cables.read",
  answer: { status: 200, description: "The files, without their content.", schema: evidenceListSchema },
});

export const addEvidenceOperation = operation({
  id: "addEvidence",
  method: "POST",
  path: "/cables/{cableId}/evidence",
  summary: "Add a file. By the author of the draft, a librarian or an admin.",
  permission: "cables.propose",
  accepts: { "multipart/form-data": evidenceFormSchema },
  answer: { status: 201, description: "The file, without its content.", schema: evidenceSchema },
  refusals: ["conflict"],
});

export const readEvidenceOperation = operation({
  id: "readEvidence",
  method: "GET",
  path: "/cables/{cableId}/evidence/{evidenceId}",
  summary: "One file.",
  permission: "cables.read",
  query: evidenceQuerySchema,
  answer: { status: 200, description: "The file as it was sent.", mediaType: "application/octet-stream" },
});
