import type { Element } from "@/lib/line/element";
import { worstAtLimits } from "@/lib/line/match/at-limits";
import { cutsOf } from "@/lib/line/match/cut-list";
import type { DesignPoint } from "@/lib/line/match/design-point";
import { bandOf } from "@/lib/line/match/extreme";
import { judge } from "@/lib/line/match/judge";
import type { Candidate, MatchRequest, Proposal } from "@/lib/line/match/match-request";
import { responder, type Ends, type Respond } from "@/lib/line/match/response";
import { knownRange } from "@/lib/line/match/seen-load";
import { yieldPercent } from "@/lib/line/match/yield";

/** A proposal judged at the design frequency, over the band and at its notch, as it is drawn. */
export function judged(proposal: Proposal, point: DesignPoint): Candidate {
  const { request } = point;
  const band = bandOf(request);
  const respond = responder(proposal.elements, endsOf(point));
  const verdict = judge(respond, band);
  const atLeast = "The bandwidth is at least this: the search or the load's samples end before the return loss does.";
  return {
    ...proposal,
    designReturnLossDb: verdict.designReturnLossDb < exact ? verdict.designReturnLossDb : null,
    bandwidthHz: verdict.bandwidthHz,
    worstReturnLossDb: finite(verdict.worstReturnLossDb),
    ...(proposal.method === "notchStub" && { notchLossDb: notchLoss(respond, request) }),
    worstTransducerLossDb: finite(verdict.worstTransducerLossDb),
    worstMatchLossDb: finite(verdict.worstMatchLossDb),
    totalLengthM: proposal.elements.reduce((sum, element) => sum + cableIn(element), 0),
    cuts: [],
    notes: verdict.isAtLeast ? [...proposal.notes, atLeast] : proposal.notes,
  };
}

function endsOf({ request, seen }: DesignPoint): Ends {
  const { targetOhm, temperatureC } = request;
  return { seen, targetOhm, temperatureC };
}

/** A candidate with its cut list and, where the request says how well it will be made, what it keeps when it is off. */
export function asMade(candidate: Candidate, point: DesignPoint): Candidate {
  const { tolerance, returnLossDb } = point.request;
  const { elements, designReturnLossDb } = candidate;
  const whole = { ...candidate, cuts: cutsOf(elements, point, designReturnLossDb) };
  if (!tolerance) return whole;
  const made = [elements, tolerance, endsOf(point), bandOf(point.request)] as const;
  const worst = worstAtLimits(...made);
  return {
    ...whole,
    worstReturnLossAtLimitsDb: finite(worst),
    // What keeps the return loss at its limits keeps it between them, and needs no draws.
    yieldPercent: worst >= returnLossDb ? 100 : yieldPercent(...made),
  };
}

/** Loss at the notch, dB; null where the load is not known there or no power arrives. */
function notchLoss(respond: Respond, request: MatchRequest): number | null {
  const { notchHz = NaN } = request;
  const { knownHz } = knownRange(request);
  return notchHz >= knownHz[0] && notchHz <= knownHz[1] ? finite(respond(notchHz).lossDb) : null;
}

/** Beyond this many dB only the rounding of the solution is left: the match is exact. */
const exact = 180;

const finite = (value: number): number | null => (Number.isFinite(value) ? value : null);

function cableIn(element: Element): number {
  if (element.kind === "parallel") return element.branches.reduce((sum, { lengthM }) => sum + lengthM, 0);
  return element.kind === "cable" || element.kind === "stub" ? element.lengthM * (element.paralleled ?? 1) : 0;
}
