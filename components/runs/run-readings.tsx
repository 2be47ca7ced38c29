"use client";

import { useRunEditor } from "@/components/runs/run-editor";
import { Reading, Readings } from "@/components/ui/reading";
import type { MarkedState } from "@/components/ui/state-mark";
import { decibels, inWords, ratio, scaled, type Figure } from "@/lib/format/quantity";
import type { Analysis } from "@/lib/runs/analysis";
import type { Target } from "@/lib/runs/schema";
import { targetWords } from "@/lib/runs/sentences";
import { verdict, type Judged } from "@/lib/runs/targets";

interface Shown {
  label: string;
  quantity: Judged;
  at: "source" | "load" | null;
  /** over the run's own band */
  value: (analysis: Analysis) => number | null;
  /** @param decimals - more than usual, where rounding would hide which side of a limit the value is on */
  figure: (value: number | null, decimals: number) => Figure;
}

function targetFor(targets: readonly Target[], { quantity, at }: Shown): Target | undefined {
  return targets.find((target) => {
    const place = target.plane && "at" in target.plane ? target.plane.at : "source";
    return target.quantity === quantity && (at === null || place === at);
  });
}

const states = (isMet: boolean | null): MarkedState => (isMet === null ? "none" : isMet ? "pass" : "fail");

/** Decimals to add so that a value and the limit it is held against do not look the same when they are not. */
function moreDecimals(value: number | null, limit: number | null): number {
  if (value === null || limit === null || value === limit) return 0;
  const apart = Math.abs(value - limit);
  return apart < 0.005 ? 2 : apart < 0.05 ? 1 : 0;
}

/** The four headline figures: worst over the band, each with its target. */
export function RunReadings({ analysis }: { analysis: Analysis | null }) {
  const { draft } = useRunEditor();
  const { sourceName, loadName, targets, bandHz, designHz, availablePowerW } = draft;
  const shown: Shown[] = [
    {
      label: `Return loss at ${sourceName}`,
      quantity: "returnLoss",
      at: "source",
      figure: (value, decimals) => decibels(value, 1 + decimals),
      value: (a) => a.worst.sourceReturnLoss.value,
    },
    {
      label: `VSWR at ${loadName}`,
      quantity: "vswr",
      at: "load",
      figure: (value, decimals) => ratio(value, 2 + decimals),
      value: (a) => a.worst.loadVswr.value,
    },
    {
      label: "Total loss",
      quantity: "loss",
      at: null,
      figure: (value, decimals) => decibels(value, 2 + decimals),
      value: (a) => a.worst.loss.value,
    },
    {
      label: "Highest voltage",
      quantity: "voltage",
      at: null,
      figure: (volts) => {
        const figure = scaled("voltage", volts, 3);
        return { ...figure, unit: `${figure.unit} pk`, spoken: `${figure.spoken} peak` };
      },
      value: (a) => (a.wave ? a.wave.maxVoltageV * Math.SQRT2 : null),
    },
  ];
  const without: Record<Judged, string> = {
    returnLoss: bandHz ? "worst in the band" : "at one frequency",
    vswr: bandHz ? "worst in the band" : "at one frequency",
    loss: "no target",
    voltage: availablePowerW === null ? "give a power" : `at ${inWords(scaled("power", availablePowerW, 3))}`,
  };
  return (
    <Readings className="min-w-0 flex-1 phone:grid phone:w-full phone:grid-cols-2 phone:gap-y-3">
      {shown.map((reading) => {
        const target = targetFor(targets, reading);
        const judgement = target && analysis ? verdict(target, analysis) : null;
        const value = analysis && (judgement ? judgement.value : reading.value(analysis));
        const limit = target?.atLeast ?? target?.atMost ?? null;
        const band = target?.bandHz ?? bandHz ?? [designHz, designHz];
        return (
          <Reading
            key={reading.label}
            label={reading.label}
            {...reading.figure(value, moreDecimals(value, limit))}
            state={judgement ? states(judgement.isMet) : undefined}
            target={target ? targetWords(target, reading.at || target.bandHz ? band : null) : without[reading.quantity]}
          />
        );
      })}
    </Readings>
  );
}
