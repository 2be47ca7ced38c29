import { profileOperation } from "@/lib/compute/operations";
import { computeProfile } from "@/lib/compute/service";
import { handle, route } from "@/lib/http/handle";
import { jsonAnswer } from "@/lib/http/json-answer";

export const { GET, POST, PUT, PATCH, DELETE, OPTIONS } = route({
  POST: handle(profileOperation, async ({ actor, body }) => jsonAnswer(await computeProfile(actor, await body()))),
});
