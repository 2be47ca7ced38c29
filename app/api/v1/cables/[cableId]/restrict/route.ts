import { stepAnswer } from "@/app/api/v1/cables/[cableId]/step-answer";
import { restrict } from "@/lib/cables/steps/service";
import { getCurrentRevision } from "@/lib/cables/revisions/service";
import { restrictCable } from "@/lib/cables/steps/operations";
import { handle, route } from "@/lib/http/handle";

export const { GET, POST, PUT, PATCH, DELETE, OPTIONS } = route({
  POST: handle(restrictCable, (asked) => stepAnswer(asked, getCurrentRevision, restrict)),
});
