/** Whether a request to solve goes together, and how much work it asks. Pure. */
import { sweepFaults } from "@/lib/compute/faults";
import { frequenciesOf } from "@/lib/compute/frequencies";
import { pathFaults, targetFaults } from "@/lib/compute/path-faults";
import type { SolveAsked } from "@/lib/compute/solve/schema";
import type { Circuit } from "@/lib/line/element";
import { conditionPaths } from "@/lib/line/solve";
import { frequenciesWithBands } from "@/lib/line/target";
import type { CircuitFault } from "@/lib/runs/circuit";

/** Elements times frequencies of one look at the run; a range is looked at some 250 times. */
const mostPoints = 100_000;
/** A standing wave is about this many times the work of a sweep. */
const waveWork = 20;

/** @returns paths from the request's root */
export function solveFaults(circuit: Circuit, request: SolveAsked): CircuitFault[] {
  const { vary, targets } = request;
  const frequencies = Array.from(frequenciesWithBands(frequenciesOf(request), targets));
  const isCondition = (conditionPaths as readonly string[]).includes(vary.path);
  const faults = [
    ...sweepFaults(request.circuit, frequencies, []),
    ...(isCondition ? [] : pathFaults(circuit, vary.path, vary.between, { path: "vary.path", limits: "vary.between" })),
  ];
  if (faults.length > 0) return faults;
  const waves = targets.filter(({ quantity }) => quantity === "voltage").length;
  const points = (circuit.elements.length + 1) * frequencies.length * (1 + waveWork * waves);
  if (points > mostPoints)
    return [
      {
        path: "circuit.elements",
        message: `${circuit.elements.length} elements at ${frequencies.length} frequencies, looked at some 250 times, is too much for one request; ask for fewer frequencies.`,
      },
    ];
  const conditions = { ...request, frequencies, ...(isCondition && { [vary.path]: vary.between[0] }) };
  return targetFaults(circuit, targets, conditions);
}
