"use client";

import { useDeferredValue, useMemo, useState } from "react";
import { lineNamed } from "@/components/runs/strip-pieces";
import { useRunEditor } from "@/components/runs/run-editor";
import type { CableLine } from "@/lib/cables/line";
import type { CutTolerance } from "@/lib/line/match/at-limits";
import { resolveElements } from "@/lib/runs/circuit";
import type { RunDraft } from "@/lib/runs/edit";
import { feederTo, piecesBehind, placeOfMatch } from "@/lib/runs/match-place";
import { matchesFor, type MatchAsked, type MatchesFound } from "@/lib/runs/matching";

/** What may be changed on the Match view that is not part of the run. */
export interface MatchChoices {
  /** pieces between the match and the load */
  place: number;
  targetOhm: number;
  returnLossDb: number;
  coilQ: number | undefined;
  capacitorQ: number | undefined;
  stubCableId: string | null;
  tolerance: CutTolerance;
  /** see `MatchAsked`; undefined is the usual value, of the notch none */
  notchHz: number | undefined;
  spacingWavelengths: number | undefined;
  firstDistanceWavelengths: number | undefined;
  sections: number | undefined;
  endAllowanceM: number | undefined;
}

export interface Matching {
  asked: MatchAsked;
  stubLine: CableLine | null;
  found: MatchesFound | null;
  /** why nothing was looked for */
  trouble: string | null;
  isBehind: boolean;
  choices: MatchChoices;
  choose: (part: Partial<MatchChoices>) => void;
}

const usual = {
  coilQ: 120,
  capacitorQ: 1000,
  tolerance: { lengthM: 0.005, valuePercent: 5 },
  notchHz: undefined,
  spacingWavelengths: undefined,
  firstDistanceWavelengths: undefined,
  sections: undefined,
  endAllowanceM: undefined,
};
/** VSWR 1.5 where the run asks for nothing. */
const usualReturnLossDb = 14;

function firstChoices({ circuit, targets }: RunDraft): MatchChoices {
  const wished = targets.find((t) => t.quantity === "returnLoss" && t.atLeast !== undefined)?.atLeast;
  return {
    ...usual,
    place: placeOfMatch(circuit.elements),
    targetOhm: circuit.source.kind === "constant" && circuit.source.reOhm > 0 ? circuit.source.reOhm : 50,
    returnLossDb: wished ?? usualReturnLossDb,
    stubCableId: null,
  };
}

/** The ways to match the run at the chosen place, worked out in the browser as anything changes. */
export function useMatches(): Matching {
  const { draft } = useRunEditor();
  const [chosen, setChoices] = useState<MatchChoices>(() => firstChoices(draft));
  // The run may have become shorter since: an undo, another's edit.
  const choices = { ...chosen, place: Math.min(chosen.place, draft.circuit.elements.length) };
  const request = useRequest(choices);
  const taken = useDeferredValue(request);
  const worked = useMemo(() => work(taken), [taken]);
  return {
    asked: taken.asked,
    stubLine: request.stubLine,
    ...worked,
    isBehind: taken !== request,
    choices,
    choose: (part) => setChoices((before) => ({ ...before, ...part })),
  };
}

interface Request {
  asked: MatchAsked;
  feeder: CableLine | null;
  stubLine: CableLine | null;
  sections: CableLine[];
  /** every piece behind the match has its cable */
  isWhole: boolean;
}

/** What only some methods ask, the same object while nothing of it changes. */
function useSpecial(choices: MatchChoices) {
  const { notchHz, spacingWavelengths, firstDistanceWavelengths, sections, endAllowanceM } = choices;
  return useMemo(
    () => ({ notchHz, spacingWavelengths, firstDistanceWavelengths, sections, endAllowanceM }),
    [notchHz, spacingWavelengths, firstDistanceWavelengths, sections, endAllowanceM],
  );
}

function useRequest(choices: MatchChoices): Request {
  const { place, targetOhm, returnLossDb, coilQ, capacitorQ, stubCableId } = choices;
  const special = useSpecial(choices);
  const { draft, lines } = useRunEditor();
  const { circuit, designHz, bandHz, temperatureC } = draft;
  return useMemo(() => {
    const ref = feederTo(circuit.elements, place);
    const feeder = (ref && lineNamed(ref, lines)) ?? null;
    const behind = resolveElements(piecesBehind(circuit.elements, place), ({ cableId }) => lines.get(cableId));
    const asked: MatchAsked = {
      load: circuit.load,
      behind: "elements" in behind ? behind.elements : [],
      targetOhm,
      designHz,
      bandHz: bandHz ?? [designHz, designHz],
      returnLossDb,
      coilQ,
      capacitorQ,
      temperatureC,
      ...special,
    };
    return {
      asked,
      feeder,
      stubLine: (stubCableId !== null && lines.get(stubCableId)) || feeder,
      sections: feeder ? alikeLines(lines, feeder) : [],
      isWhole: "elements" in behind,
    };
  }, [
    circuit,
    place,
    targetOhm,
    designHz,
    bandHz,
    returnLossDb,
    coilQ,
    capacitorQ,
    temperatureC,
    stubCableId,
    lines,
    special,
  ]);
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

function work({ asked, feeder, stubLine, sections, isWhole }: Request): Pick<Matching, "found" | "trouble"> {
  if (!isWhole)
    return { found: null, trouble: "A piece behind the match has no cable yet. Give it one on the Line view." };
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
