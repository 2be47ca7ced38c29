/** What the Line view says in words: what is true, then what to do. Pure. */
import { decibels, frequency, inWords, ratio } from "@/lib/format/quantity";
import type { Analysis } from "@/lib/runs/analysis";
import type { Masking, Verdict } from "@/lib/runs/targets";
import type { RunDraft } from "@/lib/runs/edit";
import type { Target } from "@/lib/runs/schema";

export interface Sentence {
  state: "pass" | "warn" | "fail";
  text: string;
  /** whether matching could help */
  isMatchWorth: boolean;
}

const db = (value: number, decimals = 1) => inWords(decibels(value, decimals));

/** A return loss without end is a match without fault. */
const seen = (value: number) => (Number.isFinite(value) ? db(value) : "a perfect match");
const stands = (value: number) => (Number.isFinite(value) ? `stands at ${db(value)}` : "is matched");

/** Above this much difference the cable, not the load, makes the reading at the source. */
const hidingDb = 1;

/** The load seen from the source end, and how much of what is seen is the cable's. */
export function seenFromSource(analysis: Analysis, draft: RunDraft, verdicts: readonly Verdict[]): Sentence {
  const { spot } = analysis;
  const hidden = spot.sourceReturnLossDb - spot.loadReturnLossDb;
  const missed = verdicts.some(({ isMet }) => isMet === false);
  const state = missed ? "fail" : "pass";
  const isMatchWorth = spot.loadReturnLossDb < 14;
  if (hidden > hidingDb)
    return {
      state: missed ? "fail" : "warn",
      text: `${draft.sourceName} sees ${db(spot.sourceReturnLossDb)} only because ${db(spot.matchedLossDb, 2)} of line each way hides ${article(draft.loadName)} at ${db(spot.loadReturnLossDb)}.`,
      isMatchWorth,
    };
  return {
    state,
    text: `${draft.sourceName} sees ${seen(spot.sourceReturnLossDb)} and ${draft.loadName} ${stands(spot.loadReturnLossDb)}, at ${inWords(frequency(draft.designHz))}.`,
    isMatchWorth,
  };
}

function article(name: string): string {
  return /^(the|a|an)\b/i.test(name) ? name : `the ${name.charAt(0).toLowerCase()}${name.slice(1)}`;
}

/** Whether the limit at the source would notice that the load is missing. */
export function maskingSentence(masking: Masking, draft: RunDraft): Sentence {
  const reads = Math.max(masking.openDb, masking.shortDb);
  if (masking.isBlind)
    return {
      state: "warn",
      text: `A limit of ${db(masking.limitDb)} here cannot detect a missing load: with ${article(draft.loadName)} off, ${draft.sourceName} still reads ${db(reads)}. Ask for more than that, or test at the load.`,
      isMatchWorth: false,
    };
  return {
    state: "pass",
    text: `With ${article(draft.loadName)} missing or shorted ${draft.sourceName} would read no better than ${db(reads)}, so the limit of ${db(masking.limitDb)} notices it.`,
    isMatchWorth: false,
  };
}

function limitText(target: Target, value: number): string {
  if (target.quantity === "loss" || target.quantity === "returnLoss")
    return value.toFixed(target.quantity === "loss" ? 2 : 1);
  if (target.quantity === "vswr") return inWords(ratio(value));
  return String(value);
}

/** "at least 14.0, 450–454 MHz" */
export function targetWords(target: Target, bandHz: readonly [number, number] | null): string {
  const limits = [
    target.atLeast === undefined ? null : `at least ${limitText(target, target.atLeast)}`,
    target.atMost === undefined ? null : `at most ${limitText(target, target.atMost)}`,
  ].filter((limit) => limit !== null);
  return [limits.join(" and "), ...(bandHz ? [bandWords(bandHz)] : [])].join(", ");
}

/** "450–454 MHz", the unit once. */
export function bandWords([from, to]: readonly [number, number]): string {
  const [low, high] = [frequency(from), frequency(to)];
  if (from === to) return inWords(low);
  return low.unit === high.unit ? `${low.digits}–${inWords(high)}` : `${inWords(low)} – ${inWords(high)}`;
}
