"use client";

import { useDeferredValue, useMemo, useState } from "react";
import { useRunEditor } from "@/components/runs/run-editor";
import { useCircuit } from "@/components/runs/use-analysis";
import type { Circuit } from "@/lib/line/element";
import type { Drive } from "@/lib/line/time/drive";
import { mostEdges } from "@/lib/line/time/laplace-grid";
import { groundOf, timeSignals, usualTimes, type Ground, type TimeSignals } from "@/lib/runs/time/signals";

/** What may be changed on the Time view; it is not part of the run. */
export interface TimeChoices {
  kind: Drive["kind"];
  amplitudeV: number;
  /** undefined: what suits the line */
  riseS: number | undefined;
  windowS: number | undefined;
  widthS: number | undefined;
  bits: string;
  bitS: number | undefined;
}

export interface Timing {
  circuit: Circuit | null;
  drive: Drive | null;
  windowS: number;
  signals: TimeSignals | null;
  ground: Ground | null;
  trouble: string | null;
  isBehind: boolean;
  choices: TimeChoices;
  choose: (part: Partial<TimeChoices>) => void;
}

const first: TimeChoices = {
  kind: "step",
  amplitudeV: 1,
  riseS: undefined,
  windowS: undefined,
  widthS: undefined,
  bits: "01011001",
  bitS: undefined,
};

/** The drive as chosen, with what suits the line where nothing was. */
function driveOf(choices: TimeChoices, usual: { riseS: number; windowS: number }): Drive {
  const edged = { amplitudeV: choices.amplitudeV, riseS: choices.riseS ?? usual.riseS };
  if (choices.kind === "pulse") return { kind: "pulse", ...edged, widthS: choices.widthS ?? usual.windowS / 8 };
  if (choices.kind === "bits")
    return { kind: "bits", ...edged, bits: choices.bits, bitS: choices.bitS ?? usual.windowS / 8 };
  return { kind: "step", ...edged };
}

/** The run over time, worked out in the browser as it is edited; typing never waits for it. */
export function useTime(): Timing {
  const { draft } = useRunEditor();
  const circuit = useCircuit();
  const [choices, setChoices] = useState(first);
  const { temperatureC } = draft;
  const asked = useMemo(() => ({ circuit, choices, temperatureC }), [circuit, choices, temperatureC]);
  const taken = useDeferredValue(asked);
  const worked = useMemo(() => work(taken), [taken]);
  return {
    ...worked,
    isBehind: taken !== asked,
    choices,
    choose: (part) => setChoices((before) => ({ ...before, ...part })),
  };
}

interface Asked {
  circuit: Circuit | null;
  choices: TimeChoices;
  temperatureC: number;
}

type Worked = Pick<Timing, "circuit" | "drive" | "windowS" | "signals" | "ground" | "trouble">;

function work({ circuit, choices, temperatureC }: Asked): Worked {
  const none = { circuit, drive: null, windowS: 0, signals: null, ground: null };
  if (!circuit) return { ...none, trouble: "A piece of this run has no cable yet." };
  const usual = usualTimes(circuit);
  const drive = driveOf(choices, usual);
  const windowS = choices.windowS ?? Math.min(usual.windowS, mostEdges * drive.riseS);
  try {
    const signals = timeSignals(circuit, drive, windowS, temperatureC);
    return { circuit, drive, windowS, signals, ground: groundOf(circuit, drive, windowS, temperatureC), trouble: null };
  } catch (error) {
    if (!(error instanceof RangeError)) throw error;
    return { ...none, drive, windowS, trouble: reason(error.message, circuit) };
  }
}

/** Why the engine refuses a run over time, in the user's words. */
function reason(message: string, circuit: Circuit): string {
  if (/windowS/.test(message))
    return "This window is too long for so short an edge. Show less, or take a longer edge: at most 2 048 edges fit.";
  const ends = [circuit.source, circuit.load];
  if (ends.some((end) => end.kind === "constant" && end.imOhm !== 0))
    return "An end with the same reactance at every frequency has no signal. Give it as a resistor with a coil or a capacitor.";
  if (/sampled/.test(message))
    return "A measured end is known at its frequencies only, which is not enough for a signal. Give it as parts.";
  if (circuit.elements.some((each) => each.kind === "part" && each.q !== undefined && each.qAtHz === undefined))
    return "A part with the same Q at every frequency has no signal. Say at which frequency its Q holds.";
  return "These values cannot be worked out over time together.";
}
