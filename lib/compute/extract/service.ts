import type { Actor } from "@/lib/auth/actor";
import { requirePermission } from "@/lib/auth/permission";
import { computeApart } from "@/lib/compute/apart/compute-apart";
import type { ExtractRequest } from "@/lib/compute/extract/schema";
import { computed } from "@/lib/compute/refuse";

export function computeExtract(actor: Actor, request: ExtractRequest) {
  requirePermission(actor, "compute.use");
  return computed(computeApart("extract", request));
}
