import { nominalFigures } from "@/lib/line/cable";
import type { Circuit, Element } from "@/lib/line/element";
import { transitions, type Drive } from "@/lib/line/time/drive";
import { mostEdges } from "@/lib/line/time/laplace-grid";

const roundTrips = 6;
const edges = 20;

/**
 * A window in which a run that is not tuned to anything has come to rest but for its skin-effect tail: six round trips
 * and twenty edges behind the last edge of the drive, as far as 2,048 edges reach.
 * @returns second
 */
export function usualWindow(circuit: Circuit, drive: Drive): number {
  const oneWay = circuit.elements.reduce((sum, element) => sum + delayOf(element), 0);
  const last = transitions(drive).at(-1)?.atS ?? 0;
  return Math.min(last + 2 * roundTrips * oneWay + edges * drive.riseS, mostEdges * drive.riseS);
}

/** Nominal one-way delay, second; the longest where cables lie side by side. */
function delayOf(element: Element): number {
  if (element.kind === "cable" || element.kind === "stub")
    return nominalFigures(element.line.model).delay * element.lengthM;
  if (element.kind !== "parallel") return 0;
  return element.branches.reduce(
    (most, { line, lengthM }) => Math.max(most, nominalFigures(line.model).delay * lengthM),
    0,
  );
}
