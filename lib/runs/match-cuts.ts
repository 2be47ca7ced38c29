/** The cut list of a match in sentences, one a piece. Pure. */
import { cutLength, inWords, scaled } from "@/lib/format/quantity";
import type { Cut } from "@/lib/line/match/match-request";

/** Lengths under half a metre are trimmed by the millimetre, longer ones by the centimetre. */
const trimStep = (lengthM: number) => (lengthM < 0.5 ? 0.001 : 0.01);

function trimWords({ trimHzPerM, lengthM }: Cut): string {
  if (trimHzPerM === null) return "";
  const step = trimStep(lengthM);
  const moved = inWords(scaled("frequency", Math.abs(trimHzPerM) * step, 3));
  return `; ${inWords(cutLength(step))} off moves the match ${trimHzPerM > 0 ? "up" : "down"} by ${moved}`;
}

/** "Stub: cut 939 mm of C50-F10; 10 mm off moves the match up by 34.0 kHz." */
export function cutSentence(cut: Cut): string {
  const { name, line, count, cutM } = cut;
  if (cutM === null) return `${name}: too short for its ends in ${line}.`;
  const times = count > 1 ? `${count} times ` : "";
  return `${name}: cut ${times}${inWords(cutLength(cutM))} of ${line}${trimWords(cut)}.`;
}
