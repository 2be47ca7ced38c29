/** Direct current for whoever is signed in. Stores nothing. */
import type { Actor } from "@/lib/auth/actor";
import { requirePermission } from "@/lib/auth/permission";
import { computeApart } from "@/lib/compute/apart/compute-apart";
import type { DcRequest } from "@/lib/compute/dc/schema";
import { sampledPaths } from "@/lib/compute/faults";
import { resolvedCircuit } from "@/lib/compute/lines/service";
import { computed, refuse } from "@/lib/compute/refuse";

export function computeDc(actor: Actor, request: DcRequest) {
  requirePermission(actor, "compute.use");
  const circuit = resolvedCircuit(actor, request.circuit);
  refuse(
    sampledPaths(request.circuit).map((path) => ({
      path: `circuit.${path}`,
      message: "What was measured over frequency says nothing about direct current.",
    })),
  );
  return computed(computeApart("dc", circuit, request));
}
