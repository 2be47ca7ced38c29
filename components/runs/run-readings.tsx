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
  figure: (analysis: Analysis) => Figure;
}

function targetFor(targets: readonly Target[], { quantity, at }: Shown): Target | undefined {
  return targets.find((target) => {
    const place = target.plane && "at" in target.plane ? target.plane.at : "source";
    return target.quantity === quantity && (at === null || place === at);
  });
}

const states = (isMet: boolean | null): MarkedState => (isMet === null ? "none" : isMet ? "pass" : "fail");

/** The four headline figures: worst over the band, each with its target. */
export function RunReadings({ analysis }: { analysis: Analysis | null }) {
  const { draft } = useRunEditor();
  const { sourceName, loadName, targets, bandHz, designHz, availablePowerW } = draft;
  const shown: Shown[] = [
    {
      label: `Return loss at ${sourceName}`,
      quantity: "returnLoss",
      at: "source",
      figure: (a) => decibels(a.worst.sourceReturnLoss.value, 1),
    },
    { label: `VSWR at ${loadName}`, quantity: "vswr", at: "load", figure: (a) => ratio(a.worst.loadVswr.value) },
    { label: "Total loss", quantity: "loss", at: null, figure: (a) => decibels(a.worst.loss.value) },
    {
      label: "Highest voltage",
      quantity: "voltage",
      at: null,
      figure: (a) => ({
        ...scaled("voltage", a.wave ? a.wave.maxVoltageV * Math.SQRT2 : null, 3),
        unit: "V pk",
        spoken: "volts peak",
      }),
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
        const figure = analysis ? reading.figure(analysis) : { digits: "–", unit: "", spoken: "" };
        const state = target && analysis ? states(verdict(target, analysis).isMet) : undefined;
        return (
          <Reading
            key={reading.label}
            label={reading.label}
            {...figure}
            state={state}
            target={
              target
                ? targetWords(target, reading.at ? (bandHz ?? [designHz, designHz]) : null)
                : without[reading.quantity]
            }
          />
        );
      })}
    </Readings>
  );
}
