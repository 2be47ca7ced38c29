import type { Actor } from "@/lib/auth/actor";
import { requirePermission } from "@/lib/auth/permission";
import { computeApart } from "@/lib/compute/apart/compute-apart";
import type { GeometryRequest } from "@/lib/compute/geometry/schema";
import { computed } from "@/lib/compute/refuse";

export function computeGeometry(actor: Actor, request: GeometryRequest) {
  requirePermission(actor, "compute.use");
  return computed(computeApart("geometry", request));
}
