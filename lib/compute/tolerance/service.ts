/** Tolerance for whoever is signed in. Stores nothing. */
import type { Actor } from "@/lib/auth/actor";
import { requirePermission } from "@/lib/auth/permission";
import { computeApart } from "@/lib/compute/apart/compute-apart";
import { resolvedCircuit } from "@/lib/compute/lines/service";
import { computed, refuse } from "@/lib/compute/refuse";
import { toleranceFaults } from "@/lib/compute/tolerance/faults";
import type { ToleranceAsked } from "@/lib/compute/tolerance/schema";

export function computeTolerance(actor: Actor, request: ToleranceAsked) {
  requirePermission(actor, "compute.use");
  const circuit = resolvedCircuit(actor, request.circuit);
  refuse(toleranceFaults(circuit, request));
  return computed(computeApart("tolerance", circuit, request));
}
