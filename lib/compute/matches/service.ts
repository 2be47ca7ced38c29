/** Matching for whoever is signed in, with the catalogue's cables; stores nothing. */
import type { Actor } from "@/lib/auth/actor";
import { requirePermission } from "@/lib/auth/permission";
import { listUsableCables } from "@/lib/cables/service";
import { computeApart } from "@/lib/compute/apart/compute-apart";
import { linesOf, resolved, toLine } from "@/lib/compute/lines/service";
import { matchesFaults } from "@/lib/compute/matches/faults";
import type { MatchesRequest } from "@/lib/compute/matches/schema";
import { computed, refuse } from "@/lib/compute/refuse";
import { bandOf, bandSamples } from "@/lib/line/match/extreme";
import type { MatchLine, MatchRequest } from "@/lib/line/match/match-request";
import { shortlist } from "@/lib/line/match/shortlist";

/** Of a larger catalogue the lines nearest to the impedances needed are tried. */
const mostOfCatalogue = 60;

export function computeMatches(actor: Actor, request: MatchesRequest) {
  requirePermission(actor, "compute.use");
  const { lines: named, catalogue, feeder: feederRef, place, ...asked } = request;
  const known = named ? namedLines(actor, named) : listUsableCables(actor).map(toLine);
  const [feeder] = feederRef ? linesOf(actor, [{ path: "feeder", ref: feederRef }]) : [];
  const behind = place && resolved(actor, place.behind, "place.behind");
  const whole: Omit<MatchRequest, "lines"> = { ...asked, feeder, behind, pairs: catalogue };
  const samples = bandSamples(bandOf({ ...whole, lines: [] })).length;
  refuse(matchesFaults(request, catalogue ? Math.min(known.length, mostOfCatalogue) : known.length, samples));
  return computed(matched(whole, known, catalogue ? mostOfCatalogue : known.length));
}

/** @param most - of the known lines that are tried */
async function matched(asked: Omit<MatchRequest, "lines">, known: MatchLine[], most: number) {
  return computeApart("matches", { ...asked, lines: shortlist(known, asked, most) }, known.length);
}

function namedLines(actor: Actor, refs: NonNullable<MatchesRequest["lines"]>): MatchLine[] {
  return linesOf(
    actor,
    refs.map((ref, i) => ({ path: `lines.${i}`, ref })),
  );
}
