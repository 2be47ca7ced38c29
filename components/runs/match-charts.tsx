"use client";

import { useMemo } from "react";
import { MatchDumbbells } from "@/components/runs/match-dumbbells";
import { MatchReturnLoss } from "@/components/runs/match-return-loss";
import { MatchSmith } from "@/components/runs/match-smith";
import type { Candidate } from "@/lib/line/match/match-request";
import type { AtLimits } from "@/lib/runs/match-limits";
import { candidateCurve, type CandidateCurve, type MatchAsked } from "@/lib/runs/matching";
import { shownFrequencies } from "@/lib/runs/shown";

/** The compared matches over frequency, with what is matched alone beside them. */
export interface MatchCurves {
  xs: number[];
  alone: CandidateCurve;
  candidates: CandidateCurve[];
}

interface Props {
  compared: Candidate[];
  /** of the compared, in their order */
  limits: (AtLimits | null)[];
  asked: MatchAsked;
  /** what is matched */
  name: string;
}

/** The compared matches on the Smith chart, over frequency, and as they may be made. */
export function MatchCharts({ compared, limits, asked, name }: Props) {
  const curves = useMemo((): MatchCurves => {
    const xs = shownFrequencies(asked, 361);
    const candidates = compared.map(({ elements }) => candidateCurve(elements, asked, xs));
    return { xs: Array.from(xs), alone: candidateCurve([], asked, xs), candidates };
  }, [compared, asked]);
  const hasLimits = limits.some((each) => each !== null);
  const columns = hasLimits ? "grid-cols-[440px_minmax(0,1fr)_286px]" : "grid-cols-[460px_minmax(0,1fr)]";
  return (
    <div className={`mt-8 grid ${columns} gap-x-8 gap-y-6 folded:grid-cols-1`}>
      <MatchSmith curves={curves} first={compared[0]} asked={asked} name={name} />
      <MatchReturnLoss curves={curves} asked={asked} />
      {hasLimits && <MatchDumbbells compared={compared} limits={limits} asked={asked} />}
    </div>
  );
}
