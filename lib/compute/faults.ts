/** What the schema cannot see: whether the parts of a request go together. Each fault at its path. Pure. */
import type { Plane, Termination } from "@/lib/line/element";
import type { CircuitFault } from "@/lib/runs/circuit";
import type { Circuit, Element } from "@/lib/runs/circuit-schema";

/** The most one request may ask, so that a single one never holds everybody up: seconds of work, as measured. */
const mostLinePoints = 2_500_000;
const mostPlanePoints = 500_000;

/** How many lines are computed for some elements: each branch of lines in parallel is one. */
export function linesIn(elements: readonly Element[]): number {
  return elements.reduce((sum, element) => sum + (element.kind === "parallel" ? element.branches.length : 1), 0);
}

/** Whether a source has a resistance at every frequency. */
function hasResistance(source: Termination): boolean {
  if (source.kind === "constant") return source.reOhm > 0;
  if (source.kind !== "network") return false;
  // A coil of nothing beside the resistor shorts it.
  return (source.rOhm ?? 0) > 0 && (source.topology === "series" || source.lH !== 0);
}

/** Every termination in a circuit but the source, with its place. */
function terminations({ elements, load }: Circuit): { path: string; termination: Termination }[] {
  const inside = elements.flatMap((element, i): { path: string; termination: Termination }[] => {
    if (element.kind === "shunt") return [{ path: `elements.${i}.termination`, termination: element.termination }];
    if (element.kind !== "stub" || typeof element.end === "string") return [];
    return [{ path: `elements.${i}.end`, termination: element.end }];
  });
  return [...inside, { path: "load", termination: load }];
}

/** Where a measured end stands. */
export function sampledPaths(circuit: Circuit): string[] {
  return terminations(circuit).flatMap(({ path, termination }) => (termination.kind === "sampled" ? [path] : []));
}

function beyondSamples(circuit: Circuit, lowest: number, highest: number): CircuitFault[] {
  return terminations(circuit).flatMap(({ path, termination }) => {
    if (termination.kind !== "sampled") return [];
    const from = termination.frequenciesHz[0] ?? Infinity;
    const to = termination.frequenciesHz.at(-1) ?? -Infinity;
    if (lowest >= from && highest <= to) return [];
    return [
      {
        path: `${path}.frequenciesHz`,
        message: `It was measured from ${from} Hz to ${to} Hz; nothing is known beyond.`,
      },
    ];
  });
}

/**
 * @param frequencies - hertz, at least one
 * @param planes - planes asked for
 * @returns paths from the request's root
 */
export function sweepFaults(circuit: Circuit, frequencies: number[], planes: Plane[]): CircuitFault[] {
  const lowest = frequencies.reduce((a, b) => Math.min(a, b));
  const highest = frequencies.reduce((a, b) => Math.max(a, b));
  const faults = beyondSamples(circuit, lowest, highest).map(({ path, message }) => ({
    path: `circuit.${path}`,
    message,
  }));
  if (circuit.referenceOhm === undefined && !hasResistance(circuit.source))
    faults.push({
      path: "circuit.referenceOhm",
      message: "The source has no resistance, so a reference is needed for reflections.",
    });
  if (linesIn(circuit.elements) * frequencies.length > mostLinePoints)
    faults.push({
      path: "circuit.elements",
      message: `${linesIn(circuit.elements)} lines at ${frequencies.length} frequencies is too much for one request; ask for fewer frequencies.`,
    });
  if (planes.length * frequencies.length > mostPlanePoints)
    faults.push({
      path: "planes",
      message: `${planes.length} planes at ${frequencies.length} frequencies is too much for one request; ask for fewer of either.`,
    });
  planes.forEach((plane, i) => {
    if ("beforeElement" in plane && plane.beforeElement >= circuit.elements.length)
      faults.push({
        path: `planes.${i}.beforeElement`,
        message: `The run has ${circuit.elements.length} elements, counted from 0.`,
      });
  });
  return faults;
}

/** @param frequency - hertz */
export function profileFaults(circuit: Circuit, frequency: number): CircuitFault[] {
  const faults = beyondSamples(circuit, frequency, frequency).map(({ path, message }) => ({
    path: `circuit.${path}`,
    message,
  }));
  if (!hasResistance(circuit.source))
    faults.push({ path: "circuit.source", message: "A source without resistance has no available power." });
  return faults;
}
