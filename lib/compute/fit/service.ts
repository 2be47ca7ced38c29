import type { Actor } from "@/lib/auth/actor";
import { requirePermission } from "@/lib/auth/permission";
import { fitAnswer } from "@/lib/compute/fit/answer";
import type { FitRequest } from "@/lib/compute/fit/schema";
import { computed } from "@/lib/compute/refuse";

export function computeFit(actor: Actor, request: FitRequest) {
  requirePermission(actor, "compute.use");
  return computed(() => fitAnswer(request));
}
