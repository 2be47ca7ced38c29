"use client";

import { Contributors } from "@/components/runs/contributors";
import { useRunEditor } from "@/components/runs/run-editor";
import { RunFrame } from "@/components/runs/run-frame";
import { ToleranceChart } from "@/components/runs/tolerance-chart";
import { ToleranceConditions } from "@/components/runs/tolerance-conditions";
import { ToleranceReadings } from "@/components/runs/tolerance-readings";
import { useDraws } from "@/components/runs/use-draws";
import { StateNote } from "@/components/ui/state-mark";
import { Working } from "@/components/ui/working";

/** What the run does when its parts are not exactly as drawn: many builds of it, drawn within limits. */
export function ToleranceView() {
  const { draft } = useRunEditor();
  const drawing = useDraws();
  const { result, progress, trouble, cannot, request, isCurrent, stop } = drawing;
  const total = request?.draws ?? 0;
  return (
    <RunFrame head={<ToleranceReadings drawing={drawing} />}>
      <ToleranceConditions drawing={drawing} />
      {(cannot ?? trouble) && (
        <div className="mt-5">
          <StateNote state="warn">{cannot ?? trouble}</StateNote>
        </div>
      )}
      {progress !== null && (
        <div className="mt-5">
          <Working label={`Drawing ${total} builds`} done={Math.round(progress * total)} total={total} onStop={stop} />
        </div>
      )}
      {result && !cannot && (
        <div aria-busy={!isCurrent} className={isCurrent ? "" : "[&_*]:text-ink-3! [&_svg]:opacity-60"}>
          <div className="mt-5 grid grid-cols-[minmax(0,1fr)_400px] gap-x-10 gap-y-8 folded:grid-cols-1">
            <div className="grid gap-8">
              <ToleranceChart which="returnLoss" result={result} />
              <ToleranceChart which="loss" result={result} />
            </div>
            <Contributors result={result} spread={drawing.spread} />
          </div>
          <p className="mt-4 text-note text-ink-3">
            Each build takes every quantity anywhere within its limits, all equally likely; the same seed draws the same
            builds, in this browser and on the server. A piece with a cut tolerance of its own keeps that.
            {draft.targets.length === 0 && " Give the run a target on the Line view to read how many builds keep it."}
          </p>
        </div>
      )}
    </RunFrame>
  );
}
