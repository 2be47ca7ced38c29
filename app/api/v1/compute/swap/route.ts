import { swapOperation } from "@/lib/compute/swap/operations";
import { computeSwap } from "@/lib/compute/swap/service";
import { handle, route } from "@/lib/http/handle";
import { jsonAnswer } from "@/lib/http/json-answer";

export const { GET, POST, PUT, PATCH, DELETE, OPTIONS } = route({
  POST: handle(swapOperation, async ({ actor, body }) => jsonAnswer(await computeSwap(actor, await body()))),
});
