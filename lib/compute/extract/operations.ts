import { extractAnswerSchema, extractRequestSchema } from "@/lib/compute/extract/schema";
import { operation } from "@/lib/http/operation";

export const extractOperation = operation({
  id: "computeExtract",
  method: "POST",
  path: "/compute/extract",
  permission: "compute.use",
  summary: "A line from a sweep of a sample of known length: through it, or open and short.",
  body: extractRequestSchema,
  answer: { status: 200, description: "What was measured, the model and its residuals.", schema: extractAnswerSchema },
});
