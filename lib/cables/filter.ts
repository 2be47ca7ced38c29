/** Filtering and sorting entries by their figures. Pure; the service has already found who may see what. */
import type { CableQuery, Range, SortKey } from "@/lib/cables/query";
import type { CableState, Family } from "@/lib/cables/schema";

/** What an entry is filtered and sorted by. */
export interface Candidate {
  id: string;
  designation: string;
  family: Family;
  state: CableState;
  preferred: boolean;
  z0Ohm: number;
  velocityFactor: number;
  outerDiameterMm: number | null;
  maxFrequencyHz: number | null;
  /** at the frequency asked; null when none was asked */
  lossDbPer100m: number | null;
  /** the more, the better it fits the search; 0 without one */
  relevance: number;
}

function isWithin(value: number | null, range: Range | undefined): boolean {
  if (!range) return true;
  if (value === null) return false;
  return value >= (range.from ?? -Infinity) && value <= (range.to ?? Infinity);
}

export type FilterName =
  "family" | "state" | "z0Ohm" | "velocityFactor" | "outerDiameterMm" | "lossDbPer100m" | "others";

function statesAsked(query: CableQuery, whenNotAsked: CableState[] | undefined): CableState[] | undefined {
  const states = query.state ?? whenNotAsked;
  // Approved entries with a use condition are still approved: they come along, marked.
  return states?.includes("approved") ? [...states, "restricted"] : states;
}

/**
 * The filters of a query, by name, each telling whether an entry passes.
 * @param defaultStates - the states meant when none is asked; undefined for all
 */
export function filters(
  query: CableQuery,
  defaultStates: CableState[] | undefined,
): Record<FilterName, (entry: Candidate) => boolean> {
  const states = statesAsked(query, defaultStates);
  return {
    family: (entry) => !query.family || query.family.includes(entry.family),
    state: (entry) => !states || states.includes(entry.state),
    z0Ohm: (entry) => isWithin(entry.z0Ohm, query.z0Ohm),
    velocityFactor: (entry) => isWithin(entry.velocityFactor, query.velocityFactor),
    outerDiameterMm: (entry) => isWithin(entry.outerDiameterMm, query.outerDiameterMm),
    lossDbPer100m: (entry) => isWithin(entry.lossDbPer100m, query.lossDbPer100m),
    others: (entry) =>
      isWithin(entry.maxFrequencyHz, query.maxFrequencyHz === undefined ? undefined : { from: query.maxFrequencyHz }) &&
      (query.preferred === undefined || entry.preferred === query.preferred),
  };
}

/** The value an entry is sorted by. */
export function sortValue(entry: Candidate, key: SortKey): string | number | null {
  if (key === "relevance") return -entry.relevance;
  if (key === "designation") return entry.designation;
  if (key === "z0") return entry.z0Ohm;
  if (key === "loss") return entry.lossDbPer100m;
  return key === "velocityFactor" ? entry.velocityFactor : entry.outerDiameterMm;
}

function compareValues(a: string | number | null, b: string | number | null): number {
  if (typeof a === "string" && typeof b === "string") return a < b ? -1 : a > b ? 1 : 0;
  return Number(a) - Number(b);
}

export interface SortPlace {
  key: string | number | null;
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
