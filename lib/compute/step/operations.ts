/** What can be asked about the signal of a run. Nothing is stored. */
import { stepAnswerSchema, stepRequestSchema } from "@/lib/compute/step/schema";
import { operation } from "@/lib/http/operation";

export const stepOperation = operation({
  id: "computeStep",
  method: "POST",
  path: "/compute/step",
  summary: "Voltages of a run over time after a step, a pulse or bits, and its wave fronts.",
  permission: "compute.use",
  body: stepRequestSchema,
  answer: { status: 200, description: "Voltages, fronts and readings.", schema: stepAnswerSchema },
});
