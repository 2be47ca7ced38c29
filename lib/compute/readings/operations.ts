import { readingsAnswerSchema, readingsRequestSchema } from "@/lib/compute/readings/schema";
import { operation } from "@/lib/http/operation";

export const readingsOperation = operation({
  id: "computeReadings",
  method: "POST",
  path: "/compute/readings",
  permission: "compute.use",
  summary: "A line's model from meter readings of a sample, and what a meter will read on it.",
  body: readingsRequestSchema,
  answer: { status: 200, description: "The model, checks and expected readings.", schema: readingsAnswerSchema },
});
