"use client";

import dynamic from "next/dynamic";
import { BandConditions } from "@/components/runs/conditions";
import { useRunEditor } from "@/components/runs/run-editor";
import { TargetList } from "@/components/runs/target-list";
import { ChartFrame } from "@/components/plot/chart-frame";
import { asGiven, frequencyAxis } from "@/lib/format/axis";
import { digits, frequency, inWords } from "@/lib/format/quantity";
import type { Analysis } from "@/lib/runs/analysis";
import { plotted, returnLossDomain, thinned } from "@/lib/runs/curves";
import { bandWords } from "@/lib/runs/sentences";

const SweepPlot = dynamic(() => import("@/components/plot/sweep-plot").then((file) => file.SweepPlot), {
  ssr: false,
  loading: () => <div className="h-72.5" />,
});

/** Return loss over the band at both ends of the run, with the target. */
export function ReturnLossChart({ analysis }: { analysis: Analysis }) {
  const { draft } = useRunEditor();
  const { bandHz, sourceName, loadName, targets, designHz } = draft;
  const limitDb = targets.find((t) => t.quantity === "returnLoss" && t.atLeast !== undefined)?.atLeast ?? null;
  // A screen is not wider than this many points; the worst is found among all of them.
  const shown = thinned([...analysis.sweep.frequencies.keys()], 501);
  const xs = shown.map((i) => analysis.sweep.frequencies[i]!);
  const source = plotted(shown.map((i) => analysis.sourceReturnLossDb[i]!));
  const load = plotted(shown.map((i) => analysis.loadReturnLossDb[i]!));
  const worst = analysis.worst.sourceReturnLoss;
  const axis = frequencyAxis(xs.at(-1) ?? 1);
  const yDomain = returnLossDomain([source, load], limitDb);
  const summary = `Return loss at ${sourceName} falls to ${digits(worst.value, 1)} dB at ${inWords(frequency(worst.frequencyHz))}${limitDb === null ? "" : `; target ${asGiven(limitDb)}`}`;
  const rows = thinned(
    xs.map((x, i) => [axis.format(x), digits(source[i], 2), digits(load[i], 2)]),
    120,
  );
  return (
    <ChartFrame
      level={2}
      title="Return loss over the band"
      note={
        <span className="inline-flex flex-wrap items-center gap-x-2 gap-y-1">
          dB; higher is better. Band <BandConditions isInline /> <TargetList />
        </span>
      }
      summary={summary}
      figures={{ head: [axis.unit, `at ${sourceName}, dB`, `at ${loadName}, dB`], rows }}
    >
      <SweepPlot
        xs={xs}
        series={[
          { id: "source", label: `at ${sourceName}`, look: 1, values: source },
          { id: "load", label: `at ${loadName}`, look: 2, values: load },
        ]}
        xDomain={[xs[0] ?? 0, xs.at(-1) ?? 1]}
        yDomain={yDomain}
        xUnit={axis.unit}
        formatX={axis.format}
        formatY={(value) => digits(value, 0)}
        mark={designHz}
        band={bandHz ? { from: bandHz[0], to: bandHz[1], label: bandWords(bandHz) } : undefined}
        limit={
          limitDb === null ? undefined : { value: limitDb, forbidden: "below", label: `target ${asGiven(limitDb)}` }
        }
        worst={
          Number.isFinite(worst.value)
            ? { x: worst.frequencyHz, y: worst.value, label: digits(worst.value, 1) }
            : undefined
        }
      />
    </ChartFrame>
  );
}
