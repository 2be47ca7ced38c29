import type { Candidate } from "@/lib/line/match/match-request";

/** A null return loss or loss is beyond any number. */
const orInfinite = (value: number | null) => value ?? Infinity;

/** Return losses within this of each other, dB, are equally good: the loss decides between them. */
const returnLossStep = 0.5;
/** Losses within this of each other, dB, are equal: the bandwidth decides. */
const lossStep = 0.005;

/** A match that loses whole decibels is a pad: each whole one, dB, puts it behind those that lose less. */
const wasteStep = 1;
/** Yields within this of each other, percent, are equally good. */
const yieldStep = 5;

/**
 * Candidates best first:
 * 1. those that keep the asked return loss over the whole band come before those that do not;
 * 2. then those that waste less in the match, in steps of 1 dB, so that a pad never stands before a match;
 * 3. then those made of what is at hand, before those with a line that has to be made;
 * 4. where a tolerance is given, then those that keep the asked return loss at their limits, then the better yield, in
 *    steps of 5 %;
 * 5. then the better worst return loss over the band, in steps of 0.5 dB;
 * 6. then the lower worst transducer loss over the band, in steps of 0.005 dB;
 * 7. then the wider bandwidth, then less cable, then the title, so that the order never depends on that of the request.
 * Steps are fixed classes rather than differences, which keeps the order the same whichever pair is compared first.
 * @param returnLossDb - asked over the band
 */
export function rank(candidates: readonly Candidate[], returnLossDb: number): Candidate[] {
  const keys = new Map(candidates.map((candidate) => [candidate, keyOf(candidate, returnLossDb)]));
  return [...candidates].sort((a, b) => compare(keys.get(a)!, keys.get(b)!) || a.title.localeCompare(b.title));
}

/** Without the last digits, in which two engines differ: server and browser put equal matches in the same order. */
const rounded = (value: number) => Number(value.toPrecision(6));

/** Smaller is better, first entry first. */
function keyOf(candidate: Candidate, returnLossDb: number): number[] {
  const worst = orInfinite(candidate.worstReturnLossDb);
  return [
    worst >= returnLossDb ? 0 : 1,
    Math.floor(orInfinite(candidate.worstMatchLossDb) / wasteStep),
    candidate.hasIdealLine ? 1 : 0,
    candidate.worstReturnLossAtLimitsDb === undefined || orInfinite(candidate.worstReturnLossAtLimitsDb) >= returnLossDb
      ? 0
      : 1,
    -Math.floor((candidate.yieldPercent ?? 100) / yieldStep),
    -Math.floor(worst / returnLossStep),
    Math.floor(orInfinite(candidate.worstTransducerLossDb) / lossStep),
    -rounded(candidate.bandwidthHz),
    rounded(candidate.totalLengthM),
  ];
}

function compare(a: number[], b: number[]): number {
  for (let k = 0; k < a.length; k++) if (a[k] !== b[k]) return a[k]! < b[k]! ? -1 : 1;
  return 0;
}
