/** Where along a run a cable lies. Pure. */
import { lengthAlongPath } from "@/lib/line/element";
import { totalLength } from "@/lib/runs/circuit";
import type { Circuit, Element, LineRef } from "@/lib/runs/circuit-schema";

export interface CableUse {
  /** of the run, along its main path, m */
  totalLengthM: number;
  /** of the cable in it, every length that has to be cut counted, m */
  cableLengthM: number;
  /** stretches of the main path, from and to, m from the source */
  stretches: { fromM: number; toM: number }[];
  /** where a stub of it hangs, m from the source */
  stubsAtM: number[];
}

const isOf = (cableId: string) => (line: LineRef) => "cableId" in line && line.cableId === cableId;

/** The length of a cable in one element, every length that has to be cut counted. */
function lengthIn(element: Element, isCable: (line: LineRef) => boolean): number {
  if (element.kind === "cable" || element.kind === "stub")
    return isCable(element.line) ? element.lengthM * (element.paralleled ?? 1) : 0;
  if (element.kind !== "parallel") return 0;
  return element.branches.reduce((sum, { line, lengthM }) => sum + (isCable(line) ? lengthM : 0), 0);
}

/** How a circuit uses a cable, and where; every list is empty where it does not. */
export function placesIn(circuit: Circuit, cableId: string): CableUse {
  const isCable = isOf(cableId);
  const use: CableUse = { totalLengthM: totalLength(circuit), cableLengthM: 0, stretches: [], stubsAtM: [] };
  let at = 0;
  for (const element of circuit.elements) {
    const end = at + lengthAlongPath(element);
    const length = lengthIn(element, isCable);
    use.cableLengthM += length;
    if (element.kind === "stub" && isCable(element.line)) use.stubsAtM.push(at);
    else if (length > 0 && end > at) use.stretches.push({ fromM: at, toM: end });
    at = end;
  }
  return use;
}
