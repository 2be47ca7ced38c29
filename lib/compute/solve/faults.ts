/** Whether a request to solve goes together, and how much work it asks. Pure. */
import { sweepFaults } from "@/lib/compute/faults";
import { frequenciesOf } from "@/lib/compute/frequencies";
import { limitFaults, pathFaults, targetFaults } from "@/lib/compute/path-faults";
import { targetWork } from "@/lib/compute/target-work";
import type { SolveAsked } from "@/lib/compute/solve/schema";
import type { Circuit } from "@/lib/line/element";
import { conditionPaths } from "@/lib/line/solve";
import type { TargetConditions } from "@/lib/line/targets";
import { frequenciesWithBands } from "@/lib/line/target";
import type { CircuitFault } from "@/lib/runs/circuit";

/** Elements times frequencies of one look at the run; a range is looked at some 250 times. */
const mostPoints = 100_000;
/** @returns paths from the request's root */
export function solveFaults(circuit: Circuit, request: SolveAsked): CircuitFault[] {
  const { vary, targets } = request;
  const frequencies = Array.from(frequenciesWithBands(frequenciesOf(request), targets));
  const isCondition = (conditionPaths as readonly string[]).includes(vary.path);
  const faults = [
    ...sweepFaults(request.circuit, frequencies, []),
    ...(isCondition
      ? limitFaults(vary.path, vary.between, "vary.between")
      : pathFaults(circuit, vary.path, vary.between, { path: "vary.path", limits: "vary.between" })),
  ];
  if (faults.length > 0) return faults;
  const pieces = circuit.elements.length + 1;
  const points = pieces * frequencies.length + targetWork(request.circuit, targets, request, frequencies.length);
  if (points > mostPoints)
    return [
      {
        path: "circuit.elements",
        message: `${circuit.elements.length} elements at ${frequencies.length} frequencies, looked at some 250 times, is too much for one request; ask for fewer frequencies.`,
      },
    ];
  return targetFaults(circuit, targets, conditionsAt(request, frequencies, vary.between[1]));
}

/** Conditions with a value at the path, where that is one of them. */
function conditionsAt(request: SolveAsked, frequencies: number[], value: number): TargetConditions {
  const { path } = request.vary;
  if (path === "drive.riseS")
    return { ...request, frequencies, drive: request.drive && { ...request.drive, riseS: value } };
  const isCondition = (conditionPaths as readonly string[]).includes(path);
  return { ...request, frequencies, ...(isCondition && { [path]: value }) };
}
