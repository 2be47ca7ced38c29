"use client";

import { useEffect, useMemo, useState } from "react";
import { pieceName } from "@/components/runs/strip-pieces";
import { useRunEditor } from "@/components/runs/run-editor";
import { useCircuit } from "@/components/runs/use-analysis";
import { useTolerance, type ToleranceAtWork } from "@/components/runs/use-tolerance";
import { isInTime } from "@/lib/line/targets";
import type { ToleranceRequest } from "@/lib/line/tolerance";
import { shownFrequencies } from "@/lib/runs/shown";
import { spreadOf, usualSpread, type NamedSpread, type SpreadChoices } from "@/lib/runs/spread";

export interface DrawChoices extends SpreadChoices {
  draws: number;
  seed: number;
}

export interface Drawing extends ToleranceAtWork {
  request: ToleranceRequest | null;
  /** what is spread, named */
  spread: readonly NamedSpread[];
  choices: DrawChoices;
  choose: (part: Partial<DrawChoices>) => void;
  /** why nothing can be drawn, a sentence */
  cannot: string | null;
  /** what came out belongs to the request that stands */
  isCurrent: boolean;
}

const pointsShown = 161;
/** Typing is over when nothing has changed for this long. */
const restMs = 500;

/** Draws of the run on the screen, begun anew when anything changes. */
export function useDraws(): Drawing {
  const { draft, lines } = useRunEditor();
  const circuit = useCircuit();
  const [choices, setChoices] = useState<DrawChoices>({ ...usualSpread, draws: 2000, seed: 1 });
  const work = useTolerance();
  const { designHz, bandHz, temperatureC, availablePowerW, targets } = draft;
  const made = useMemo(() => {
    if (!circuit) return { spread: [], request: null };
    const names = circuit.elements.map((_, k) => pieceName(draft.circuit.elements, k, lines));
    const spread = spreadOf(circuit, names, choices);
    const request: ToleranceRequest = {
      circuit,
      frequencies: Array.from(shownFrequencies({ designHz, bandHz }, pointsShown)),
      spread: spread.map(({ path, limits }) => ({ path, limits })),
      draws: choices.draws,
      seed: choices.seed,
      targets: targets.filter((target) => !isInTime(target)),
      temperatureC,
      availablePowerW: availablePowerW ?? undefined,
    };
    return { spread, request };
  }, [circuit, draft.circuit.elements, lines, choices, designHz, bandHz, temperatureC, availablePowerW, targets]);
  const { request } = made;
  const [begun, setBegun] = useState<ToleranceRequest | null>(null);
  const isPossible = request !== null && made.spread.length > 0;
  useEffect(() => {
    if (!isPossible || request === begun) return undefined;
    const timer = setTimeout(
      () => {
        work.start(request);
        setBegun(request);
      },
      begun === null ? 0 : restMs,
    );
    return () => clearTimeout(timer);
    // Only what is asked begins a draw; the hook's own functions change with every render.
    // eslint-disable-next-line react-hooks/exhaustive-deps
  }, [request, begun, isPossible]);
  return {
    ...work,
    ...made,
    choices,
    choose: (part) => setChoices((before) => ({ ...before, ...part })),
    cannot: cannotBecause(circuit !== null, made.spread.length),
    isCurrent: begun === request && work.progress === null,
  };
}

function cannotBecause(hasCables: boolean, count: number): string | null {
  if (!hasCables) return "A piece of this run has no cable yet.";
  return count === 0 ? "Nothing of this run is spread. Give a tolerance above." : null;
}
