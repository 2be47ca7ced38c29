import { stepAnswer } from "@/app/api/v1/cables/[cableId]/step-answer";
import { supersede } from "@/lib/cables/ending/service";
import { getCurrentRevision } from "@/lib/cables/revisions/service";
import { supersedeCable } from "@/lib/cables/steps/operations";
import { handle, route } from "@/lib/http/handle";

export const { GET, POST, PUT, PATCH, DELETE, OPTIONS } = route({
  POST: handle(supersedeCable, (asked) => stepAnswer(asked, getCurrentRevision, supersede)),
});
