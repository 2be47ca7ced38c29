/** Which matches stand side by side until somebody chooses. Pure. */
import type { Candidate } from "@/lib/line/match/match-request";

/**
 * The one kept in the run, then the notch if one is asked for, then the best of each method: those of at most two pieces,
 * which most people will make, before those of more; then the next best.
 * @returns their titles
 */
export function firstCompared(candidates: Candidate[], kept: Candidate | undefined, most: number): string[] {
  const bestOfEach = candidates.filter(
    (candidate, i) => candidates.findIndex(({ method }) => method === candidate.method) === i,
  );
  const rankOf = ({ method, elements }: Candidate) => (method === "notchStub" ? 0 : elements.length <= 2 ? 1 : 2);
  const simplestFirst = bestOfEach.toSorted((a, b) => rankOf(a) - rankOf(b));
  const order = [...(kept ? [kept] : []), ...simplestFirst, ...candidates];
  return [...new Set(order.map(({ title }) => title))].slice(0, most);
}
