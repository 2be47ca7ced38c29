import type { Actor } from "@/lib/auth/actor";
import { requirePermission } from "@/lib/auth/permission";
import { computeApart } from "@/lib/compute/apart/compute-apart";
import type { ReadingsRequest } from "@/lib/compute/readings/schema";
import { computed } from "@/lib/compute/refuse";

export function computeReadings(actor: Actor, request: ReadingsRequest) {
  requirePermission(actor, "compute.use");
  return computed(computeApart("readings", request));
}
