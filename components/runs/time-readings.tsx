"use client";

import { useRunEditor } from "@/components/runs/run-editor";
import type { Timing } from "@/components/runs/use-time";
import { Reading, Readings } from "@/components/ui/reading";
import type { MarkedState } from "@/components/ui/state-mark";
import { digits, inWords, scaled, type Figure } from "@/lib/format/quantity";
import type { Target } from "@/lib/runs/schema";

interface Shown {
  label: string;
  quantity: Target["quantity"];
  value: number | undefined;
  figure: (value: number | undefined) => Figure;
}

const percent = (value: number | undefined): Figure => ({
  digits: digits(value === undefined ? value : value * 100, 1),
  unit: "%",
  spoken: "per cent",
});
const seconds = (value: number | undefined) => scaled("time", value, 3);
const volts = (value: number | undefined) => scaled("voltage", value, 3);

/** A target's limit in the words of its reading, and whether the value keeps it. */
function judged(
  { quantity, value, figure }: Shown,
  targets: readonly Target[],
): { words: string; state?: MarkedState } {
  const target = targets.find((each) => each.quantity === quantity);
  if (!target) return { words: "no target" };
  const { atLeast, atMost } = target;
  const words = [
    ...(atLeast === undefined ? [] : [`at least ${inWords(figure(atLeast))}`]),
    ...(atMost === undefined ? [] : [`at most ${inWords(figure(atMost))}`]),
  ].join(", ");
  if (value === undefined || !Number.isFinite(value)) return { words, state: "none" };
  return { words, state: value >= (atLeast ?? -Infinity) && value <= (atMost ?? Infinity) ? "pass" : "fail" };
}

/** The four headline figures of a run over time, each with its target. */
export function TimeReadings({ timing: { signals } }: { timing: Timing }) {
  const { draft } = useRunEditor();
  const read = signals?.readings;
  const shown: Shown[] = [
    { label: `Overshoot at ${draft.loadName}`, quantity: "overshoot", value: read?.overshoot, figure: percent },
    { label: "Settled within 5 %", quantity: "settling", value: read?.settlingS, figure: seconds },
    { label: "One-way delay, half to half", quantity: "delay", value: read?.delayS, figure: seconds },
    { label: "Settled level", quantity: "level", value: read?.settledV, figure: volts },
  ];
  return (
    <Readings className="min-w-0 flex-1 phone:grid phone:w-full phone:grid-cols-2 phone:gap-y-3">
      {shown.map((reading) => {
        const { words, state } = judged(reading, draft.targets);
        return (
          <Reading
            key={reading.label}
            label={reading.label}
            {...reading.figure(reading.value)}
            state={state}
            target={words}
          />
        );
      })}
    </Readings>
  );
}
