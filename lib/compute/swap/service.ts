/** Every approved cable in some places of a run, for whoever is signed in. Stores nothing. */
import type { Actor } from "@/lib/auth/actor";
import { requirePermission } from "@/lib/auth/permission";
import { massPerMetre } from "@/lib/cables/mass";
import { listUsableCables } from "@/lib/cables/service";
import { computeApart } from "@/lib/compute/apart/compute-apart";
import { resolvedCircuit } from "@/lib/compute/lines/service";
import { computed, refuse } from "@/lib/compute/refuse";
import { hardest, swapFaults, whyNotTried } from "@/lib/compute/swap/faults";
import type { SwapAsked } from "@/lib/compute/swap/schema";

/** Reading more of the catalogue would hold up everybody. */
const mostCables = 5000;

export function computeSwap(actor: Actor, request: SwapAsked) {
  requirePermission(actor, "compute.use");
  const circuit = resolvedCircuit(actor, request.circuit);
  const cables = listUsableCables(actor, mostCables + 1);
  if (cables.length > mostCables)
    refuse([
      { path: "paths", message: `The catalogue has more than ${mostCables} usable cables, too many to try at once.` },
    ]);
  const place = hardest(circuit, request);
  const usable = cables.map((cable) => ({ cable, why: whyNotTried(cable, place) }));
  const tried = usable.filter(({ why }) => why === undefined);
  refuse(swapFaults(circuit, request, tried.length));
  const candidates = tried.map(({ cable }) => ({
    cableId: cable.id,
    designation: cable.designation,
    family: cable.family,
    model: cable.model,
    massKgPerM: massPerMetre(cable),
  }));
  const refused = usable.flatMap(({ cable: { id, designation }, why }) =>
    why === undefined ? [] : [{ cableId: id, designation, why }],
  );
  return computed(computeApart("swap", circuit, candidates, refused, request));
}
