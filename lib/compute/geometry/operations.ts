import { geometryAnswerSchema, geometryRequestSchema } from "@/lib/compute/geometry/schema";
import { operation } from "@/lib/http/operation";

export const geometryOperation = operation({
  id: "computeGeometry",
  method: "POST",
  path: "/compute/geometry",
  permission: "compute.use",
  summary: "A line from the cross-section of its construction.",
  body: geometryRequestSchema,
  answer: { status: 200, description: "The line per metre, with what was taken.", schema: geometryAnswerSchema },
});
