import { stepAnswer } from "@/app/api/v1/cables/[cableId]/step-answer";
import { quarantine } from "@/lib/cables/steps/service";
import { getCurrentRevision } from "@/lib/cables/revisions/service";
import { quarantineCable } from "@/lib/cables/steps/operations";
import { handle, route } from "@/lib/http/handle";

export const { GET, POST, PUT, PATCH, DELETE, OPTIONS } = route({
  POST: handle(quarantineCable, (asked) => stepAnswer(asked, getCurrentRevision, quarantine)),
});
