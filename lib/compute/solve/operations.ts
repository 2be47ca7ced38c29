/** What can be asked of `/compute/solve`. */
import { solveAnswerSchema, solveRequestSchema } from "@/lib/compute/solve/schema";
import { operation } from "@/lib/http/operation";

export const solveOperation = operation({
  method: "POST",
  permission: "compute.use",
  id: "computeSolve",
  path: "/compute/solve",
  summary: "The largest or smallest value of one figure with which a run keeps all its targets.",
  body: solveRequestSchema,
  answer: { status: 200, description: "The value, and which target binds.", schema: solveAnswerSchema },
});
