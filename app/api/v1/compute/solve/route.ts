import { solveOperation } from "@/lib/compute/solve/operations";
import { computeSolve } from "@/lib/compute/solve/service";
import { handle, route } from "@/lib/http/handle";
import { jsonAnswer } from "@/lib/http/json-answer";

export const { GET, POST, PUT, PATCH, DELETE, OPTIONS } = route({
  POST: handle(solveOperation, async ({ actor, body }) => jsonAnswer(await computeSolve(actor, await body()))),
});
