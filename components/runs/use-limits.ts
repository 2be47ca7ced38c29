"use client";

import { useMemo } from "react";
import type { CutTolerance } from "@/lib/line/match/at-limits";
import type { Candidate } from "@/lib/line/match/match-request";
import { atLimits, type AtLimits } from "@/lib/runs/match-limits";
import type { MatchAsked } from "@/lib/runs/matching";

/** What each compared match keeps at the limits of its making, in their order; null where nothing of one can be off. */
export function useLimits(compared: Candidate[], asked: MatchAsked, tolerance: CutTolerance): (AtLimits | null)[] {
  return useMemo(
    () => compared.map(({ elements }) => atLimits(elements, asked, tolerance)),
    [compared, asked, tolerance],
  );
}
