/** How many of the draws keep every target. */
import type { Circuit } from "@/lib/line/element";
import { vswr } from "@/lib/line/reflection";
import { indicesInBand, judge, reachedOver, type Reached, type Target } from "@/lib/line/target";
import { isSweptAtSource, judgeTargets, type TargetConditions } from "@/lib/line/targets";

export interface YieldCounter {
  /**
   * Counts one draw.
   * @param circuit - as drawn
   * @param returnLossDb - at the source, at every frequency, from `at` on
   */
  count: (circuit: Circuit, returnLossDb: Float64Array, transducerLossDb: Float64Array, at: number) => void;
  /** share of the draws that keep every target, percent; NaN before the first, and without a target */
  yieldPercent: () => number;
  /** the same of each target alone */
  targetPercents: () => number[];
}

/**
 * @param frequencies - hertz: those of the conditions, then the ends of every target's band
 * @throws RangeError, in words, when a target cannot be worked out for the run as drawn
 */
export function yieldCounter(
  circuit: Circuit,
  targets: readonly Target[],
  conditions: TargetConditions,
  frequencies: ArrayLike<number>,
): YieldCounter {
  requireTargets(circuit, targets, conditions);
  const asked = conditions.frequencies.length;
  const swept = targets.map((target) => isSweptAtSource(target));
  const indices = targets.map(({ bandHz }) => indicesInBand(frequencies, bandHz, asked));
  const others = targets.filter((_, index) => !swept[index]);
  const kept = targets.map(() => 0);
  let [draws, allKept] = [0, 0];
  const count: YieldCounter["count"] = (drawn, returnLossDb, transducerLossDb, at) => {
    const judged = others.length > 0 ? judgeTargets(drawn, others, conditions) : [];
    let areAll = true;
    targets.forEach((target, index) => {
      const values = target.quantity === "loss" ? transducerLossDb : returnLossDb;
      const isMet = swept[index]
        ? judge(target, inQuantity(target, reachedOver(values, indices[index]!, at))).isMet
        : judged[others.indexOf(target)]!.isMet;
      if (isMet) kept[index]!++;
      else areAll = false;
    });
    draws++;
    if (areAll) allKept++;
  };
  const percent = (n: number) => (targets.length > 0 ? (100 * n) / draws : NaN);
  return { count, yieldPercent: () => percent(allKept), targetPercents: () => kept.map(percent) };
}

/** A VSWR is highest where the return loss is least. */
function inQuantity({ quantity }: Target, reached: Reached): Reached {
  if (quantity !== "vswr") return reached;
  const of = (lossDb: number) => vswr(Math.pow(10, -lossDb / 20));
  return { least: of(reached.greatest), greatest: of(reached.least) };
}

/** @throws RangeError, in words, when one of the targets cannot be worked out */
export function requireTargets(circuit: Circuit, targets: readonly Target[], conditions: TargetConditions): void {
  if (targets.length === 0) return;
  judgeTargets(circuit, targets, conditions).forEach(({ why }, index) => {
    if (why !== undefined)
      throw new RangeError(`requireTargets: the target on ${targets[index]!.quantity} cannot be worked out: ${why}`);
  });
}
