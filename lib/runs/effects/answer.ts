/** Runs worked out twice, as they stand and with another revision of a cable in them. Pure: it runs in a thread of its own. */
import type { Circuit } from "@/lib/line/element";
import type { Conditions } from "@/lib/runs/analysis";
import { judgeable } from "@/lib/runs/effects/judge";
import type { CableUses, Effect, RunEffect } from "@/lib/runs/effects/schema";
import type { Target } from "@/lib/runs/schema";
import { bandOf, judged, type Judgeable, verdict, type Verdict } from "@/lib/runs/targets";

/** One run, its lines found: as it stands and as it would. */
export interface RunBothWays {
  about: Pick<RunEffect, "runId" | "number" | "name" | "state" | "ownerName" | "revisions" | "isAffected">;
  conditions: Conditions;
  targets: Target[];
  now: Circuit;
  then: Circuit;
}

/** A limit nothing breaks: what has no target is still told. */
const told = (quantity: Target["quantity"]): Target => ({ quantity, atMost: Infinity });

const finite = (value: number | null | undefined) => (value != null && Number.isFinite(value) ? value : null);
const isJudged = (target: Target) => (judged as readonly string[]).includes(target.quantity);

function whyNot(target: Target, { availablePowerW }: Conditions, { now, then }: { now: Verdict; then: Verdict }) {
  if (now.value !== null && then.value !== null) return null;
  if (!isJudged(target)) return "A target on this quantity is not worked out here.";
  if (target.plane && !("at" in target.plane)) return "A target inside the run is not worked out here.";
  if (target.quantity === "voltage" && availablePowerW === null) return "The run names no available power.";
  return "It has no value in this run.";
}

/** Relative to what it is now, per cent; two infinite ones are the same. */
function changeOf(now: number | null, then: number | null): number | null {
  if (now === null || then === null) return null;
  if (now === then) return 0;
  const change = (100 * (then - now)) / Math.abs(now);
  return Number.isFinite(change) ? change : null;
}

function effectOf(target: Target, run: RunBothWays, [now, then]: readonly [Judgeable, Judgeable]): Effect {
  const both = { now: verdict(target, now), then: verdict(target, then) };
  const { atLeast, atMost } = target;
  const hasLimit = finite(atLeast) !== null || finite(atMost) !== null;
  const wired = ({ value, frequencyHz, isMet }: Verdict) => ({
    value: finite(value),
    frequencyHz: finite(frequencyHz),
    isMet: hasLimit ? isMet : null,
  });
  const [from, to] = bandOf(target, now);
  return {
    quantity: target.quantity,
    plane: target.plane ?? null,
    bandHz: [from, to],
    ...{ atLeast: finite(atLeast), atMost: finite(atMost), now: wired(both.now), then: wired(both.then) },
    changePercent: changeOf(both.now.value, both.then.value),
    why: whyNot(target, run.conditions, both),
  };
}

/** @returns the run with every target both ways; a sentence instead where the engine refuses it */
export function runEffect(run: RunBothWays): RunEffect {
  const { about, conditions, targets, now, then } = run;
  try {
    const ways = [judgeable(now, conditions), judgeable(then, conditions)] as const;
    const asked = targets.some(({ quantity }) => quantity === "loss") ? targets : [...targets, told("loss")];
    const effects = asked.map((target) => effectOf(target, run, ways));
    const changes = effects.flatMap(({ changePercent }) => changePercent ?? []);
    const largest = changes.reduce((most, each) => (Math.abs(each) > Math.abs(most) ? each : most), 0);
    return {
      ...{ ...about, effects, why: null, largestPercent: changes.length > 0 ? largest : null },
      changesState: effects.some((effect) => effect.now.isMet !== effect.then.isMet),
    };
  } catch (error) {
    if (!(error instanceof RangeError)) throw error;
    const why = `It cannot be worked out: ${error.message.replace(/^\w+: /, "")}.`;
    return { ...about, effects: [], changesState: false, largestPercent: null, why };
  }
}

/** Runs in which a target changes state come first, then by how much the most changed of their figures changes. */
function byChange(a: RunEffect, b: RunEffect): number {
  const size = ({ changesState, largestPercent }: RunEffect) =>
    (changesState ? 1e12 : 0) + (largestPercent === null ? -1 : Math.abs(largestPercent));
  return size(b) - size(a);
}

/** Where a cable is used, with what a revision of it does there. */
export function effectsAnswer(uses: Omit<CableUses, "items">, runs: readonly RunBothWays[]): CableUses {
  return { ...uses, items: runs.map(runEffect).sort(byChange) };
}
