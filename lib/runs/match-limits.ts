/** What a match of a run keeps when it is not made as drawn. Pure. */
import { cutLength, inWords } from "@/lib/format/quantity";
import type { Element } from "@/lib/line/element";
import { worstAtLimits, type CutTolerance } from "@/lib/line/match/at-limits";
import { bandOf } from "@/lib/line/match/extreme";
import { seenLoad } from "@/lib/line/match/seen-load";
import { yieldPercent } from "@/lib/line/match/yield";
import type { MatchAsked } from "@/lib/runs/matching";

export interface AtLimits {
  /** least return loss over the band with every length and value at its limits, dB; Infinity where nothing reflects */
  returnLossDb: number;
  /** share of 500 drawn makings that keep the asked return loss over the band, percent */
  yieldPercent: number;
  /** what is off, and by how much: "cut ±5 mm" */
  words: string;
}

const cutKinds: Element["kind"][] = ["cable", "stub", "parallel"];

/** "cut ±5 mm", "parts ±5 %"; null where nothing of the match can be off. */
function looseWords(elements: readonly Element[], { lengthM = 0, valuePercent = 0 }: CutTolerance): string | null {
  const isCut = lengthM > 0 && elements.some(({ kind }) => cutKinds.includes(kind));
  const hasParts = valuePercent > 0 && elements.some(({ kind }) => kind === "part" || kind === "pad");
  const words = [
    ...(isCut ? [`cut ±${inWords(cutLength(lengthM))}`] : []),
    ...(hasParts ? [`parts ±${Number(valuePercent.toPrecision(3))}\u00a0%`] : []),
  ];
  return words.length > 0 ? words.join(", ") : null;
}

/** A match at the limits of its making; null where nothing of it can be off. Throws RangeError as the engine does. */
export function atLimits(elements: readonly Element[], asked: MatchAsked, tolerance: CutTolerance): AtLimits | null {
  const words = looseWords(elements, tolerance);
  if (words === null) return null;
  const { targetOhm, temperatureC } = asked;
  const lead = elements.findLast((element) => element.kind === "cable")?.line;
  const ends = { seen: seenLoad(asked, targetOhm, lead), targetOhm, temperatureC };
  const band = bandOf({ ...asked, lines: [] });
  const made = [elements, tolerance, ends, band] as const;
  return { words, returnLossDb: worstAtLimits(...made), yieldPercent: yieldPercent(...made) };
}
