/** Computing for whoever is signed in: finds the catalogue's cables they name, and stores nothing. */
import type { z } from "zod";
import type { Actor } from "@/lib/auth/actor";
import { requirePermission } from "@/lib/auth/permission";
import { computeApart } from "@/lib/compute/apart/compute-apart";
import { profileFaults, sweepFaults } from "@/lib/compute/faults";
import { frequenciesOf } from "@/lib/compute/frequencies";
import { linesOf, resolvedCircuit } from "@/lib/compute/lines/service";
import { computed, refuse } from "@/lib/compute/refuse";
import type { lineRequestSchema, ProfileRequest, SweepRequest } from "@/lib/compute/schema";

export function computeLine(actor: Actor, request: z.output<typeof lineRequestSchema>) {
  requirePermission(actor, "compute.use");
  const [line] = linesOf(actor, [{ path: "line", ref: request.line }]);
  if (!line) throw new Error("computeLine: a line neither found nor refused");
  return computed(computeApart("line", line.model, request));
}

export function computeSweep(actor: Actor, request: SweepRequest) {
  requirePermission(actor, "compute.use");
  const circuit = resolvedCircuit(actor, request.circuit);
  refuse(sweepFaults(request.circuit, frequenciesOf(request), request.planes));
  return computed(computeApart("sweep", circuit, request));
}

export function computeProfile(actor: Actor, request: ProfileRequest) {
  requirePermission(actor, "compute.use");
  const circuit = resolvedCircuit(actor, request.circuit);
  refuse(profileFaults(request.circuit, request.frequencyHz));
  return computed(computeApart("profile", circuit, request));
}
