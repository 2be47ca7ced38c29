/** The signal of a run, for whoever is signed in. Stores nothing. */
import type { Actor } from "@/lib/auth/actor";
import { requirePermission } from "@/lib/auth/permission";
import { computeApart } from "@/lib/compute/apart/compute-apart";
import { resolvedCircuit } from "@/lib/compute/lines/service";
import { computed, refuse } from "@/lib/compute/refuse";
import { stepFaults } from "@/lib/compute/step/faults";
import type { StepRequest } from "@/lib/compute/step/schema";

export function computeStep(actor: Actor, request: StepRequest) {
  requirePermission(actor, "compute.use");
  const circuit = resolvedCircuit(actor, request.circuit);
  refuse(stepFaults(request));
  return computed(computeApart("step", circuit, request));
}
