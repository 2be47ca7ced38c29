import type { Element, ParallelElement } from "@/lib/line/element";
import { bandSamples, greatest, type Band } from "@/lib/line/match/extreme";
import { isLoose, madeNetwork } from "@/lib/line/match/made-network";
import { padAsParts } from "@/lib/line/match/pad-as-parts";
import { responder, type Ends } from "@/lib/line/match/response";
import { tellingFrequencies } from "@/lib/line/match/telling";
import { padResistors } from "@/lib/line/pad";
import { returnLossDb } from "@/lib/line/reflection";

/** How well lengths are cut and parts are chosen. */
export interface CutTolerance {
  /** each length is within this of what is drawn, metre, at least 0 */
  lengthM?: number;
  /** each part's value is within this share of its own, percent, 0 to under 100 */
  valuePercent?: number;
}

/** Figures that can be off together; each doubles the corners. */
const mostLoose = 12;
/** Corners followed over the whole band: all of up to four figures, else those that are worst where the band is. */
const mostFollowed = 16;

/** @throws RangeError, naming the function, when a tolerance is out of its range */
export function requireTolerance(where: string, { lengthM = 0, valuePercent = 0 }: CutTolerance): void {
  if (!(lengthM >= 0 && lengthM < Infinity))
    throw new RangeError(`${where}: lengthM must be at least 0, got ${lengthM}`);
  if (!(valuePercent >= 0 && valuePercent < 100))
    throw new RangeError(`${where}: valuePercent must be 0 to under 100, got ${valuePercent}`);
}

/** A network whose pads are resistors of their own where those can be off. */
export function withLooseResistors(elements: readonly Element[], { valuePercent = 0 }: CutTolerance): Element[] {
  return elements.flatMap((element) =>
    element.kind === "pad" && valuePercent > 0 ? padAsParts(padResistors(element), element.topology ?? "T") : [element],
  );
}

/**
 * The least return loss over a band that a network keeps when it is not made as drawn: each of its lengths and part
 * values at either of its limits, in every combination, and as drawn. Identical lengths side by side are cut together
 * and are off alike; a length shorter than its tolerance goes to 0. While the tolerance is small beside a wavelength the
 * reflection is all but linear in every deviation, so nothing between the limits is worse than the worst of them. Of more
 * than 16 combinations those 16 are followed over the whole band that are worst at its telling frequencies.
 * @param elements - the network alone, from the target side to the load
 * @returns dB, at least 0; Infinity where not even the limits leave a reflection
 * @throws RangeError when a tolerance is out of its range or more than 12 figures could be off
 */
export function worstAtLimits(elements: readonly Element[], tolerance: CutTolerance, ends: Ends, band: Band): number {
  requireTolerance("worstAtLimits", tolerance);
  const network = withLooseResistors(elements, tolerance);
  const frequencies = bandSamples(band);
  const made = [network, ...worstCorners(network, tolerance, ends, band).map((off) => offBy(network, tolerance, off))];
  const worst = made.map((each) => {
    const respond = responder(each, ends);
    const magnitude = (frequency: number) => respond(frequency).magnitude;
    return greatest(magnitude, frequencies, frequencies.map(magnitude));
  });
  return returnLossDb(Math.max(...worst));
}

/** Combinations of limits, −1 or 1 for each figure: all where they are few, else the worst ones first seen. */
function worstCorners(network: Element[], tolerance: CutTolerance, ends: Ends, band: Band): number[][] {
  const figures = network.filter((element) => isLoose(element, tolerance)).length;
  if (figures > mostLoose)
    throw new RangeError(`worstAtLimits: at most ${mostLoose} figures can be off, got ${figures}`);
  const cornerOf = (index: number) => Array.from({ length: figures }, (_, j) => ((index >> j) & 1 ? 1 : -1));
  const corners = Array.from({ length: figures === 0 ? 0 : 2 ** figures }, (_, index) => cornerOf(index));
  if (corners.length <= mostFollowed) return corners;
  const frequencies = tellingFrequencies(network, ends, band);
  const { magnitude } = madeNetwork(network, tolerance, ends, frequencies);
  const seen = corners.map((corner) => ({
    corner,
    size: frequencies.reduce((most, _, k) => Math.max(most, magnitude(k, corner)), 0),
  }));
  return seen
    .sort((a, b) => b.size - a.size)
    .slice(0, mostFollowed)
    .map(({ corner }) => corner);
}

/** Lengths side by side are never nothing. */
const branchOff = (off: number) => (branch: ParallelElement["branches"][number]) => ({
  ...branch,
  lengthM: Math.max(1e-9, branch.lengthM + off),
});

/** The network made off by shares of its tolerances, in the order of the elements that can be off. */
function offBy(network: readonly Element[], tolerance: CutTolerance, shares: readonly number[]): Element[] {
  const { lengthM = 0, valuePercent = 0 } = tolerance;
  let figure = 0;
  return network.map((element): Element => {
    if (!isLoose(element, tolerance)) return element;
    const share = shares[figure++]!;
    if (element.kind === "cable" || element.kind === "stub")
      return { ...element, lengthM: Math.max(0, element.lengthM + share * lengthM) };
    if (element.kind === "parallel") return { ...element, branches: element.branches.map(branchOff(share * lengthM)) };
    if (element.kind !== "part") return element;
    const factor = 1 + (share * valuePercent) / 100;
    return {
      ...element,
      ...(element.rOhm !== undefined && { rOhm: element.rOhm * factor }),
      ...(element.lH !== undefined && { lH: element.lH * factor }),
      ...(element.cF !== undefined && { cF: element.cF * factor }),
    };
  });
}
