import { alternatingMatches } from "@/lib/line/match/alternating-match";
import { checkRequest } from "@/lib/line/match/check-request";
import { designPoint, type DesignPoint } from "@/lib/line/match/design-point";
import { distinct } from "@/lib/line/match/distinct";
import { doubleStubMatches } from "@/lib/line/match/double-stub-match";
import { alreadyMatched, hopeless, unknownLoad } from "@/lib/line/match/hopeless";
import { asMade, judged } from "@/lib/line/match/judged";
import { lSectionMatches } from "@/lib/line/match/l-section-match";
import {
  matchMethods,
  type Candidate,
  type MatchMethod,
  type MatchRequest,
  type Outcome,
  type Refusal,
} from "@/lib/line/match/match-request";
import { notchStubs } from "@/lib/line/match/notch-match";
import { padMatches } from "@/lib/line/match/pad-match";
import { quarterWaveMatches } from "@/lib/line/match/quarter-wave-match";
import { rank } from "@/lib/line/match/rank";
import { parallelCables, seriesSections } from "@/lib/line/match/section-match";
import { stubMatches } from "@/lib/line/match/stub-match";
import { piNetworks, tNetworks } from "@/lib/line/match/three-part-match";
import { binomialMatches, equalRippleMatches } from "@/lib/line/match/transformer-match";

const find: Record<MatchMethod, (point: DesignPoint) => Outcome> = {
  shuntStub: (point) => stubMatches(point, "shunt"),
  seriesStub: (point) => stubMatches(point, "series"),
  doubleStub: doubleStubMatches,
  quarterWave: quarterWaveMatches,
  seriesSection: seriesSections,
  parallelCables,
  binomial: binomialMatches,
  equalRipple: equalRippleMatches,
  alternatingSections: alternatingMatches,
  lSection: lSectionMatches,
  piNetwork: piNetworks,
  tNetwork: tNetworks,
  pad: padMatches,
  notchStub: notchStubs,
};

/** Candidates of one method that are answered; what a long list of lines brings beyond is counted in `omitted`. */
export const mostOfMethod = 120;

export interface Matches {
  /** best first */
  candidates: Candidate[];
  refused: Refusal[];
  /** solutions left out as the worst of a method that has very many; only with long lists of lines */
  omitted: { method: MatchMethod; count: number }[];
}

/**
 * Every way the asked methods know to bring a load to a resistance at the design frequency, each solved with the loss
 * of its own lines and parts, judged over the band and, where a tolerance is given, as it may be made, best first.
 * @param request - see `MatchRequest`; the network stands at the load, or before what stands `behind` it, which is then
 *   solved for as it is at the design frequency and judged as it is at each frequency
 * @returns `candidates` ranked as `rank` says; `refused`, each method without a candidate and the reason in a sentence;
 *   `omitted`, how many of a method's solutions are left out for being its worst where there are over 120 of them.
 *   Stubs, series, paralleled and alternating sections, exact L-sections, pi, T and least-loss pads show the target at
 *   the design frequency; quarter-wave sections reach at least the asked return loss there; binomial and equal-ripple
 *   transformers what their design and lines give, even pads the asked return loss, E24 ones what their values give
 * @throws RangeError when a number of the request is out of its range or an element behind is impossible
 */
export function findMatches(request: MatchRequest): Matches {
  checkRequest(request);
  const methods = [...new Set(request.methods ?? matchMethods)];
  const none = (why: string): Matches => ({
    candidates: [],
    refused: methods.map((method) => ({ method, why })),
    omitted: [],
  });
  const unknown = unknownLoad(request);
  if (unknown) return none(unknown);
  const point = designPoint(request);
  const helpless = hopeless(point);
  if (helpless) return none(helpless);
  const outcomes = methods.map((method) => ({ method, ...outcomeOf(method, point) }));
  const shortened = outcomes.map(({ method, proposals }) => {
    const ranked = rank(
      proposals.map((proposal) => judged(proposal, point)),
      request.returnLossDb,
    );
    return { method, kept: ranked.slice(0, mostOfMethod), count: Math.max(0, ranked.length - mostOfMethod) };
  });
  const candidates = shortened.flatMap(({ kept }) => kept).map((candidate) => asMade(candidate, point));
  return {
    candidates: distinct(rank(candidates, request.returnLossDb)),
    refused: outcomes.flatMap(({ method, proposals, why }) => (proposals.length === 0 ? [{ method, why }] : [])),
    omitted: shortened.flatMap(({ method, count }) => (count > 0 ? [{ method, count }] : [])),
  };
}

function outcomeOf(method: MatchMethod, point: DesignPoint): Outcome {
  const done = alreadyMatched(point);
  // A notch is wanted of a load that is matched too.
  const isNotch = method === "notchStub" && point.request.notchHz !== undefined;
  return done && !isNotch ? { proposals: [], why: done } : find[method](point);
}
