/** A run with one cable after the other in some of its places. Pure. */
import type { z } from "zod";
import type { Family } from "@/lib/cables/schema";
import { frequenciesOf } from "@/lib/compute/frequencies";
import { refusal } from "@/lib/compute/path-faults";
import { lengthOfCable, withLine } from "@/lib/compute/swap/places";
import type { SwapAsked, swapAnswerSchema } from "@/lib/compute/swap/schema";
import { wireNumber, wireNumbers } from "@/lib/compute/wire";
import type { Circuit, LineModel } from "@/lib/line/element";
import type { Judgement, Target } from "@/lib/line/target";
import { judgeTargets } from "@/lib/line/targets";

export interface SwapCandidate {
  cableId: string;
  designation: string;
  family: Family;
  model: LineModel;
  /** null: unknown */
  massKgPerM: number | null;
}

type Answer = z.infer<typeof swapAnswerSchema>;

interface Tried {
  candidate: SwapCandidate;
  judged: Judgement[];
  totalLossDb: number;
}

/** A target that every loss keeps: its value is the loss at its worst. */
const anyLoss: Target = { quantity: "loss", atMost: Number.MAX_VALUE };

/**
 * @param candidates - each tried in all the places at once
 * @param refused - cables that were not tried
 */
export function swapAnswer(
  circuit: Circuit,
  candidates: readonly SwapCandidate[],
  refused: Answer["refused"],
  asked: Omit<SwapAsked, "circuit">,
): Answer {
  const { paths, targets } = asked;
  const conditions = { ...asked, frequencies: frequenciesOf(asked) };
  const lengthM = lengthOfCable(circuit, paths);
  const tried: Tried[] = [];
  const impossible: Answer["refused"] = [];
  for (const candidate of candidates) {
    const { cableId, designation, model } = candidate;
    const why = refusal(() => {
      const judged = judgeTargets(withLine(circuit, paths, { model }), [...targets, anyLoss], conditions);
      tried.push({ candidate, judged: judged.slice(0, -1), totalLossDb: judged.at(-1)!.value });
    });
    if (why !== undefined) impossible.push({ cableId, designation, why });
  }
  const items = tried.sort((a, b) => order(a, b, targets)).map((each) => itemOf(each, lengthM));
  return { items, refused: [...refused, ...impossible] };
}

function itemOf({ candidate, judged, totalLossDb }: Tried, lengthM: number): Answer["items"][number] {
  const { cableId, designation, family, massKgPerM } = candidate;
  return {
    ...{ cableId, designation, family },
    targetsMet: met(judged),
    margins: wireNumbers(judged.map(({ margin }) => margin)),
    totalLossDb: wireNumber(totalLossDb),
    massKg: massKgPerM === null ? null : wireNumber(massKgPerM * lengthM),
  };
}

const met = (judged: readonly Judgement[]) => judged.filter(({ isMet }) => isMet).length;

/** Best first; what is not defined comes last. */
function order(a: Tried, b: Tried, targets: readonly Target[]): number {
  const counts = met(b.judged) - met(a.judged);
  if (counts !== 0) return counts;
  const margins = least(b.judged, targets) - least(a.judged, targets);
  if (margins > 0 || margins < 0) return margins;
  return loss(a) - loss(b) || a.candidate.designation.localeCompare(b.candidate.designation);
}

const loss = ({ totalLossDb }: Tried) => (totalLossDb < Number.MAX_VALUE ? totalLossDb : Number.MAX_VALUE);

/** The margin that is least as a share of its limit; margins of different quantities compare no other way. */
function least(judged: readonly Judgement[], targets: readonly Target[]): number {
  return judged.reduce((smallest, { margin }, index) => {
    const { atLeast, atMost } = targets[index]!;
    const share = margin / (Math.abs(atMost ?? 0) || Math.abs(atLeast ?? 0) || 1);
    return Math.min(smallest, Number.isNaN(share) ? -Number.MAX_VALUE : share);
  }, Number.MAX_VALUE);
}
