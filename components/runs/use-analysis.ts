"use client";

import { useDeferredValue, useMemo } from "react";
import { useRunEditor } from "@/components/runs/run-editor";
import type { Circuit as EngineCircuit } from "@/lib/line/element";
import { analyseRun, type Analysis } from "@/lib/runs/analysis";
import { resolveCircuit } from "@/lib/runs/circuit";

export interface Worked {
  circuit: EngineCircuit | null;
  analysis: Analysis | null;
  /** why there is no analysis, in a sentence */
  trouble: string | null;
  /** the figures belong to the edit before this one */
  isBehind: boolean;
}

/** The run on the screen, resolved against its cables. */
export function useCircuit(): EngineCircuit | null {
  const { draft, lines } = useRunEditor();
  return useMemo(() => {
    const resolved = resolveCircuit(draft.circuit, (ref) => lines.get(ref.cableId));
    return "circuit" in resolved ? resolved.circuit : null;
  }, [draft.circuit, lines]);
}

/**
 * Everything the Line view shows, worked out in the browser as the run is edited. Typing never waits for it: the
 * analysis is made from the last draft React had time for.
 */
export function useAnalysis(): Worked {
  const { draft } = useRunEditor();
  const circuit = useCircuit();
  const { designHz, bandHz, availablePowerW, temperatureC } = draft;
  const asked = useMemo(
    () => ({ circuit, conditions: { designHz, bandHz, availablePowerW, temperatureC } }),
    [circuit, designHz, bandHz, availablePowerW, temperatureC],
  );
  const taken = useDeferredValue(asked);
  const worked = useMemo(() => {
    if (!taken.circuit) return { circuit: null, analysis: null, trouble: "A piece of this run has no cable yet." };
    try {
      return { circuit: taken.circuit, analysis: analyseRun(taken.circuit, taken.conditions), trouble: null };
    } catch (error) {
      if (!(error instanceof RangeError)) throw error;
      return { circuit: taken.circuit, analysis: null, trouble: reason(error.message) };
    }
  }, [taken]);
  return { ...worked, isBehind: taken !== asked };
}

/** The engine's refusals that a valid run can still meet, in the user's words. */
function reason(message: string): string {
  if (message.includes("referenceOhm"))
    return "The source has no resistance, so reflections have no reference. Give the source an impedance, or the run a reference.";
  if (message.includes("sampled"))
    return "The measured load does not cover these frequencies. Choose a band inside its sweep.";
  return "These values cannot be worked out together.";
}
