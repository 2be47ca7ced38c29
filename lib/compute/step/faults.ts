/** What the schema of a step cannot see: what has no signal, and what would take too long. Each fault at its path. Pure. */
import type { StepRequest } from "@/lib/compute/step/schema";
import type { Termination } from "@/lib/line/element";
import { laplaceGrid } from "@/lib/line/time/laplace-grid";
import { tapPlanes } from "@/lib/line/time/time-response";
import type { CircuitFault } from "@/lib/runs/circuit";
import type { Circuit, Element } from "@/lib/runs/circuit-schema";

/** The most one request may ask, in elements of a run times frequencies: about two seconds of work, as measured. */
const mostWork = 40_000_000;
/** Cables side by side are worked out one frequency after the other. */
const branchWork = 25;
const cableWork = 3;
/** Voltages in an answer, and voltages kept while a run is walked. */
const mostVoltages = 500_000;
const mostKept = 2_000_000;

/** @returns paths from the request's root */
export function stepFaults(request: StepRequest): CircuitFault[] {
  const faults = signalFaults(request.circuit).map(({ path, message }) => ({ path: `circuit.${path}`, message }));
  return [...faults, ...sizeFaults(request)];
}

/** Whatever is known on the imaginary axis only. */
function signalFaults({ source, elements, load }: Circuit): CircuitFault[] {
  const inside = elements.flatMap((element, k) => elementFaults(element, `elements.${k}`));
  return [...terminationFaults(source, "source"), ...inside, ...terminationFaults(load, "load")];
}

function elementFaults(element: Element, path: string): CircuitFault[] {
  if (element.kind === "shunt") return terminationFaults(element.termination, `${path}.termination`);
  if (element.kind === "stub" && typeof element.end !== "string") return terminationFaults(element.end, `${path}.end`);
  if (element.kind !== "part" || element.q === undefined || element.qAtHz !== undefined) return [];
  return [
    {
      path: `${path}.q`,
      message: "A part with the same Q at every frequency answers before it is asked; say at which frequency Q holds.",
    },
  ];
}

function terminationFaults(termination: Termination, path: string): CircuitFault[] {
  if (termination.kind === "sampled")
    return [
      { path, message: "A measured termination is known at its frequencies only, which is not enough for a signal." },
    ];
  if (termination.kind !== "constant" || termination.imOhm === 0) return [];
  return [
    {
      path: `${path}.imOhm`,
      message: "A reactance that is the same at every frequency has no signal; give it as a network of parts.",
    },
  ];
}

function workOf(element: Element): number {
  if (element.kind === "parallel") return branchWork * element.branches.length;
  return element.kind === "cable" || element.kind === "stub" ? cableWork : 1;
}

function sizeFaults({ circuit, drive, windowS, points, tapDips }: StepRequest): CircuitFault[] {
  const { count } = laplaceGrid({ windowS, points }, drive.riseS, drive.edge ?? "sineSquared");
  const elements = circuit.elements.reduce((sum, element) => sum + workOf(element), 0) * (tapDips ? 2 : 1);
  const nodes = 2 + tapPlanes(circuit).length;
  const faults: CircuitFault[] = [];
  if (elements * count > mostWork)
    faults.push({
      path: "circuit.elements",
      message: `${circuit.elements.length} elements over ${windowS / drive.riseS} edges is too much for one request; show less at once.`,
    });
  if (nodes * points > mostVoltages || nodes * count > mostKept)
    faults.push({
      path: "points",
      message: `${points} points at ${nodes} places is too much for one request; ask for fewer points or a shorter window.`,
    });
  return faults;
}
