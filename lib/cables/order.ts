/** The order of a list of entries, and the page of it that is asked for. Pure. */
import type { Candidate } from "@/lib/cables/filter";
import type { CableQuery, SortKey } from "@/lib/cables/query";

type SortValue = string | number | null;

/**
 * The value an entry is sorted by.
 * @param relevance - the more, the better an entry fits the search
 */
export function sortedBy(key: SortKey, relevance: (entry: Candidate) => number): (entry: Candidate) => SortValue {
  if (key === "relevance") return (entry) => -relevance(entry);
  if (key === "designation") return (entry) => entry.designation;
  if (key === "z0") return (entry) => entry.z0Ohm;
  if (key === "loss") return (entry) => entry.lossDbPer100m;
  return key === "velocityFactor" ? (entry) => entry.velocityFactor : (entry) => entry.outerDiameterMm;
}

function compareValues(a: SortValue, b: SortValue): number {
  if (typeof a === "string" && typeof b === "string") return a < b ? -1 : a > b ? 1 : 0;
  return Number(a) - Number(b);
}

export interface SortPlace {
  key: SortValue;
  id: string;
}

/**
 * Compares two places in the order asked; where the values are equal the id decides, so that the order is always the same.
 * What has no value comes last, whichever way the sort goes.
 */
export function comparePlaces(a: SortPlace, b: SortPlace, isReversed: boolean): number {
  if ((a.key === null) !== (b.key === null)) return a.key === null ? 1 : -1;
  const order = a.key === null ? 0 : compareValues(a.key, b.key);
  if (order !== 0) return isReversed ? -order : order;
  return a.id < b.id ? -1 : a.id > b.id ? 1 : 0;
}

/** The sort a query asks for: by relevance when something is searched for, else by designation. */
export function sortAsked(query: CableQuery): { key: SortKey; isReversed: boolean } {
  const sort = query.sort ?? (query.q ? "relevance" : "designation");
  const isReversed = sort.startsWith("-");
  return { key: (isReversed ? sort.slice(1) : sort) as SortKey, isReversed };
}

export interface Window {
  items: Candidate[];
  /** how many there are from the first of the items on */
  count: number;
  /** where the last of the items stands; undefined without one */
  last: SortPlace | undefined;
}

/**
 * The first entries in an order, found without sorting the others.
 * @param valueOf - what an entry is sorted by
 * @param after - leave out everything up to this place
 * @param most - how many to find, at least 1
 */
export function firstInOrder(
  entries: readonly Candidate[],
  valueOf: (entry: Candidate) => SortValue,
  isReversed: boolean,
  { after, most }: { after?: SortPlace; most: number },
): Window {
  const found: (SortPlace & { entry: Candidate })[] = [];
  let count = 0;
  for (const entry of entries) {
    const place = { key: valueOf(entry), id: entry.id, entry };
    if (after && comparePlaces(place, after, isReversed) <= 0) continue;
    count += 1;
    const last = found.at(-1);
    if (found.length === most && last && comparePlaces(place, last, isReversed) > 0) continue;
    found.splice(placeAmong(found, place, isReversed), 0, place);
    if (found.length > most) found.pop();
  }
  const last = found.at(-1);
  return { items: found.map(({ entry }) => entry), count, last: last && { key: last.key, id: last.id } };
}

/** Index at which a place belongs in a list that is in order. */
function placeAmong(found: readonly SortPlace[], place: SortPlace, isReversed: boolean): number {
  let low = 0;
  let high = found.length;
  while (low < high) {
    const middle = (low + high) >> 1;
    const there = found[middle];
    if (there && comparePlaces(there, place, isReversed) < 0) low = middle + 1;
    else high = middle;
  }
  return low;
}
