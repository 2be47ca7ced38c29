/** What can be asked of `/compute/swap`. */
import { swapAnswerSchema, swapRequestSchema } from "@/lib/compute/swap/schema";
import { operation } from "@/lib/http/operation";

export const swapOperation = operation({
  method: "POST",
  permission: "compute.use",
  id: "computeSwap",
  path: "/compute/swap",
  summary: "Every approved cable in some places of a run, held against the run's targets.",
  body: swapRequestSchema,
  answer: {
    status: 200,
    description: "The cables, best first, and those that were not put in.",
    schema: swapAnswerSchema,
  },
});
