"use client";

import { useDeferredValue, useMemo, useState } from "react";
import { lineNamed } from "@/components/runs/strip-pieces";
import { useRunEditor } from "@/components/runs/run-editor";
import type { CableLine } from "@/lib/cables/line";
import { matchesFor, type MatchAsked, type MatchesFound } from "@/lib/runs/matching";

/** What may be changed on the Match view that is not part of the run. */
export interface MatchChoices {
  targetOhm: number;
  returnLossDb: number;
  coilQ: number | undefined;
  capacitorQ: number | undefined;
  stubCableId: string | null;
}

export interface Matching {
  asked: MatchAsked;
  feeder: CableLine | null;
  stubLine: CableLine | null;
  found: MatchesFound | null;
  /** why nothing was looked for */
  trouble: string | null;
  isBehind: boolean;
  choices: MatchChoices;
  choose: (part: Partial<MatchChoices>) => void;
}

const usual = { coilQ: 120, capacitorQ: 1000 };
/** VSWR 1.5 where the run asks for nothing. */
const usualReturnLossDb = 14;

/** The ways to match the run's load, worked out in the browser as anything changes. */
export function useMatches(): Matching {
  const { draft, lines } = useRunEditor();
  const { circuit, designHz, bandHz, temperatureC, targets } = draft;
  const wished = targets.find((t) => t.quantity === "returnLoss" && t.atLeast !== undefined)?.atLeast;
  const [choices, setChoices] = useState<MatchChoices>({
    targetOhm: circuit.source.kind === "constant" && circuit.source.reOhm > 0 ? circuit.source.reOhm : 50,
    returnLossDb: wished ?? usualReturnLossDb,
    ...usual,
    stubCableId: null,
  });
  const feeder = useMemo(() => feederOf(circuit.elements, lines), [circuit.elements, lines]);
  const stubLine = (choices.stubCableId !== null && lines.get(choices.stubCableId)) || feeder;
  const { targetOhm, returnLossDb, coilQ, capacitorQ } = choices;
  const request = useMemo(() => {
    const asked: MatchAsked = {
      load: circuit.load,
      targetOhm,
      designHz,
      bandHz: bandHz ?? [designHz, designHz],
      returnLossDb,
      coilQ,
      capacitorQ,
      temperatureC,
    };
    return { asked, feeder, stubLine, sections: feeder ? alikeLines(lines, feeder) : [] };
  }, [
    circuit.load,
    targetOhm,
    designHz,
    bandHz,
    returnLossDb,
    coilQ,
    capacitorQ,
    temperatureC,
    feeder,
    stubLine,
    lines,
  ]);
  const taken = useDeferredValue(request);
  const worked = useMemo(() => work(taken), [taken]);
  return {
    asked: taken.asked,
    feeder,
    stubLine,
    ...worked,
    isBehind: taken !== request,
    choices,
    choose: (part) => setChoices((before) => ({ ...before, ...part })),
  };
}

function feederOf(
  elements: ReturnType<typeof useRunEditor>["draft"]["circuit"]["elements"],
  lines: ReadonlyMap<string, CableLine>,
) {
  const plain = elements.findLast((element) => element.kind === "cable" && (element.paralleled ?? 1) === 1);
  return plain?.kind === "cable" ? (lineNamed(plain.line, lines) ?? null) : null;
}

/** Cables that can be joined to the feeder without changing kind, and may be used. */
function alikeLines(lines: ReadonlyMap<string, CableLine>, feeder: CableLine): CableLine[] {
  const usable = [...lines.values()].filter(({ state }) => state === "approved" || state === "restricted");
  const isPair = (line: CableLine) => line.family !== "coaxial";
  return [feeder, ...usable.filter((line) => line.cableId !== feeder.cableId && isPair(line) === isPair(feeder))].slice(
    0,
    60,
  );
}

interface Request {
  asked: MatchAsked;
  feeder: CableLine | null;
  stubLine: CableLine | null;
  sections: CableLine[];
}

function work({ asked, feeder, stubLine, sections }: Request): Pick<Matching, "found" | "trouble"> {
  if (!feeder || !stubLine)
    return {
      found: null,
      trouble: "This run has no cable yet, so there is nothing to match with. Add a cable on the Line view.",
    };
  try {
    return { found: matchesFor(asked, feeder, stubLine, sections), trouble: null };
  } catch (error) {
    if (!(error instanceof RangeError)) throw error;
    return {
      found: null,
      trouble: "These values cannot be matched together. Check the load, the band and the asked return loss.",
    };
  }
}
