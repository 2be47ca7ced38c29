import { stepAnswer } from "@/app/api/v1/cables/[cableId]/step-answer";
import { returnRevision } from "@/lib/cables/steps/service";
import { getOpenRevision } from "@/lib/cables/revisions/service";
import { returnCable } from "@/lib/cables/steps/operations";
import { handle, route } from "@/lib/http/handle";

export const { GET, POST, PUT, PATCH, DELETE, OPTIONS } = route({
  POST: handle(returnCable, (asked) => stepAnswer(asked, getOpenRevision, returnRevision)),
});
