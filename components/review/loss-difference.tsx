"use client";

import { ChartFrame } from "@/components/plot/chart-frame";
import { CurvePlot } from "@/components/plot/curve-plot";
import { lossDbPer100m } from "@/lib/cables/model";
import type { CableRevision } from "@/lib/cables/revisions/schema";
import { digits, frequency, inWords, megahertz, significantDigits } from "@/lib/format/quantity";

interface Props {
  before: CableRevision;
  after: CableRevision;
}

const span = [1e6, 1e9] as const;
const perDecade = 16;
const frequencies = Array.from({ length: 3 * perDecade + 1 }, (_, i) => span[0] * 10 ** (i / perDecade));

/** By how many per cent the later revision loses more, null where the former loses nothing. */
export function lossDifference(before: CableRevision, after: CableRevision): (number | null)[] {
  return frequencies.map((f) => {
    const percent = 100 * (lossDbPer100m(after.model, f) / lossDbPer100m(before.model, f) - 1);
    return Number.isFinite(percent) ? percent : null;
  });
}

const signed = (value: number | null | undefined, decimals: number) =>
  `${(value ?? 0) > 0 ? "+" : ""}${digits(value, decimals)}`;

/** Ends of the axis: zero among them, a fifth of room, and never so narrow that rounding fills it. */
function domainOf(values: readonly (number | null)[]): [number, number] {
  const known = values.filter((value) => value !== null);
  const [low, high] = [Math.min(0, ...known), Math.max(0, ...known)];
  const around = Math.max(0.2, 0.2 * (high - low));
  return [low - around, high + around];
}

/** How much more the revision in review loses than the one before, over three decades. */
export function LossDifference({ before, after }: Props) {
  const values = lossDifference(before, after);
  const [first, last] = [values[0], values.at(-1)];
  const note = `per cent, revision ${after.revision} against revision ${before.revision}, 20 °C`;
  return (
    <ChartFrame
      title="Difference in loss"
      note={note}
      summary={`Difference in loss, ${note}: ${signed(first, 1)} at 1 MHz, ${signed(last, 1)} at 1 GHz`}
      figures={{
        head: ["MHz", "per cent"],
        rows: frequencies
          .map((f, i) => [significantDigits(f / 1e6, 3), signed(values[i], 2)])
          .filter((_, i) => i % 4 === 0),
      }}
    >
      <CurvePlot
        xs={frequencies}
        series={[{ id: "difference", label: "models", look: 1, values }]}
        xDomain={span}
        yDomain={domainOf(values)}
        yKind="linear"
        formatX={megahertz}
        readX={(f) => inWords(frequency(Number(f.toPrecision(3))))}
        formatY={(value) => signed(value, Math.abs(value) < 1 && value !== 0 ? 1 : 0)}
        readY={(value) => `${signed(value, 2)} %`}
        xUnit="MHz"
        height={168}
        labelRoom={58}
        firstWidth={700}
      />
    </ChartFrame>
  );
}
