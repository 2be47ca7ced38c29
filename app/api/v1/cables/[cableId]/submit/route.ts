import { stepAnswer } from "@/app/api/v1/cables/[cableId]/step-answer";
import { submit } from "@/lib/cables/steps/service";
import { getOpenRevision } from "@/lib/cables/revisions/service";
import { submitCable } from "@/lib/cables/steps/operations";
import { handle, route } from "@/lib/http/handle";

export const { GET, POST, PUT, PATCH, DELETE, OPTIONS } = route({
  POST: handle(submitCable, (asked) => stepAnswer(asked, getOpenRevision, submit)),
});
