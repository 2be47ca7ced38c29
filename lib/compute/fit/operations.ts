import { fitAnswerSchema, fitRequestSchema } from "@/lib/compute/fit/schema";
import { operation } from "@/lib/http/operation";

export const fitOperation = operation({
  id: "computeFit",
  method: "POST",
  path: "/compute/fit",
  permission: "compute.use",
  summary: "A line's model from its loss table, with residuals and what does not fit.",
  body: fitRequestSchema,
  answer: { status: 200, description: "The fit, the model and the refitted model.", schema: fitAnswerSchema },
});
