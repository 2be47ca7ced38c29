/** Filtering entries by their figures. Pure; the service has already found who may see what. */
import type { CableQuery, Range } from "@/lib/cables/query";
import type { CableState, Family } from "@/lib/cables/schema";

/** What an entry is filtered and sorted by. */
export interface Candidate {
  id: string;
  designation: string;
  family: Family;
  state: CableState;
  preferred: boolean;
  /** the one in force, or the newest while none is */
  revision: number;
  /** who wrote that revision */
  authorId: string;
  z0Ohm: number;
  velocityFactor: number;
  capacitanceFPerM: number;
  outerDiameterMm: number | null;
  maxFrequencyHz: number | null;
  /** at the frequency asked; null when none was asked */
  lossDbPer100m: number | null;
}

export type FilterName =
  "family" | "state" | "z0Ohm" | "velocityFactor" | "outerDiameterMm" | "lossDbPer100m" | "others";

/** One filter that something was asked of. */
export interface Filter {
  name: FilterName;
  passes: (entry: Candidate) => boolean;
}

const measures = ["z0Ohm", "velocityFactor", "outerDiameterMm", "lossDbPer100m"] as const;

function isWithin(value: number | null, { from = -Infinity, to = Infinity }: Range): boolean {
  return value !== null && value >= from && value <= to;
}

function statesAsked(query: CableQuery, whenNotAsked: CableState[] | undefined): CableState[] | undefined {
  const states = query.state ?? whenNotAsked;
  // Approved entries with a use condition are still approved: they come along, marked.
  return states?.includes("approved") ? [...states, "restricted"] : states;
}

/**
 * The filters of a query that bind.
 * @param defaultStates - the states meant when none is asked; undefined for all
 */
export function filters(query: CableQuery, defaultStates: CableState[] | undefined): Filter[] {
  const states = statesAsked(query, defaultStates);
  const { family, maxFrequencyHz, preferred } = query;
  const asked: Filter[] = measures.flatMap((name) => {
    const range = query[name];
    return range ? [{ name, passes: (entry: Candidate) => isWithin(entry[name], range) }] : [];
  });
  if (family) asked.push({ name: "family", passes: (entry) => family.includes(entry.family) });
  if (states) asked.push({ name: "state", passes: (entry) => states.includes(entry.state) });
  if (maxFrequencyHz !== undefined)
    asked.push({ name: "others", passes: (entry) => isWithin(entry.maxFrequencyHz, { from: maxFrequencyHz }) });
  if (preferred !== undefined) asked.push({ name: "others", passes: (entry) => entry.preferred === preferred });
  return asked;
}

export interface Sifted {
  passing: Candidate[];
  /** those that one filter alone keeps out */
  keptOutBy: Partial<Record<FilterName, Candidate[]>>;
}

/** Entries through all filters, and beside them those that fail one only: what that filter's facet counts besides. */
export function sift(entries: readonly Candidate[], asked: readonly Filter[]): Sifted {
  const sifted: Sifted = { passing: [], keptOutBy: {} };
  for (const entry of entries) {
    let failed: FilterName | undefined;
    let isOut = false;
    for (const { name, passes } of asked) {
      if (isOut || failed === name || passes(entry)) continue;
      isOut = failed !== undefined;
      failed = name;
    }
    if (failed === undefined) sifted.passing.push(entry);
    else if (!isOut) (sifted.keptOutBy[failed] ??= []).push(entry);
  }
  return sifted;
}
