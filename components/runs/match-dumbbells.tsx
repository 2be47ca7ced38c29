"use client";

import { ChartFrame } from "@/components/plot/chart-frame";
import { Dumbbells, type Dumbbell } from "@/components/plot/dumbbells";
import { vswrOf } from "@/components/runs/candidate-rows";
import { letterOf, lookOf } from "@/components/runs/series-swatch";
import { digits, inWords, ratio } from "@/lib/format/quantity";
import type { Candidate } from "@/lib/line/match/match-request";
import type { AtLimits } from "@/lib/runs/match-limits";
import type { MatchAsked } from "@/lib/runs/matching";

interface Props {
  compared: Candidate[];
  limits: (AtLimits | null)[];
  asked: MatchAsked;
}

/** Worst VSWR of each match as drawn, and with every length and part at its limits. */
export function MatchDumbbells({ compared, limits, asked }: Props) {
  const rows = compared.map((candidate, i): Dumbbell => {
    const drawn = vswrOf(candidate.worstReturnLossDb);
    const made = limits[i] ? vswrOf(limits[i].returnLossDb) : drawn;
    return { id: letterOf(i), label: letterOf(i), look: lookOf(i), from: drawn, to: made };
  });
  const limit = vswrOf(asked.returnLossDb);
  const off = [...new Set(limits.flatMap((each) => each?.words ?? []))].join("; ");
  const text = (value: number) => inWords(ratio(value));
  return (
    <ChartFrame
      level={2}
      title="When the cut is not perfect"
      note="worst VSWR over the band"
      summary={`Worst VSWR of each match as drawn and made with ${off}; asked ${text(limit)}`}
      figures={{
        head: ["Match", "as drawn", "at its worst", "with"],
        rows: rows.map((row, i) => [row.label, text(row.from), text(row.to), limits[i]?.words ?? "nothing off"]),
      }}
    >
      <Dumbbells rows={rows} domain={domainOf(rows, limit)} limit={limit} format={text} />
      <p className="pt-1 text-note text-ink-2">
        <span aria-hidden="true">●</span> as drawn &ensp; <span aria-hidden="true">○</span> {off}; the line: asked{" "}
        {digits(limit, 2)}
      </p>
    </ChartFrame>
  );
}

/** From just under the best to just over the worst, the limit in sight; no farther than four times what was asked. */
function domainOf(rows: readonly Dumbbell[], limit: number): [number, number] {
  const low = Math.max(1, Math.floor(Math.min(limit, ...rows.map(({ from }) => from)) * 10 - 0.5) / 10);
  const farthest = low + 4 * Math.max(limit - low, 0.05);
  const worst = rows.flatMap(({ from, to }) => [from, to]).filter((value) => value <= farthest);
  const high = Math.max(limit + 0.25 * (limit - low), ...worst);
  return [low, Math.ceil(high * 10 + 0.5) / 10];
}
