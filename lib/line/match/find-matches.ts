import type { Element } from "@/lib/line/element";
import { worstAtLimits } from "@/lib/line/match/at-limits";
import { designPoint, type DesignPoint } from "@/lib/line/match/design-point";
import { distinct } from "@/lib/line/match/distinct";
import { bandOf } from "@/lib/line/match/extreme";
import { hopeless, unknownLoad } from "@/lib/line/match/hopeless";
import { judge } from "@/lib/line/match/judge";
import { lSectionMatches } from "@/lib/line/match/l-section-match";
import {
  checkRequest,
  matchMethods,
  type Candidate,
  type MatchMethod,
  type MatchRequest,
  type Outcome,
  type Proposal,
  type Refusal,
} from "@/lib/line/match/match-request";
import { quarterWaveMatches } from "@/lib/line/match/quarter-wave-match";
import { rank } from "@/lib/line/match/rank";
import { responder } from "@/lib/line/match/response";
import { parallelCables, seriesSections } from "@/lib/line/match/section-match";
import { stubMatches } from "@/lib/line/match/stub-match";

const find: Record<MatchMethod, (point: DesignPoint) => Outcome> = {
  shuntStub: (point) => stubMatches(point, "shunt"),
  seriesStub: (point) => stubMatches(point, "series"),
  quarterWave: quarterWaveMatches,
  seriesSection: seriesSections,
  parallelCables,
  lSection: lSectionMatches,
};

/**
 * Every way the asked methods know to bring a load to a resistance at the design frequency, each solved with the loss
 * of its own lines and parts, judged over the band, best first.
 * @param request - see `MatchRequest`; the network stands at the load, or before what stands `behind` it, which is then
 *   solved for as it is at the design frequency and judged as it is at each frequency
 * @returns `candidates` ranked as `rank` says; `refused`, each method without a candidate and the reason in a sentence.
 *   Stub, series-section, paralleled and exact L-section candidates show the target at the design frequency; quarter-wave
 *   ones reach at least the asked return loss there; E24 ones what their values give
 * @throws RangeError when a number of the request is out of its range or an element behind is impossible
 */
export function findMatches(request: MatchRequest): { candidates: Candidate[]; refused: Refusal[] } {
  checkRequest(request);
  const methods = [...new Set(request.methods ?? matchMethods)];
  const unknown = unknownLoad(request);
  if (unknown) return { candidates: [], refused: methods.map((method) => ({ method, why: unknown })) };
  const point = designPoint(request);
  const none = hopeless(point);
  if (none) return { candidates: [], refused: methods.map((method) => ({ method, why: none })) };
  const outcomes = methods.map((method) => ({ method, ...find[method](point) }));
  const candidates = outcomes.flatMap(({ proposals }) => proposals.map((proposal) => judged(proposal, point)));
  const refused = outcomes.flatMap(({ method, proposals, why }) => (proposals.length === 0 ? [{ method, why }] : []));
  return { candidates: distinct(rank(candidates, request.returnLossDb)), refused };
}

function judged(proposal: Proposal, { request, seen }: DesignPoint): Candidate {
  const { targetOhm, temperatureC, tolerance } = request;
  const ends = { seen, targetOhm, temperatureC };
  const band = bandOf(request);
  const verdict = judge(responder(proposal.elements, ends), band);
  const atLeast = "The bandwidth is at least this: the search or the load's samples end before the return loss does.";
  return {
    ...proposal,
    designReturnLossDb: verdict.designReturnLossDb < exact ? verdict.designReturnLossDb : null,
    bandwidthHz: verdict.bandwidthHz,
    worstReturnLossDb: finite(verdict.worstReturnLossDb),
    ...(tolerance && {
      worstReturnLossAtLimitsDb: finite(worstAtLimits(proposal.elements, tolerance, ends, band)),
    }),
    worstTransducerLossDb: finite(verdict.worstTransducerLossDb),
    worstMatchLossDb: finite(verdict.worstMatchLossDb),
    totalLengthM: proposal.elements.reduce((sum, element) => sum + cableIn(element), 0),
    notes: verdict.isAtLeast ? [...proposal.notes, atLeast] : proposal.notes,
  };
}

/** Beyond this many dB only the rounding of the solution is left: the match is exact. */
const exact = 180;

const finite = (value: number): number | null => (Number.isFinite(value) ? value : null);

function cableIn(element: Element): number {
  return element.kind === "cable" || element.kind === "stub" ? element.lengthM * (element.paralleled ?? 1) : 0;
}
