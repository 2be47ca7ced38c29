/** Ways to match a run with the team's cables, at its load or before any of its pieces. Pure. */
import type { CableLine } from "@/lib/cables/line";
import type { Element as EngineElement, Termination } from "@/lib/line/element";
import { distinct } from "@/lib/line/match/distinct";
import { findMatches, type Matches } from "@/lib/line/match/find-matches";
import type { MatchLine, MatchMethod } from "@/lib/line/match/match-request";
import { rank } from "@/lib/line/match/rank";
import { sweep } from "@/lib/line/run";
import type { Element, LineRef } from "@/lib/runs/circuit-schema";

export interface MatchAsked {
  load: Termination;
  /** the pieces between the match and the load, from the match to the load; none where it stands at the load */
  behind: EngineElement[];
  targetOhm: number;
  designHz: number;
  bandHz: readonly [number, number];
  returnLossDb: number;
  coilQ: number | undefined;
  capacitorQ: number | undefined;
  temperatureC: number;
  /** what only some methods ask; left out, each has its usual value, and there is no notch */
  notchHz?: number | undefined;
  spacingWavelengths?: number | undefined;
  firstDistanceWavelengths?: number | undefined;
  sections?: number | undefined;
  endAllowanceM?: number | undefined;
}

export type MatchesFound = Matches;

function matchLine({ cableId, revision, designation, model }: CableLine): MatchLine {
  return { cableId, revision, label: designation, model };
}

/** What is cut from the one chosen cable, or needs none. */
const fromOneCable: readonly MatchMethod[] = [
  "shuntStub",
  "seriesStub",
  "doubleStub",
  "parallelCables",
  "lSection",
  "piNetwork",
  "tNetwork",
  "pad",
  "notchStub",
];
/** What takes whatever cable has the impedance. */
const fromAnyCable: readonly MatchMethod[] = [
  "quarterWave",
  "seriesSection",
  "binomial",
  "equalRipple",
  "alternatingSections",
];

/**
 * Stubs and paralleled lengths are cut from one cable, sections from whatever cable has the impedance: so stubs do not
 * come once for every cable there is.
 * @param feeder - the line that leads to the network, and from it to what is matched
 * @param stubLine - what stubs and paralleled lengths are cut from
 * @param sectionLines - what may serve as a section
 */
export function matchesFor(
  asked: MatchAsked,
  feeder: CableLine,
  stubLine: CableLine,
  sectionLines: readonly CableLine[],
): MatchesFound {
  const { coilQ, capacitorQ, ...rest } = asked;
  const common = { ...rest, feeder: matchLine(feeder), partQ: { coilQ, capacitorQ } };
  const cut = findMatches({
    ...common,
    lines: [matchLine(stubLine)],
    methods: fromOneCable,
  });
  const sections = findMatches({
    ...common,
    lines: sectionLines.map(matchLine),
    methods: fromAnyCable,
    pairs: true,
  });
  return {
    candidates: distinct(rank([...cut.candidates, ...sections.candidates], asked.returnLossDb)),
    refused: [...cut.refused, ...sections.refused],
    omitted: [...cut.omitted, ...sections.omitted],
  };
}

export interface CandidateCurve {
  returnLossDb: Float64Array;
  reflection: { re: Float64Array; im: Float64Array };
}

/** A candidate over frequency, seen from its target side. Without elements it is what is matched, alone. */
export function candidateCurve(
  elements: readonly EngineElement[],
  asked: MatchAsked,
  frequencies: ArrayLike<number>,
): CandidateCurve {
  const source = { kind: "constant", reOhm: asked.targetOhm, imOhm: 0 } as const;
  const at = sweep({ source, elements: [...elements, ...asked.behind], load: asked.load }, frequencies, {
    temperatureC: asked.temperatureC,
  });
  return { returnLossDb: at.returnLossDb, reflection: at.reflection };
}

/** What the match sees at the design frequency, ohm; null where it is open or cannot be worked out. */
export function seenAt({
  load,
  behind,
  targetOhm,
  designHz,
  temperatureC,
}: MatchAsked): { re: number; im: number } | null {
  const source = { kind: "constant", reOhm: targetOhm, imOhm: 0 } as const;
  try {
    const { inputImpedance } = sweep({ source, elements: behind, load }, [designHz], { temperatureC });
    const seen = { re: inputImpedance.re[0]!, im: inputImpedance.im[0]! };
    return Number.isFinite(seen.re) && Number.isFinite(seen.im) ? seen : null;
  } catch (error) {
    if (!(error instanceof RangeError)) throw error;
    return null;
  }
}

/** Reflection at every element of a candidate, from the load to its target side: the steps on the Smith chart. */
export function candidateSteps(elements: readonly EngineElement[], asked: MatchAsked): { re: number; im: number }[] {
  const steps: { re: number; im: number }[] = [];
  const cut = 24;
  for (let first = elements.length; first >= 0; first--) {
    const [element, ...behind] = elements.slice(first);
    const parts = element && partial(element, cut);
    for (const part of parts ?? [undefined]) {
      const { reflection } = candidateCurve(part ? [part, ...behind] : behind, asked, [asked.designHz]);
      steps.push({ re: reflection.re[0]!, im: reflection.im[0]! });
    }
  }
  return steps;
}

/** An element growing to its full size, so that its step is an arc and not a chord. */
function partial(element: EngineElement, count: number): EngineElement[] {
  const shares = Array.from({ length: count }, (_, i) => (i + 1) / count);
  if (element.kind === "cable") return shares.map((share) => ({ ...element, lengthM: element.lengthM * share }));
  if (element.kind !== "part") return [element];
  const { lH, cF, connection } = element;
  const isSeries = connection === "series";
  // In series a reactance grows from 0 with L or 1/C; across the line a susceptance grows from 0 with 1/L or C.
  if (lH !== undefined) return shares.map((share) => ({ ...element, lH: isSeries ? lH * share : lH / share }));
  if (cF !== undefined) return shares.map((share) => ({ ...element, cF: isSeries ? cF / share : cF * share }));
  return [element];
}

/** A candidate's elements as a run stores them: cables by reference. */
export function storedElements(elements: readonly EngineElement[]): Element[] {
  const ref = (line: { cableId?: string; model: EngineLineModel }): LineRef =>
    line.cableId === undefined ? { model: line.model } : { cableId: line.cableId };
  return elements.map((element): Element => {
    if (element.kind === "cable" || element.kind === "stub") return { ...element, line: ref(element.line) };
    if (element.kind !== "parallel") return element;
    return { ...element, branches: element.branches.map((branch) => ({ ...branch, line: ref(branch.line) })) };
  });
}
type EngineLineModel = Extract<EngineElement, { kind: "cable" }>["line"]["model"];
