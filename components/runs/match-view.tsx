"use client";

import { useState } from "react";
import { CandidateColumn } from "@/components/runs/candidate-column";
import { CandidateList } from "@/components/runs/candidate-list";
import { MatchCharts } from "@/components/runs/match-charts";
import { MatchConditions } from "@/components/runs/match-conditions";
import { MatchSpecial } from "@/components/runs/match-special";
import { useRunEditor } from "@/components/runs/run-editor";
import { RunFrame } from "@/components/runs/run-frame";
import { MatchAskedFor } from "@/components/runs/match-asked-for";
import { LeftBehind } from "@/components/runs/left-behind";
import { useLimits } from "@/components/runs/use-limits";
import { useMatches } from "@/components/runs/use-matches";
import { StateNote } from "@/components/ui/state-mark";
import type { Candidate } from "@/lib/line/match/match-request";
import { firstCompared } from "@/lib/runs/first-compared";
import { isKept } from "@/lib/runs/match-place";
import { storedElements } from "@/lib/runs/matching";

const mostCompared = 4;

/** Ways to match the run at a place of it, ranked; up to four side by side; one kept in the run. */
export function MatchView() {
  const { draft } = useRunEditor();
  const matching = useMatches();
  const { found, trouble, isBehind } = matching;
  const place = matching.asked.behind.length;
  const { compared, toggle, refusal } = useCompared(found?.candidates ?? [], place);
  const limits = useLimits(compared, matching.asked, matching.choices.tolerance);
  return (
    <RunFrame head={<MatchAskedFor matching={matching} />}>
      <MatchConditions matching={matching} />
      <MatchSpecial matching={matching} />
      <LeftBehind asked={matching.asked} />
      {trouble && (
        <div className="mt-5">
          <StateNote state="warn">{trouble}</StateNote>
        </div>
      )}
      {found && (
        <div className={isBehind ? "opacity-60" : ""}>
          {compared.length > 0 && (
            <div className="mt-5 grid grid-cols-4 gap-x-4 gap-y-8 folded:grid-cols-2 phone:grid-cols-1">
              {compared.map((candidate, i) => (
                <CandidateColumn
                  key={candidate.title}
                  candidate={candidate}
                  place={i}
                  others={compared}
                  limits={limits}
                  asked={matching.asked}
                  candidates={found.candidates}
                />
              ))}
            </div>
          )}
          {compared.length > 0 && (
            <MatchCharts
              compared={compared}
              limits={limits}
              asked={matching.asked}
              name={place === 0 ? draft.loadName : "run behind"}
            />
          )}
          <CandidateList
            found={found}
            compared={compared}
            toggle={toggle}
            refusal={refusal}
            returnLossDb={matching.asked.returnLossDb}
          />
        </div>
      )}
    </RunFrame>
  );
}

/** Which candidates stand side by side: the best of each kind first, until someone chooses. */
function useCompared(candidates: Candidate[], place: number) {
  const [chosen, setChosen] = useState<string[] | null>(null);
  const [refusal, setRefusal] = useState<string | null>(null);
  const { draft } = useRunEditor();
  const kept = candidates.find((candidate) =>
    isKept(draft.circuit.elements, storedElements(candidate.elements), place),
  );
  const titles = chosen ?? firstCompared(candidates, kept, mostCompared);
  const compared = titles.flatMap((title) => candidates.find((candidate) => candidate.title === title) ?? []);
  function toggle(title: string) {
    const now = compared.map((candidate) => candidate.title);
    if (now.includes(title)) return (setRefusal(null), setChosen(now.filter((other) => other !== title)));
    if (now.length >= mostCompared) return setRefusal("Four stand side by side already. Put one back first.");
    setRefusal(null);
    setChosen([...now, title]);
  }
  return { compared, toggle, refusal };
}
