import type { Element } from "@/lib/line/element";
import { designPoint, hopeless, knownRange, unknownLoad, type DesignPoint } from "@/lib/line/match/design-point";
import { judge, type Band } from "@/lib/line/match/judge";
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
 * @param request - see `MatchRequest`; the load is one termination, seen where the first element of the match begins
 * @returns `candidates` ranked as `rank` says; `refused`, each method without a candidate and the reason in a sentence.
 *   Stub, series-section, paralleled and exact L-section candidates show the target at the design frequency; quarter-wave
 *   ones reach at least the asked return loss there; E24 ones what their values give
 * @throws RangeError when a number of the request is out of its range
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
  const candidates = outcomes.flatMap(({ proposals }) => proposals.map((proposal) => judged(proposal, request)));
  const refused = outcomes.flatMap(({ method, proposals, why }) => (proposals.length === 0 ? [{ method, why }] : []));
  return { candidates: rank(candidates, request.returnLossDb), refused };
}

function judged(proposal: Proposal, request: MatchRequest): Candidate {
  const { designHz, bandHz, returnLossDb, targetOhm, load, temperatureC } = request;
  const band: Band = { designHz, bandHz, returnLossDb, ...knownRange(request) };
  const verdict = judge(responder(proposal.elements, load, targetOhm, temperatureC), band);
  const atLeast = "The bandwidth is at least this: the search or the load's samples end before the return loss does.";
  return {
    ...proposal,
    designReturnLossDb: verdict.designReturnLossDb < exact ? verdict.designReturnLossDb : null,
    bandwidthHz: verdict.bandwidthHz,
    worstReturnLossDb: finite(verdict.worstReturnLossDb),
    worstTransducerLossDb: finite(verdict.worstTransducerLossDb),
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
