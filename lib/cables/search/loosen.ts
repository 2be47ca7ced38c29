/** What to leave out of a search that finds nothing. Pure: the counting is handed in. */
import type { SearchReading, SearchTerm } from "@/lib/cables/read-search";
import type { Loosening } from "@/lib/cables/query";

const most = 3;

const typedAgain = (terms: readonly SearchTerm[]) => terms.map((term) => term.typed).join(" ");

/**
 * The nearest searches that do find something: each with one term left out, those that find most first.
 * @param count - how many entries a reading finds under the same filters
 */
export function loosenings(reading: SearchReading, count: (reading: SearchReading) => number): Loosening[] {
  if (reading.terms.length < 2) return [];
  return reading.terms
    .map((left, i) => {
      const terms = reading.terms.filter((_, j) => j !== i);
      return { without: left.typed, q: typedAgain(terms), count: count({ ...reading, terms }) };
    })
    .filter((loosening) => loosening.count > 0)
    .sort((a, b) => b.count - a.count)
    .slice(0, most);
}
