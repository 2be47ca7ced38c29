import type { Actor } from "@/lib/auth/actor";
import { requirePermission } from "@/lib/auth/permission";
import { computeApart } from "@/lib/compute/apart/compute-apart";
import type { FitRequest } from "@/lib/compute/fit/schema";
import { computed } from "@/lib/compute/refuse";

export function computeFit(actor: Actor, request: FitRequest) {
  requirePermission(actor, "compute.use");
  return computed(computeApart("fit", request));
}
