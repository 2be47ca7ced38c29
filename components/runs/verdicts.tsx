"use client";

import type { Route } from "next";
import Link from "next/link";
import { useRunEditor } from "@/components/runs/run-editor";
import { StateNote } from "@/components/ui/state-mark";
import type { Analysis } from "@/lib/runs/analysis";
import { maskingSentence, seenFromSource } from "@/lib/runs/sentences";
import { masking, verdicts } from "@/lib/runs/targets";

/** What is true of the run, in words: what the source end sees of the load, and whether its limit would notice a missing one. */
export function Verdicts({ analysis }: { analysis: Analysis }) {
  const { draft, saved } = useRunEditor();
  const seen = seenFromSource(analysis, draft, verdicts(draft.targets, analysis));
  const guard = masking(draft.targets, analysis);
  const guarded = guard && maskingSentence(guard, draft);
  return (
    <div className="mt-4 flex flex-col gap-2.5">
      <StateNote state={seen.state}>
        {seen.text}{" "}
        {seen.isMatchWorth && (
          <Link href={`/runs/${saved.id}/match` as Route} className="link">
            Compare ways to match it.
          </Link>
        )}
      </StateNote>
      {guarded && <StateNote state={guarded.state}>{guarded.text}</StateNote>}
      {analysis.wave && (
        <p className="text-note text-ink-3">
          Volts and amperes are rms unless marked pk. High voltage and RF burns: keep power off while joints are open,
          and let a licensed person assess exposure under the local rules.
        </p>
      )}
    </div>
  );
}
