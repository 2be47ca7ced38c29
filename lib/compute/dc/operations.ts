/** What can be asked of `/compute/dc`. */
import { dcAnswerSchema, dcRequestSchema } from "@/lib/compute/dc/schema";
import { operation } from "@/lib/http/operation";

export const dcOperation = operation({
  method: "POST",
  permission: "compute.use",
  id: "computeDc",
  path: "/compute/dc",
  summary: "A run at direct current: what an ohm-meter reads, voltage and power at each access point.",
  body: dcRequestSchema,
  answer: { status: 200, description: "The access points from source to load.", schema: dcAnswerSchema },
});
