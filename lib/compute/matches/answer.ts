/** A matching request whose lines are found -> the engine's answer in the shapes of the wire. Pure. */
import type { z } from "zod";
import type { matchesAnswerSchema } from "@/lib/compute/matches/schema";
import { wireNumber } from "@/lib/compute/wire";
import { findMatches } from "@/lib/line/match/find-matches";
import type { MatchRequest } from "@/lib/line/match/match-request";
import { referredElement } from "@/lib/runs/circuit";

/**
 * @param known - how many lines `request.lines` were chosen from
 * @throws RangeError where the engine refuses
 */
export function matchesAnswer(request: MatchRequest, known: number): z.infer<typeof matchesAnswerSchema> {
  const { candidates, refused, omitted } = findMatches(request);
  return {
    candidates: candidates.map((candidate) => ({
      ...candidate,
      elements: candidate.elements.map(referredElement),
      designReturnLossDb: wireNumber(candidate.designReturnLossDb),
      bandwidthHz: wireNumber(candidate.bandwidthHz),
      worstReturnLossDb: wireNumber(candidate.worstReturnLossDb),
      ...(candidate.worstReturnLossAtLimitsDb !== undefined && {
        worstReturnLossAtLimitsDb: wireNumber(candidate.worstReturnLossAtLimitsDb),
      }),
      ...(candidate.notchLossDb !== undefined && { notchLossDb: wireNumber(candidate.notchLossDb) }),
      worstTransducerLossDb: wireNumber(candidate.worstTransducerLossDb),
      worstMatchLossDb: wireNumber(candidate.worstMatchLossDb),
    })),
    refused,
    omitted,
    cutFrom: { lines: request.lines.length, of: known },
  };
}
