/**
 * The elements of a run whose figures move, as steps from the load toward the source over many frequencies at once. What
 * stays as it is between two that move is one chain matrix, worked out once; of what moves only that is made anew
 * which its moving changes.
 */
import { prepareElement, prepareSteps } from "@/lib/line/element-two-port";
import type { Circuit, Element, JointElement, PartElement } from "@/lib/line/element";
import { jointReference } from "@/lib/line/joint";
import type { FrequencyColumns } from "@/lib/line/line-columns";
import { cableStep, stubStep } from "@/lib/line/moved-line-steps";
import { cascade, THROUGH, type TwoPortAt } from "@/lib/line/two-port";
import {
  matrixColumns,
  putMatrix,
  stepThroughMatrix,
  type MatrixColumns,
  type WaveColumns,
} from "@/lib/line/wave-columns";

export interface MovedStep {
  /** whether the step is always the same */
  isFixed: boolean;
  apply: (wave: WaveColumns) => void;
}

export interface MovedRun {
  /** the run; its moved parts are written over before the steps are applied */
  circuit: Circuit;
  isMoved: (index: number) => boolean;
  temperatureC: number;
  columns: FrequencyColumns;
}

/**
 * Steps from the load to the source.
 * @throws RangeError when an element is impossible
 */
export function movedSteps(run: MovedRun): MovedStep[] {
  const { circuit, isMoved, temperatureC } = run;
  const fixed = prepareSteps(circuit, temperatureC);
  const steps: MovedStep[] = [];
  let waiting: TwoPortAt[] = [];
  const settle = () => {
    if (waiting.length > 0) steps.push(fixedStep(waiting, run));
    waiting = [];
  };
  for (let index = circuit.elements.length - 1; index >= 0; index--) {
    if (!isMoved(index) && !hasMovedReference(run, index)) {
      waiting.unshift(fixed[index]!.twoPort);
      continue;
    }
    settle();
    steps.push(movedStep(run, index));
  }
  settle();
  return steps;
}

/** Whether a joint takes its impedance from a cable that moves. */
function hasMovedReference({ circuit, isMoved }: MovedRun, index: number): boolean {
  const joint = circuit.elements[index]!;
  if (joint.kind !== "joint" || joint.referenceOhm !== undefined) return false;
  return circuit.elements.some((_, other) => isMoved(other)) || isMoved(-1);
}

function movedStep(run: MovedRun, index: number): MovedStep {
  const element = run.circuit.elements[index]!;
  if (element.kind === "cable") return cableStep(element, run);
  if (element.kind === "stub" && typeof element.end === "string") return stubStep(element, run);
  if (element.kind === "part") return partStep(element, run);
  if (element.kind === "joint" && !run.isMoved(index)) return jointStep(element, index, run);
  return anyStep(element, index, run);
}

const sAt = (omega: number) => ({ re: 0, im: omega });

function fill(matrix: MatrixColumns, twoPort: TwoPortAt, { omega }: FrequencyColumns): void {
  for (let k = 0; k < omega.length; k++) putMatrix(matrix, k, twoPort(sAt(omega[k]!)));
}

/** Elements that stay as they are, source side first, as one. */
function fixedStep(elements: TwoPortAt[], { columns }: MovedRun): MovedStep {
  const matrix = matrixColumns(columns.omega.length);
  fill(matrix, (s) => elements.map((each) => each(s)).reduce(cascade, THROUGH), columns);
  return { isFixed: true, apply: (wave) => stepThroughMatrix(matrix, 1, wave) };
}

/** An element made anew every time. */
function anyStep(element: Element, index: number, { circuit, temperatureC, columns }: MovedRun): MovedStep {
  const matrix = matrixColumns(columns.omega.length);
  const apply = (wave: WaveColumns) => {
    const jointReferenceOhm = element.kind === "joint" ? referenceAt(circuit, index) : undefined;
    fill(matrix, prepareElement(element, { temperatureC, jointReferenceOhm }), columns);
    stepThroughMatrix(matrix, 1, wave);
  };
  return { isFixed: false, apply };
}

/** A joint whose impedance moves alone: the matrix of 1 Ω serves for all, the capacitance beside it. */
function jointStep(joint: JointElement, index: number, run: MovedRun): MovedStep {
  const { circuit, columns } = run;
  const matrix = matrixColumns(columns.omega.length);
  const { shuntF = 0, ...lossy } = joint;
  fill(matrix, prepareElement(lossy, { jointReferenceOhm: 1 }), columns);
  const beside: Element = { kind: "part", connection: "shunt", cF: shuntF };
  const capacitor = shuntF > 0 ? fixedStep([prepareElement(beside)], run) : undefined;
  const apply = (wave: WaveColumns) => {
    capacitor?.apply(wave);
    stepThroughMatrix(matrix, referenceAt(circuit, index) ?? NaN, wave);
  };
  return { isFixed: false, apply };
}

function referenceAt({ elements, source, referenceOhm }: Circuit, index: number): number | undefined {
  const own = referenceOhm ?? (source.kind === "constant" && source.reOhm > 0 ? source.reOhm : undefined);
  return jointReference(elements, index) ?? own;
}

/** A part's impedance is proportional to its resistance or inductance, or to 1/C, its loss included. */
function partStep(part: PartElement, run: MovedRun): MovedStep {
  const value = () => part.rOhm ?? part.lH ?? 1 / part.cF!;
  const one: PartElement = { ...part, ...(part.rOhm !== undefined && { rOhm: 1 }) };
  if (part.lH !== undefined) one.lH = 1;
  if (part.cF !== undefined) one.cF = 1;
  const matrix = matrixColumns(run.columns.omega.length);
  const any = anyStep(part, -1, run);
  const { q, qAtHz } = part;
  fill(matrix, prepareElement(one), run.columns);
  const apply = (wave: WaveColumns) => {
    const impedance = value();
    if (impedance > 0 && impedance < Infinity && part.q === q && part.qAtHz === qAtHz)
      stepThroughMatrix(matrix, impedance, wave);
    else any.apply(wave);
  };
  return { isFixed: false, apply };
}
