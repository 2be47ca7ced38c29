/** The places of a run where one cable can stand for another. Pure. */
import type { Circuit, Element, Line } from "@/lib/line/element";

interface Laid {
  line: Line;
  lengthM: number;
  paralleled?: number;
}

const shape = /^elements\.(\d+)(?:\.branches\.(\d+))?$/;

/** What is laid at a path, or undefined where nothing can be swapped. */
function laidAt(elements: readonly Element[], path: string): Laid | undefined {
  const [, index, branch] = shape.exec(path) ?? [];
  const element = index === undefined ? undefined : elements[Number(index)];
  if (element?.kind === "cable" || element?.kind === "stub") return branch === undefined ? element : undefined;
  return element?.kind === "parallel" && branch !== undefined ? element.branches[Number(branch)] : undefined;
}

/** Whether something stands at a path that can be swapped. */
export function isPlace(circuit: Circuit, path: string): boolean {
  return laidAt(circuit.elements, path) !== undefined;
}

/** The circuit with one line in all the places. */
export function withLine(circuit: Circuit, paths: readonly string[], line: Line): Circuit {
  const elements = structuredClone(circuit.elements);
  for (const path of paths) laidAt(elements, path)!.line = line;
  return { ...circuit, elements };
}

/** Metres of cable in the places, those in parallel counted each. */
export function lengthOfCable(circuit: Circuit, paths: readonly string[]): number {
  return paths.reduce((sum, path) => {
    const { lengthM, paralleled = 1 } = laidAt(circuit.elements, path)!;
    return sum + lengthM * paralleled;
  }, 0);
}
