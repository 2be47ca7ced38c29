/** What the Line view says in words: what is true, then what to do. Pure. */
import { asGiven } from "@/lib/format/axis";
import { decibels, frequency, inWords } from "@/lib/format/quantity";
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

/** Below this much difference both ends see much the same. */
const hidingDb = 1;

/**
 * The load seen from the source end. A line of matched loss A hides about 2·A dB of a reflection; what is hidden beyond
 * that is the work of a match, a pad or a part between.
 */
export function seenFromSource(analysis: Analysis, draft: RunDraft, verdicts: readonly Verdict[]): Sentence {
  const { spot } = analysis;
  const hidden = spot.sourceReturnLossDb - spot.loadReturnLossDb;
  const missed = verdicts.some(({ isMet }) => isMet === false);
  const load = article(draft.loadName);
  const isByLine = hidden > hidingDb && hidden <= 2 * spot.matchedLossDb + hidingDb;
  if (isByLine)
    return {
      state: missed ? "fail" : "warn",
      text: `${draft.sourceName} sees ${db(spot.sourceReturnLossDb)} only because ${db(spot.matchedLossDb, 2)} of line each way hides ${load} at ${db(spot.loadReturnLossDb)}.`,
      isMatchWorth: spot.loadReturnLossDb < 14,
    };
  const at = `at ${inWords(frequency(draft.designHz))}`;
  const isMatchedBetween = hidden > hidingDb && Number.isFinite(spot.loadReturnLossDb);
  const text = isMatchedBetween
    ? `${draft.sourceName} sees ${seen(spot.sourceReturnLossDb)} ${at}: what stands between brings ${load} up from ${db(spot.loadReturnLossDb)}.`
    : `${draft.sourceName} sees ${seen(spot.sourceReturnLossDb)} and ${draft.loadName} ${stands(spot.loadReturnLossDb)}, ${at}.`;
  return { state: missed ? "fail" : "pass", text, isMatchWorth: spot.sourceReturnLossDb < 14 };
}

/** "the whip"; a name that is all capitals, like TX, keeps them. */
function article(name: string): string {
  if (/^(the|a|an)\b/i.test(name)) return name;
  const isWord = /^\p{Lu}\p{Ll}/u.test(name);
  return `the ${isWord ? name.charAt(0).toLowerCase() + name.slice(1) : name}`;
}

/** Whether the limit at the source would notice that the load is missing or shorted, and what it would read. */
export function maskingSentence(masking: Masking, draft: RunDraft): Sentence {
  const { limitDb, openDb, shortDb, isOpenUnseen, isShortUnseen } = masking;
  const load = article(draft.loadName);
  const limit = db(limitDb);
  if (!isOpenUnseen && !isShortUnseen)
    return {
      state: "pass",
      text: `With ${load} missing ${draft.sourceName} would read down to ${db(openDb)}, with it shorted ${db(shortDb)}: the limit of ${limit} notices both.`,
      isMatchWorth: false,
    };
  const unseen =
    isOpenUnseen && isShortUnseen ? "a missing or a shorted load" : isOpenUnseen ? "a missing load" : "a shorted load";
  const reads = isOpenUnseen
    ? `with ${load} off, ${draft.sourceName} still reads ${db(openDb)}`
    : `with ${load} shorted, ${draft.sourceName} still reads ${db(shortDb)}`;
  return {
    state: "warn",
    text: `A limit of ${limit} here cannot detect ${unseen}: ${reads}. Ask for more than that, or test at the load.`,
    isMatchWorth: false,
  };
}

/** "at least 14, 450–454 MHz": a limit is never rounded. */
export function targetWords(target: Target, bandHz: readonly [number, number] | null): string {
  const limits = [
    target.atLeast === undefined ? null : `at least ${asGiven(target.atLeast)}`,
    target.atMost === undefined ? null : `at most ${asGiven(target.atMost)}`,
  ].filter((limit) => limit !== null);
  return [limits.join(" and "), ...(bandHz ? [bandWords(bandHz)] : [])].join(", ");
}

/** "450–454 MHz", the unit once. */
export function bandWords([from, to]: readonly [number, number]): string {
  const [low, high] = [frequency(from), frequency(to)];
  if (from === to) return inWords(low);
  return low.unit === high.unit ? `${low.digits}–${inWords(high)}` : `${inWords(low)} – ${inWords(high)}`;
}
