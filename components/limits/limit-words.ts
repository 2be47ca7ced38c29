import { inWords, frequency, significantDigits, withoutTrailingZeros } from "@/lib/format/quantity";
import type { LimitLineItem } from "@/lib/limit-lines/schema";
import { isFloor, limitOver, limitRange, type LimitOf, type LimitQuantity } from "@/lib/limit-lines/limit";

/** What each quantity is called, and the unit people read and type it in. */
export const quantityWords: Record<LimitQuantity, { word: string; unit: string; factor: number }> = {
  insertionLoss: { word: "Insertion loss", unit: "dB", factor: 1 },
  returnLoss: { word: "Return loss", unit: "dB", factor: 1 },
  delay: { word: "Delay", unit: "ns", factor: 1e-9 },
  skew: { word: "Skew", unit: "ns", factor: 1e-9 },
  dcLoop: { word: "Loop resistance", unit: "Ω", factor: 1 },
  conductorDc: { word: "Conductor resistance", unit: "Ω", factor: 1 },
};

export const ofWords: Record<LimitOf, string> = {
  cable: "Cable",
  link: "Link",
  channel: "Channel",
  segment: "Segment",
};

/** A limit in people's unit: 21.98 dB. */
export function limitFigure(quantity: LimitQuantity, value: number): string {
  const { unit, factor } = quantityWords[quantity];
  return `${withoutTrailingZeros(significantDigits(value / factor, 4))}\u00a0${unit}`;
}

/** What a line asks for, at both ends of its range: "at most 2.04 dB at 1 MHz, 21.98 dB at 100 MHz, per 100 m". */
export function limitSentence(line: LimitLineItem): string {
  const { quantity, perLengthM, curve } = line;
  const bound = isFloor(quantity) ? "at least" : "at most";
  const range = limitRange(curve);
  const values = [...limitOver(line, range ?? [1], perLengthM)];
  const figures = values.map((value, i) => {
    const place = range ? ` at ${inWords(frequency(range[i]))}` : "";
    return `${limitFigure(quantity, value)}${place}`;
  });
  return `${bound} ${figures.join(", ")}${perLengthM === undefined ? "" : `, per ${perLengthM}\u00a0m`}`;
}

/** Where a line is from: "ANSI/TIA-568, C.2, clause not seen". */
export function sourceWords({ source: { title, edition, clause }, isStandard }: LimitLineItem): string {
  const numbered = clause && /^\d/.test(clause) ? `clause ${clause}` : clause;
  const place = numbered ?? (isStandard ? "clause not seen" : "");
  return [title, edition, place].filter((part) => part !== "").join(", ");
}
