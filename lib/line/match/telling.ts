import type { Element } from "@/lib/line/element";
import { bandSamples, type Band } from "@/lib/line/match/extreme";
import { responder, type Ends } from "@/lib/line/match/response";

/** Even steps over the band, and crests of the reflection as drawn. */
const evenly = 11;
const mostCrests = 6;

/**
 * The few frequencies of a band at which a network that is made a little off is first out: even ones, the band's edges
 * and the highest crests of the reflection as drawn, the highest first. Small deviations move a crest less than they lift it.
 * @returns hertz, at least one
 */
export function tellingFrequencies(elements: readonly Element[], ends: Ends, band: Band): number[] {
  const samples = bandSamples(band);
  const respond = responder(elements, ends);
  const sizes = samples.map((frequency) => respond(frequency).magnitude);
  const crests = [...samples.keys()]
    .filter((k) => sizes[k]! >= (sizes[k - 1] ?? 0) && sizes[k]! >= (sizes[k + 1] ?? 0))
    .sort((a, b) => sizes[b]! - sizes[a]!)
    .slice(0, mostCrests);
  const even = Array.from({ length: evenly }, (_, k) => Math.round((k * (samples.length - 1)) / (evenly - 1)));
  return [...new Set([...crests, ...even])].sort((a, b) => sizes[b]! - sizes[a]!).map((k) => samples[k]!);
}
