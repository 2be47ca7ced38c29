import type { Candidate } from "@/lib/line/match/match-request";

/** A null return loss or loss is beyond any number. */
const orInfinite = (value: number | null) => value ?? Infinity;

/** Return losses within this of each other, dB, are equally good: the loss decides between them. */
const returnLossStep = 0.5;
/** Losses within this of each other, dB, are equal: the bandwidth decides. */
const lossStep = 0.005;

/**
 * Candidates best first:
 * 1. those that keep the asked return loss over the whole band come before those that do not;
 * 2. then the better worst return loss over the band, in steps of 0.5 dB;
 * 3. then the lower worst transducer loss over the band, in steps of 0.005 dB;
 * 4. then the wider bandwidth, then less cable, then the title, so that the order never depends on that of the request.
 * Steps are fixed classes rather than differences, which keeps the order the same whichever pair is compared first.
 * @param returnLossDb - asked over the band
 */
export function rank(candidates: readonly Candidate[], returnLossDb: number): Candidate[] {
  const keys = new Map(candidates.map((candidate) => [candidate, keyOf(candidate, returnLossDb)]));
  return [...candidates].sort((a, b) => compare(keys.get(a)!, keys.get(b)!) || a.title.localeCompare(b.title));
}

/** Smaller is better, first entry first. */
function keyOf(candidate: Candidate, returnLossDb: number): number[] {
  const worst = orInfinite(candidate.worstReturnLossDb);
  return [
    worst >= returnLossDb ? 0 : 1,
    -Math.floor(worst / returnLossStep),
    Math.floor(orInfinite(candidate.worstTransducerLossDb) / lossStep),
    -candidate.bandwidthHz,
    candidate.totalLengthM,
  ];
}

function compare(a: number[], b: number[]): number {
  for (let k = 0; k < a.length; k++) if (a[k] !== b[k]) return a[k]! < b[k]! ? -1 : 1;
  return 0;
}
