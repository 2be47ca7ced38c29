import { mostTouchstoneBytes, touchstoneAnswerSchema, touchstoneRequestSchema } from "@/lib/compute/touchstone/schema";
import { operation } from "@/lib/http/operation";

export const touchstoneOperation = operation({
  id: "computeTouchstone",
  method: "POST",
  path: "/compute/touchstone",
  permission: "compute.use",
  summary: "Reads a file of network parameters, version 1.1, 2.0 or 2.1; a refusal carries its line as `line`.",
  body: touchstoneRequestSchema,
  mostBodyBytes: mostTouchstoneBytes,
  answer: { status: 200, description: "What the file holds, in SI units.", schema: touchstoneAnswerSchema },
});
