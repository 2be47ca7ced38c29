/** Between a circuit as stored, whose lines are references, and the engine's, whose lines are models. Pure. */
import type { Circuit as EngineCircuit, Element as EngineElement, Line } from "@/lib/line/element";
import { lengthAlongPath } from "@/lib/line/element";
import type { Circuit, Element, LineRef } from "@/lib/runs/circuit-schema";

/** A cable of the catalogue, in a revision or in the one a run pins. */
export type CableRef = Extract<LineRef, { cableId: string }>;

/** A sentence about one place of a circuit; the path is dotted, from the circuit's own root. */
export interface CircuitFault {
  path: string;
  message: string;
}

/** The lines of an element with their places in it. */
function linesIn(element: Element): { path: string; line: LineRef }[] {
  if (element.kind === "cable" || element.kind === "stub") return [{ path: "line", line: element.line }];
  if (element.kind !== "parallel") return [];
  return element.branches.map((branch, i) => ({ path: `branches.${i}.line`, line: branch.line }));
}

/** Every reference to the catalogue in a circuit, in order, with its place. */
export function cableRefsOf(circuit: Pick<Circuit, "elements">): { path: string; ref: CableRef }[] {
  return circuit.elements.flatMap((element, i) =>
    linesIn(element).flatMap(({ path, line }) =>
      "cableId" in line ? [{ path: `elements.${i}.${path}`, ref: line }] : [],
    ),
  );
}

/** The ids of the catalogue's cables in a circuit, once each, in order. */
export function cableIdsOf(circuit: Circuit): string[] {
  return [...new Set(cableRefsOf(circuit).map(({ ref }) => ref.cableId))];
}

/** Length along the main path from source to load, metres. */
export function totalLength(circuit: Circuit): number {
  return circuit.elements.reduce((sum, element) => sum + lengthAlongPath(element), 0);
}

function withLines(element: Element, toLine: (ref: LineRef, path: string) => Line): EngineElement {
  if (element.kind === "cable" || element.kind === "stub") return { ...element, line: toLine(element.line, "line") };
  if (element.kind !== "parallel") return element;
  const branches = element.branches.map((branch, i) => ({
    ...branch,
    line: toLine(branch.line, `branches.${i}.line`),
  }));
  return { ...element, branches };
}

type FindLine = (ref: CableRef) => Line | undefined;

/**
 * Elements of the engine: every reference replaced by its line.
 * @param findLine - the line of a reference to the catalogue, or undefined when there is none
 * @returns the elements, or a sentence for every reference that leads nowhere, at its path from the list
 */
export function resolveElements(
  elements: readonly Element[],
  findLine: FindLine,
): { elements: EngineElement[] } | { faults: CircuitFault[] } {
  const faults: CircuitFault[] = [];
  const resolved = elements.map((element, i) =>
    withLines(element, (ref, path) => {
      if (!("cableId" in ref)) return ref;
      const line = findLine(ref);
      if (line) return line;
      faults.push({ path: `${i}.${path}`, message: "There is no such cable in the catalogue." });
      return { model: { conductors: [], lInfHPerM: Number.NaN, cFPerM: Number.NaN } }; // never leaves here: there is a fault
    }),
  );
  return faults.length > 0 ? { faults } : { elements: resolved };
}

/** The engine's circuit, as `resolveElements`; paths are from the circuit's root. */
export function resolveCircuit(
  circuit: Circuit,
  findLine: FindLine,
): { circuit: EngineCircuit } | { faults: CircuitFault[] } {
  const result = resolveElements(circuit.elements, findLine);
  if ("elements" in result) return { circuit: { ...circuit, elements: result.elements } };
  return { faults: result.faults.map((fault) => ({ ...fault, path: `elements.${fault.path}` })) };
}

function referred({ model, cableId, revision }: Line): LineRef {
  return cableId === undefined ? { model } : { cableId, revision };
}

/** An element of the engine as it is stored and sent: a line that came from the catalogue as a reference to it. */
export function referredElement(element: EngineElement): Element {
  if (element.kind === "cable" || element.kind === "stub") return { ...element, line: referred(element.line) };
  if (element.kind !== "parallel") return element;
  return { ...element, branches: element.branches.map((branch) => ({ ...branch, line: referred(branch.line) })) };
}
