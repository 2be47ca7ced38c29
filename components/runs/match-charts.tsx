"use client";

import dynamic from "next/dynamic";
import { useMemo } from "react";
import { ChartFrame } from "@/components/plot/chart-frame";
import { SmithChart, type Reflection, type SmithTrace } from "@/components/plot/smith-chart";
import { lookOf } from "@/components/runs/series-swatch";
import { digits, frequency, inWords, megahertz, significantDigits } from "@/lib/format/quantity";
import type { Candidate } from "@/lib/line/match/match-request";
import { shownFrequencies } from "@/lib/runs/shown";
import { plotted, returnLossDomain, thinned } from "@/lib/runs/curves";
import { candidateCurve, candidateSteps, type CandidateCurve, type MatchAsked } from "@/lib/runs/matching";
import { bandWords } from "@/lib/runs/sentences";

const SweepPlot = dynamic(() => import("@/components/plot/sweep-plot").then((file) => file.SweepPlot), {
  ssr: false,
  loading: () => <div className="h-72.5" />,
});

interface Props {
  compared: Candidate[];
  asked: MatchAsked;
  loadName: string;
}

function useCurves({ compared, asked }: Props) {
  return useMemo(() => {
    const xs = shownFrequencies(asked, 361);
    const candidates = compared.map(({ elements }) => candidateCurve(elements, asked, xs));
    return { xs: Array.from(xs), alone: candidateCurve([], asked, xs), candidates };
  }, [compared, asked]);
}

/** The part of a trace inside the band. */
function inBand(
  xs: readonly number[],
  { reflection }: CandidateCurve,
  [from, to]: readonly [number, number],
): Reflection[] {
  return xs.flatMap((f, i) =>
    f >= from * (1 - 1e-9) && f <= to * (1 + 1e-9) ? [{ re: reflection.re[i]!, im: reflection.im[i]! }] : [],
  );
}

/** The matches on the Smith chart and over frequency. */
export function MatchCharts(props: Props) {
  const { compared, asked, loadName } = props;
  const { xs, alone, candidates } = useCurves(props);
  const limit = 10 ** (-asked.returnLossDb / 20);
  const letter = (i: number) => "ABCD"[i] ?? "";
  const traces: SmithTrace[] = [
    {
      id: "alone",
      label: `${loadName} alone`,
      look: 5,
      points: inBand(xs, alone, asked.bandHz),
      // A load that does not change over the band is one dot: two names on it would hide each other.
      ends: asked.load.kind === "constant" ? undefined : [megahertz(asked.bandHz[0]), megahertz(asked.bandHz[1])],
    },
    ...candidates.map((curve, i) => ({
      id: letter(i),
      label: letter(i),
      look: lookOf(i),
      points: inBand(xs, curve, asked.bandHz),
    })),
  ];
  const first = compared[0];
  const steps = first && {
    label: `steps of match A at ${inWords(frequency(asked.designHz))}`,
    points: candidateSteps(first.elements, asked),
  };
  const series = [
    ...candidates.map((curve, i) => ({
      id: letter(i),
      label: letter(i),
      look: lookOf(i),
      values: plotted(curve.returnLossDb),
    })),
    { id: "alone", label: "alone", look: 5 as const, values: plotted(alone.returnLossDb) },
  ];
  const [bottom] = returnLossDomain(
    series.map(({ values }) => values),
    asked.returnLossDb,
  );
  const top = Math.max(34, Math.ceil((asked.returnLossDb + 16) / 4) * 4);
  const rows = thinned(
    xs.map((x, i) => [megahertz(x), ...series.map(({ values }) => digits(values[i], 2))]),
    120,
  );
  return (
    <div className="mt-8 grid grid-cols-[460px_minmax(0,1fr)] gap-x-10 gap-y-6 folded:grid-cols-1">
      <ChartFrame
        level={2}
        title="Centre of the Smith chart"
        summary={`Reflection of the matches over the band, referred to ${significantDigits(asked.targetOhm, 3)} ohms`}
        figures={{ head: ["MHz", "match", "Γ, real", "Γ, imaginary"], rows: smithRows(xs, candidates, asked.bandHz) }}
      >
        <SmithChart
          traces={traces}
          steps={steps}
          target={{ magnitude: limit, label: `return loss ${significantDigits(asked.returnLossDb, 3)} dB` }}
        />
      </ChartFrame>
      <ChartFrame
        level={2}
        title="Return loss at the match"
        note={`dB over MHz, against ${significantDigits(asked.targetOhm, 3)} Ω; higher is better`}
        summary={`Return loss of the compared matches over ${bandWords(asked.bandHz)}; asked ${significantDigits(asked.returnLossDb, 3)} decibels`}
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
          band={{ from: asked.bandHz[0], to: asked.bandHz[1], label: bandWords(asked.bandHz) }}
          limit={{ value: asked.returnLossDb, forbidden: "below", label: `asked ${digits(asked.returnLossDb, 1)}` }}
        />
      </ChartFrame>
    </div>
  );
}

function smithRows(
  xs: readonly number[],
  candidates: CandidateCurve[],
  [from, to]: readonly [number, number],
): string[][] {
  const inside = xs.map((f, i) => ({ f, i })).filter(({ f }) => f >= from * (1 - 1e-9) && f <= to * (1 + 1e-9));
  return thinned(inside, 21).flatMap(({ f, i }) =>
    candidates.map(({ reflection }, c) => [
      megahertz(f),
      "ABCD"[c] ?? "",
      digits(reflection.re[i], 4),
      digits(reflection.im[i], 4),
    ]),
  );
}
