"use client";

import { useState } from "react";
import { CandidateColumn } from "@/components/runs/candidate-column";
import { CandidateList } from "@/components/runs/candidate-list";
import { MatchCharts } from "@/components/runs/match-charts";
import { MatchConditions } from "@/components/runs/match-conditions";
import { useRunEditor } from "@/components/runs/run-editor";
import { RunFrame } from "@/components/runs/run-frame";
import { useMatches, type Matching } from "@/components/runs/use-matches";
import { Figure } from "@/components/ui/figure";
import { StateNote } from "@/components/ui/state-mark";
import type { Candidate } from "@/lib/line/match/match-request";
import { frequency, impedance, inWords, significantDigits } from "@/lib/format/quantity";
import { isKept, storedElements } from "@/lib/runs/matching";
import { bandWords } from "@/lib/runs/sentences";

const mostCompared = 4;

/** Ways to match the load, ranked; up to four side by side; one kept in the run. */
export function MatchView() {
  const { draft } = useRunEditor();
  const matching = useMatches();
  const { found, trouble, isBehind } = matching;
  const { compared, toggle, refusal } = useCompared(found?.candidates ?? []);
  return (
    <RunFrame head={<Asked matching={matching} />}>
      <MatchConditions matching={matching} />
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
                  asked={matching.asked}
                  candidates={found.candidates}
                />
              ))}
            </div>
          )}
          {compared.length > 0 && <MatchCharts compared={compared} asked={matching.asked} loadName={draft.loadName} />}
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

function Asked({ matching }: { matching: Matching }) {
  const { draft } = useRunEditor();
  const { asked, found } = matching;
  const { loadName, designHz, bandHz, circuit } = draft;
  const { load } = circuit;
  const count = found?.candidates.length ?? 0;
  const meets = found?.candidates.filter((c) => (c.worstReturnLossDb ?? Infinity) >= asked.returnLossDb).length ?? 0;
  return (
    <p className="max-w-140 pt-3.5 text-row text-ink-2 folded:pt-0">
      {loadName}{" "}
      {load.kind === "constant" && (
        <b className="text-ink">
          <Figure {...impedance({ re: load.reOhm, im: load.imOhm })} />
        </b>
      )}{" "}
      at {inWords(frequency(designHz))}. {count} {count === 1 ? "way" : "ways"} to bring it to{" "}
      {significantDigits(asked.targetOhm, 3)} Ω; {meets} {meets === 1 ? "keeps" : "keep"}{" "}
      {significantDigits(asked.returnLossDb, 3)} dB over {bandHz ? bandWords(bandHz) : "the frequency"}.
    </p>
  );
}

/** Which candidates stand side by side: the best of each kind first, until someone chooses. */
function useCompared(candidates: Candidate[]) {
  const [chosen, setChosen] = useState<string[] | null>(null);
  const [refusal, setRefusal] = useState<string | null>(null);
  const { draft } = useRunEditor();
  const kept = candidates.find((candidate) => isKept(draft.circuit.elements, storedElements(candidate.elements)));
  const titles = chosen ?? firstFour(candidates, kept);
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

/** The one kept in the run, then the best of each method, then the next best. */
function firstFour(candidates: Candidate[], kept: Candidate | undefined): string[] {
  const bestOfEach = candidates.filter(
    (candidate, i) => candidates.findIndex(({ method }) => method === candidate.method) === i,
  );
  const order = [...(kept ? [kept] : []), ...bestOfEach, ...candidates];
  return [...new Set(order.map(({ title }) => title))].slice(0, mostCompared);
}
