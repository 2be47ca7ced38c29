import type { Element } from "@/lib/line/element";
import { bandSamples, greatest, type Band } from "@/lib/line/match/extreme";
import { responder, type Ends } from "@/lib/line/match/response";
import { returnLossDb } from "@/lib/line/reflection";

/** How well lengths are cut and parts are chosen. */
export interface CutTolerance {
  /** each length is within this of what is drawn, metre, at least 0 */
  lengthM?: number;
  /** each part's value is within this share of its own, percent, 0 to under 100 */
  valuePercent?: number;
}

/** Lengths and values that can be off together; each doubles the work. */
const mostLoose = 12;

/**
 * The least return loss over a band that a network keeps when it is not made as drawn: each of its lengths and part
 * values at either of its limits, in every combination, and as drawn. Identical lengths side by side are cut together
 * and are off alike; a length shorter than its tolerance goes to 0. While the tolerance is small beside a wavelength the
 * reflection is all but linear in every deviation, so nothing between the limits is worse than the worst of them.
 * @param elements - the network alone, from the target side to the load
 * @returns dB, at least 0; Infinity where not even the limits leave a reflection
 * @throws RangeError when a tolerance is out of its range or more than 12 figures could be off
 */
export function worstAtLimits(elements: readonly Element[], tolerance: CutTolerance, ends: Ends, band: Band): number {
  const { lengthM = 0, valuePercent = 0 } = tolerance;
  if (!(lengthM >= 0 && lengthM < Infinity))
    throw new RangeError(`worstAtLimits: lengthM must be at least 0, got ${lengthM}`);
  if (!(valuePercent >= 0 && valuePercent < 100))
    throw new RangeError(`worstAtLimits: valuePercent must be 0 to under 100, got ${valuePercent}`);
  const frequencies = bandSamples(band);
  const worst = corners(elements, { lengthM, valuePercent }).map((made) => {
    const respond = responder(made, ends);
    const magnitude = (frequency: number) => respond(frequency).magnitude;
    return greatest(magnitude, frequencies, frequencies.map(magnitude));
  });
  return returnLossDb(Math.max(...worst));
}

/** The network as drawn, then with everything that can be off at one limit or the other, in every combination. */
function corners(elements: readonly Element[], tolerance: Required<CutTolerance>): Element[][] {
  const limits = elements.map((element) => atBothLimits(element, tolerance));
  const loose = limits.filter((each) => each.length > 1).length;
  if (loose > mostLoose) throw new RangeError(`worstAtLimits: at most ${mostLoose} figures can be off, got ${loose}`);
  const all = limits.reduce<Element[][]>(
    (networks, either) => networks.flatMap((network) => either.map((element) => [...network, element])),
    [[]],
  );
  return [[...elements], ...all];
}

/** An element too long or too large, and too short or too small; itself alone where nothing of it can be off. */
function atBothLimits(element: Element, { lengthM, valuePercent }: Required<CutTolerance>): Element[] {
  if (element.kind === "cable" || element.kind === "stub") {
    if (lengthM === 0) return [element];
    const lengths = [element.lengthM + lengthM, Math.max(0, element.lengthM - lengthM)];
    return lengths.map((each) => ({ ...element, lengthM: each }));
  }
  if (element.kind !== "part" || valuePercent === 0) return [element];
  return [1 + valuePercent / 100, 1 - valuePercent / 100].map((factor) => ({
    ...element,
    ...(element.rOhm !== undefined && { rOhm: element.rOhm * factor }),
    ...(element.lH !== undefined && { lH: element.lH * factor }),
    ...(element.cF !== undefined && { cF: element.cF * factor }),
  }));
}
