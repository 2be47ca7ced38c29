/** Solving for a figure, for whoever is signed in. Stores nothing. */
import type { Actor } from "@/lib/auth/actor";
import { requirePermission } from "@/lib/auth/permission";
import { computeApart } from "@/lib/compute/apart/compute-apart";
import { resolvedCircuit } from "@/lib/compute/lines/service";
import { computed, refuse } from "@/lib/compute/refuse";
import { solveFaults } from "@/lib/compute/solve/faults";
import type { SolveAsked } from "@/lib/compute/solve/schema";

export function computeSolve(actor: Actor, request: SolveAsked) {
  requirePermission(actor, "compute.use");
  const circuit = resolvedCircuit(actor, request.circuit);
  refuse(solveFaults(circuit, request));
  return computed(computeApart("solve", circuit, request));
}
