"use client";

import { ChartFrame } from "@/components/plot/chart-frame";
import { SmithChart, type Reflection, type SmithTrace } from "@/components/plot/smith-chart";
import type { MatchCurves } from "@/components/runs/match-charts";
import { letterOf, lookOf } from "@/components/runs/series-swatch";
import { digits, frequency, inWords, megahertz, significantDigits } from "@/lib/format/quantity";
import type { Candidate } from "@/lib/line/match/match-request";
import { thinned } from "@/lib/runs/curves";
import { candidateSteps, type CandidateCurve, type MatchAsked } from "@/lib/runs/matching";

interface Props {
  curves: MatchCurves;
  /** the one whose steps are drawn */
  first: Candidate | undefined;
  asked: MatchAsked;
  name: string;
}

/** The matches in the plane of the reflection, over the band. */
export function MatchSmith({ curves, first, asked, name }: Props) {
  const { xs, candidates } = curves;
  const traces = tracesOf(curves, asked, name);
  const steps = first && {
    label: `steps of match A at ${inWords(frequency(asked.designHz))}`,
    points: candidateSteps(first.elements, asked),
  };
  return (
    <ChartFrame
      level={2}
      title="Centre of the Smith chart"
      summary={`Reflection of the matches over the band, referred to ${significantDigits(asked.targetOhm, 3)} ohms`}
      figures={{ head: ["MHz", "match", "Γ, real", "Γ, imaginary"], rows: smithRows(xs, candidates, asked.bandHz) }}
    >
      <SmithChart
        traces={traces}
        steps={steps}
        target={{
          magnitude: 10 ** (-asked.returnLossDb / 20),
          label: `return loss ${significantDigits(asked.returnLossDb, 3)} dB`,
        }}
      />
    </ChartFrame>
  );
}

function tracesOf({ xs, alone, candidates }: MatchCurves, asked: MatchAsked, name: string): SmithTrace[] {
  // A load that does not change over the band is one dot: two names on it would hide each other.
  const isDot = asked.load.kind === "constant" && asked.behind.length === 0;
  const ends: [string, string] = [megahertz(asked.bandHz[0]), megahertz(asked.bandHz[1])];
  return [
    {
      id: "alone",
      label: `${name} alone`,
      look: 5,
      points: inBand(xs, alone, asked.bandHz),
      ends: isDot ? undefined : ends,
    },
    ...candidates.map((curve, i) => ({
      id: letterOf(i),
      label: letterOf(i),
      look: lookOf(i),
      points: inBand(xs, curve, asked.bandHz),
    })),
  ];
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

function smithRows(
  xs: readonly number[],
  candidates: CandidateCurve[],
  [from, to]: readonly [number, number],
): string[][] {
  const inside = xs.map((f, i) => ({ f, i })).filter(({ f }) => f >= from * (1 - 1e-9) && f <= to * (1 + 1e-9));
  return thinned(inside, 21).flatMap(({ f, i }) =>
    candidates.map(({ reflection }, c) => [
      megahertz(f),
      letterOf(c),
      digits(reflection.re[i], 4),
      digits(reflection.im[i], 4),
    ]),
  );
}
