"use client";

import dynamic from "next/dynamic";
import { ChartFrame } from "@/components/plot/chart-frame";
import type { MatchCurves } from "@/components/runs/match-charts";
import { letterOf, lookOf } from "@/components/runs/series-swatch";
import { digits, megahertz, significantDigits } from "@/lib/format/quantity";
import { plotted, returnLossDomain, thinned } from "@/lib/runs/curves";
import type { MatchAsked } from "@/lib/runs/matching";
import { bandWords } from "@/lib/runs/sentences";

const SweepPlot = dynamic(() => import("@/components/plot/sweep-plot").then((file) => file.SweepPlot), {
  ssr: false,
  loading: () => <div className="h-72.5" />,
});

function seriesOf({ alone, candidates }: MatchCurves) {
  return [
    ...candidates.map((curve, i) => ({
      id: letterOf(i),
      label: letterOf(i),
      look: lookOf(i),
      values: plotted(curve.returnLossDb),
    })),
    { id: "alone", label: "alone", look: 5 as const, values: plotted(alone.returnLossDb) },
  ];
}

/** Return loss of the matches over frequency, against what was asked. */
export function MatchReturnLoss({ curves, asked }: { curves: MatchCurves; asked: MatchAsked }) {
  const { xs } = curves;
  const { bandHz, returnLossDb, targetOhm } = asked;
  const series = seriesOf(curves);
  const [bottom] = returnLossDomain(
    series.map(({ values }) => values),
    returnLossDb,
  );
  const top = Math.max(34, Math.ceil((returnLossDb + 16) / 4) * 4);
  const rows = thinned(
    xs.map((x, i) => [megahertz(x), ...series.map(({ values }) => digits(values[i], 2))]),
    120,
  );
  return (
    <ChartFrame
      level={2}
      title="Return loss at the match"
      note={`dB over MHz, against ${significantDigits(targetOhm, 3)} Ω; higher is better`}
      summary={`Return loss of the compared matches over ${bandWords(bandHz)}; asked ${significantDigits(returnLossDb, 3)} decibels`}
      figures={{ head: ["MHz", ...series.map(({ label }) => `${label}, dB`)], rows }}
    >
      <SweepPlot
        xs={xs}
        series={series}
        xDomain={[xs[0] ?? 0, xs.at(-1) ?? 1]}
        yDomain={[bottom, Math.max(top, bottom + 6)]}
        xUnit="MHz"
        labelRoom={60}
        formatX={megahertz}
        formatY={(value) => digits(value, 0)}
        band={{ from: bandHz[0], to: bandHz[1], label: bandWords(bandHz) }}
        limit={{ value: returnLossDb, forbidden: "below", label: `asked ${digits(returnLossDb, 1)}` }}
      />
    </ChartFrame>
  );
}
