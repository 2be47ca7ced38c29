/** What can be asked of `/compute/tolerance`. */
import { toleranceAnswerSchema, toleranceRequestSchema } from "@/lib/compute/tolerance/schema";
import { operation } from "@/lib/http/operation";

export const toleranceOperation = operation({
  method: "POST",
  permission: "compute.use",
  id: "computeTolerance",
  path: "/compute/tolerance",
  summary: "What a run does when its parts are not exactly what they are drawn as.",
  body: toleranceRequestSchema,
  answer: {
    status: 200,
    description: "Percentile curves of the draws, yield against the targets, and what matters most.",
    schema: toleranceAnswerSchema,
  },
});
