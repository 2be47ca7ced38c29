import type { Candidate } from "@/lib/line/match/match-request";

/**
 * Candidates told apart: the same network found twice (two exact solutions may share their nearest standard values) is
 * one, and different ones that round to the same title are numbered in their order.
 */
export function distinct(candidates: readonly Candidate[]): Candidate[] {
  const seen = new Map<string, string[]>();
  return candidates.flatMap((candidate) => {
    const { title } = candidate;
    const network = JSON.stringify(candidate.elements);
    const alike = seen.get(title) ?? [];
    if (alike.includes(network)) return [];
    seen.set(title, [...alike, network]);
    return [alike.length === 0 ? candidate : { ...candidate, title: `${title}, solution ${alike.length + 1}` }];
  });
}
