"use client";

import { BandPlot } from "@/components/plot/band-plot";
import { ChartFrame } from "@/components/plot/chart-frame";
import { useRunEditor } from "@/components/runs/run-editor";
import { asGiven, frequencyAxis } from "@/lib/format/axis";
import { digits } from "@/lib/format/quantity";
import type { ToleranceResult } from "@/lib/line/tolerance";
import { plotted, returnLossDomain, thinned } from "@/lib/runs/curves";

interface Props {
  which: "returnLoss" | "loss";
  result: ToleranceResult;
}

/** From a little below the least to a little above the most. */
function around(values: readonly (number | null)[]): [number, number] {
  const there = values.filter((value) => value !== null);
  if (there.length === 0) return [0, 1];
  const [low, high] = [Math.min(...there), Math.max(...there)];
  const margin = Math.max(0.05 * (high - low), 0.02 * high, 0.01);
  return [Math.max(0, low - margin), high + margin];
}

/** Return loss or loss of all builds over the band. */
export function ToleranceChart({ which, result }: Props) {
  const { draft } = useRunEditor();
  const { bandHz, targets, sourceName } = draft;
  const isMatch = which === "returnLoss";
  const curves = isMatch ? result.returnLossDb : result.transducerLossDb;
  const target = targets.find(
    ({ quantity, plane }) => quantity === which && !(plane && "at" in plane && plane.at === "load"),
  );
  const limit = isMatch ? target?.atLeast : target?.atMost;
  const xs = Array.from(result.frequencies);
  const axis = frequencyAxis(xs.at(-1) ?? 1);
  const shown = [curves.min, curves.p05, curves.median, curves.p95].map(plotted);
  const yDomain = isMatch
    ? returnLossDomain(shown, limit ?? null)
    : around([...plotted(curves.min), ...plotted(curves.max), limit ?? null]);
  const decimals = isMatch ? 1 : 2;
  const worst = isMatch ? Math.min(...curves.p05) : Math.max(...curves.p95);
  const title = isMatch ? `Return loss at ${sourceName}` : "Total loss";
  const rows = xs.map((x, k) => [
    axis.format(x),
    ...[curves.min, curves.p05, curves.median, curves.p95, curves.max].map((curve) => digits(curve[k], decimals + 1)),
  ]);
  return (
    <ChartFrame
      title={title}
      note={`dB; the wash holds 90 of 100 builds, dashes hold all that were drawn; ${isMatch ? "higher" : "lower"} is better`}
      summary={`${title}: 95 of 100 builds ${isMatch ? "reach at least" : "lose at most"} ${digits(worst, decimals)} dB at the worst frequency shown`}
      figures={{ head: [axis.unit, "lowest", "5 %", "median", "95 %", "highest"], rows: thinned(rows, 120) }}
    >
      <BandPlot
        xs={xs}
        curves={curves}
        yDomain={yDomain}
        formatX={axis.format}
        formatY={(value) => digits(value, decimals)}
        xUnit={axis.unit}
        band={bandHz ?? undefined}
        limit={
          limit === undefined
            ? undefined
            : { value: limit, forbidden: isMatch ? "below" : "above", label: `target ${asGiven(limit)}` }
        }
      />
    </ChartFrame>
  );
}
