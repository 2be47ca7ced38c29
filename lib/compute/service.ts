/** Computing for whoever is signed in: finds the catalogue's cables they name, and stores nothing. */
import type { z } from "zod";
import type { Actor } from "@/lib/auth/actor";
import { requirePermission } from "@/lib/auth/permission";
import { listUsableCables } from "@/lib/cables/service";
import { computeApart } from "@/lib/compute/apart/compute-apart";
import { matchesFaults, profileFaults, sweepFaults } from "@/lib/compute/faults";
import { frequenciesOf } from "@/lib/compute/frequencies";
import { linesOf, resolved, resolvedCircuit, toLine } from "@/lib/compute/lines/service";
import { computed, refuse } from "@/lib/compute/refuse";
import type { lineRequestSchema, MatchesRequest, ProfileRequest, SweepRequest } from "@/lib/compute/schema";
import type { MatchLine } from "@/lib/line/match/match-request";

const mostOfCatalogue = 200;

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

function linesToCutFrom(actor: Actor, request: MatchesRequest): MatchLine[] {
  if (request.lines)
    return linesOf(
      actor,
      request.lines.map((ref, i) => ({ path: `lines.${i}`, ref })),
    );
  const usable = listUsableCables(actor).map(toLine);
  if (usable.length > mostOfCatalogue)
    refuse([
      {
        path: "catalogue",
        message: `The catalogue has ${usable.length} usable cables; name at most ${mostOfCatalogue} of them in lines.`,
      },
    ]);
  return usable;
}

export function computeMatches(actor: Actor, request: MatchesRequest) {
  requirePermission(actor, "compute.use");
  const { load, targetOhm, designHz, bandHz, returnLossDb, methods, partQ, tolerance, temperatureC } = request;
  const lines = linesToCutFrom(actor, request);
  const [feeder] = request.feeder ? linesOf(actor, [{ path: "feeder", ref: request.feeder }]) : [];
  refuse(matchesFaults(request, lines.length));
  const behind = request.place && resolved(actor, request.place.behind, "place.behind");
  const asked = { load, targetOhm, designHz, bandHz, returnLossDb, methods, partQ, tolerance, temperatureC };
  return computed(computeApart("matches", { ...asked, lines, feeder, behind }));
}
