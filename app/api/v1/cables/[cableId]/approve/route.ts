import { stepAnswer } from "@/app/api/v1/cables/[cableId]/step-answer";
import { approve } from "@/lib/cables/approval/service";
import { getOpenRevision } from "@/lib/cables/revisions/service";
import { approveCable } from "@/lib/cables/steps/operations";
import { handle, route } from "@/lib/http/handle";

export const { GET, POST, PUT, PATCH, DELETE, OPTIONS } = route({
  POST: handle(approveCable, (asked) => stepAnswer(asked, getOpenRevision, approve)),
});
