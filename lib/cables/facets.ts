/** How many entries each value of a filter has under all the other filters. Pure. */
import type { Candidate, Sifted } from "@/lib/cables/filter";
import type { Facets } from "@/lib/cables/query";

const mostBins = 14;
/** Narrowest span a histogram resolves, as a share of the values. */
const finestShare = 0.1;

/** The smallest of 1, 2 and 5 times a power of ten that covers a span in at most `mostBins` steps. */
function binWidth(span: number): number {
  const rough = span / (mostBins - 1);
  const power = 10 ** Math.floor(Math.log10(rough));
  return power * ([1, 2, 5, 10].find((step) => step * power >= rough) ?? 10);
}

/** Edges lie a quarter of a bin beside the round numbers: nominal values are round, and real ones a hair to either side. */
const edgeShift = 0.25;

type Values = readonly number[] | Float64Array;

/**
 * Counts values in bins of equal width. The bins cover `range`, not only what is counted, so that they stay where they
 * are while other filters move.
 * @param range - every value there is, none below 0; the lowest and the highest give the ends
 * @param counted - the values to count
 */
export function histogram(range: Values, counted: Values): { from: number; to: number; count: number }[] {
  if (range.length === 0) return [];
  let [low, high] = [Infinity, 0];
  for (const value of range) {
    low = Math.min(low, value);
    high = Math.max(high, value);
  }
  // Values that differ by rounding only are one value: bins much finer than that would say nothing.
  const width = binWidth(Math.max(high - low, high * finestShare) || 1);
  const place = (value: number) => Math.floor(value / width - edgeShift);
  // Twelve digits, so that an edge is 0.705 and not 0.7050000000000001.
  const edge = (k: number) => Math.max(0, Number(((k + edgeShift) * width).toPrecision(12)));
  const first = place(low);
  const bins = Array.from({ length: place(high) - first + 1 }, (_, i) => ({
    from: edge(first + i),
    to: edge(first + i + 1),
    count: 0,
  }));
  for (const value of counted) {
    const bin = bins[place(value) - first];
    if (bin) bin.count += 1;
  }
  return bins;
}

function tally<T extends string>(counts: Map<T, number>): { value: T; count: number }[] {
  return [...counts].map(([value, count]) => ({ value, count })).sort((a, b) => (a.value < b.value ? -1 : 1));
}

type Measure = "z0Ohm" | "velocityFactor" | "lossDbPer100m" | "outerDiameterMm";

/** @param entries - all that the search found and the person may see, before any filter */
export function facetsOf(entries: readonly Candidate[], { passing, keptOutBy }: Sifted): Facets {
  const numeric = (name: Measure) => histogram(values(name, entries), values(name, passing, keptOutBy[name] ?? []));
  const words = <Name extends "family" | "state">(name: Name) => {
    const counts = new Map<Candidate[Name], number>();
    for (const list of [passing, keptOutBy[name] ?? []])
      for (const entry of list) counts.set(entry[name], (counts.get(entry[name]) ?? 0) + 1);
    return tally(counts);
  };
  return {
    z0Ohm: numeric("z0Ohm"),
    velocityFactor: numeric("velocityFactor"),
    lossDbPer100m: numeric("lossDbPer100m"),
    outerDiameterMm: numeric("outerDiameterMm"),
    family: words("family"),
    state: words("state"),
  };
}

/** The values that are there, of several lists one after another. */
function values(name: Measure, ...lists: (readonly Candidate[])[]): Float64Array {
  const there = new Float64Array(lists.reduce((sum, list) => sum + list.length, 0));
  let count = 0;
  for (const list of lists)
    for (const entry of list) {
      const value = entry[name];
      if (value !== null) there[count++] = value;
    }
  return there.subarray(0, count);
}
