"use client";

import { useRunEditor } from "@/components/runs/run-editor";
import type { Drawing } from "@/components/runs/use-draws";
import { Reading, Readings } from "@/components/ui/reading";
import { digits } from "@/lib/format/quantity";
import type { ToleranceResult } from "@/lib/line/tolerance";

/** Of the frequencies in the run's band, the worst value of a curve. */
function worstIn(
  result: ToleranceResult,
  curve: ArrayLike<number>,
  band: readonly [number, number] | null,
  isMost: boolean,
) {
  const values = Array.from(curve).filter((_, k) => {
    const f = result.frequencies[k]!;
    return !band || (f >= band[0] * (1 - 1e-9) && f <= band[1] * (1 + 1e-9));
  });
  return values.length === 0 ? NaN : isMost ? Math.max(...values) : Math.min(...values);
}

/** The headline figures of many builds. */
export function ToleranceReadings({ drawing: { result, isCurrent } }: { drawing: Drawing }) {
  const { draft } = useRunEditor();
  const { bandHz, sourceName, targets } = draft;
  const where = bandHz ? "worst in the band" : "worst of what is shown";
  const match = result ? worstIn(result, result.returnLossDb.p05, bandHz, false) : NaN;
  const loss = result ? worstIn(result, result.transducerLossDb.p95, bandHz, true) : NaN;
  const judged = result && targets.length > 0 && Number.isFinite(result.yieldPercent);
  return (
    <Readings
      className={`min-w-0 flex-1 phone:grid phone:w-full phone:grid-cols-2 phone:gap-y-3 ${isCurrent ? "" : "[&_*]:text-ink-3!"}`}
    >
      <Reading
        label="Builds that keep every target"
        digits={judged ? digits(result.yieldPercent, 1) : "–"}
        unit="%"
        spoken="per cent"
        target={judged ? "of those drawn" : "no target"}
      />
      <Reading
        label={`Return loss at ${sourceName}, 95 of 100`}
        digits={digits(match, 1)}
        unit="dB"
        spoken="decibels"
        target={`at least, ${where}`}
      />
      <Reading
        label="Total loss, 95 of 100"
        digits={digits(loss, 2)}
        unit="dB"
        spoken="decibels"
        target={`at most, ${where}`}
      />
    </Readings>
  );
}
