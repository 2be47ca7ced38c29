/** Whether a tolerance request goes together, and how much work it asks. Pure. */
import { sweepFaults } from "@/lib/compute/faults";
import { frequenciesOf } from "@/lib/compute/frequencies";
import { pathFaults, refusal, targetFaults } from "@/lib/compute/path-faults";
import { targetWork } from "@/lib/compute/target-work";
import type { ToleranceAsked } from "@/lib/compute/tolerance/schema";
import { contributorLevels } from "@/lib/line/contributors";
import type { Circuit, Element } from "@/lib/line/element";
import { movedCircuit, type MovedCircuit } from "@/lib/line/moved-circuit";
import { frequenciesWithBands } from "@/lib/line/target";
import { isSweptAtSource } from "@/lib/line/targets";
import type { CircuitFault } from "@/lib/runs/circuit";

/** Values kept, of each of the two curves: 40 MB. */
const mostValues = 5_000_000;
/** Steps through one element at one frequency: some seconds. */
const mostSteps = 100_000_000;

/**
 * @param circuit - its lines found
 * @returns paths from the request's root
 */
export function toleranceFaults(circuit: Circuit, request: ToleranceAsked): CircuitFault[] {
  const { spread, targets } = request;
  const frequencies = Array.from(frequenciesWithBands(frequenciesOf(request), targets));
  const faults = [
    ...sweepFaults(request.circuit, frequencies, []),
    ...spread.flatMap(({ path, limits }, n) =>
      pathFaults(circuit, path, limits, { path: `spread.${n}.path`, limits: `spread.${n}.limits` }),
    ),
  ];
  if (faults.length > 0) return faults;
  let moved: MovedCircuit | undefined;
  const message = refusal(
    () =>
      (moved = movedCircuit(
        circuit,
        spread.map(({ path }) => path),
      )),
  );
  if (message !== undefined || !moved) return [{ path: "spread", message: message ?? "It cannot be moved." }];
  const tooMuch = workFaults(circuit, moved, request, frequencies.length);
  return tooMuch.length > 0 ? tooMuch : targetFaults(circuit, targets, { ...request, frequencies });
}

/** What an element costs, in steps, when it moves: a cable or a part is quick, anything else is made anew. */
function stepsOf(element: Element): number {
  if (element.kind === "parallel") return 20 * element.branches.length;
  const isQuick =
    element.kind === "cable" || element.kind === "part" || (element.kind === "stub" && typeof element.end === "string");
  return isQuick ? 1 : 20;
}

/** What the targets cost at every draw that the curves do not tell already. */
function targetSteps(request: ToleranceAsked, frequencies: number): number {
  const others = request.targets.filter((target) => !isSweptAtSource(target));
  if (others.length === 0) return 0;
  const swept = 5 * (request.circuit.elements.length + 2) * frequencies;
  return swept + 2 * targetWork(request.circuit, others, request, frequencies);
}

function workFaults(
  circuit: Circuit,
  { touched }: MovedCircuit,
  request: ToleranceAsked,
  frequencies: number,
): CircuitFault[] {
  const { draws, spread, corners } = request;
  const moving = circuit.elements.reduce(
    (sum, element, index) => sum + (touched.has(index) ? stepsOf(element) : element.kind === "joint" ? 1 : 0),
    0,
  );
  const responses = draws + (corners ? 2 ** spread.length : 0) + contributorLevels * spread.length;
  const steps = frequencies * responses * (2 + moving) + draws * targetSteps(request, frequencies);
  if (draws * frequencies <= mostValues && steps <= mostSteps) return [];
  return [
    {
      path: "draws",
      message: `${draws} draws at ${frequencies} frequencies of a run with ${touched.size} parts that move is too much for one request; ask for fewer draws or frequencies.`,
    },
  ];
}
