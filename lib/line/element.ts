/**
 * The shapes a run is made of: the line model, terminations, elements, the circuit. They are the shapes of the wire
 * (`/api/v1/compute/*`), so the unit is in the key. The line reference `L` is left open: a resolved `Line` inside
 * the engine, a catalogue reference on the wire.
 * Types only; what they do electrically is in `cable.ts`, `termination.ts` and `two-port.ts`.
 */

export type ConductorForm = "round" | "sheet" | "sqrt" | "constant";

export interface Conductor {
  form: ConductorForm;
  /** dc resistance, ohm per metre of cable at 20 °C, at least 0 */
  r0OhmPerM: number;
  /** skin corner, rad/s, above 0; absent for `constant` */
  skinCornerRadPerS?: number;
}

export interface LossSlope {
  fromC: number;
  toC: number;
  perK: number;
}

/** One cable per metre, at 20 °C. R and L are loop values (out and back). */
export interface LineModel {
  /** one or two terms */
  conductors: Conductor[];
  /** external (high-frequency) inductance, H/m, above 0 */
  lInfHPerM: number;
  /** capacitance at 1 MHz, F/m, above 0 */
  cFPerM: number;
  lossTangent?: number;
  g0SPerM?: number;
  temperatureCoefficientPerK?: number;
  lossSlopes?: LossSlope[];
}

/** A model and, where it came from the catalogue, which entry it is. The engine reads only `model`. */
export interface Line {
  model: LineModel;
  cableId?: string;
  revision?: number;
}

export type Termination =
  | { kind: "constant"; reOhm: number; imOhm: number }
  | { kind: "network"; topology: "series" | "parallel"; rOhm?: number; lH?: number; cF?: number }
  | { kind: "open" }
  | { kind: "short" }
  | { kind: "sampled"; referenceOhm: number; frequenciesHz: number[]; reflection: { re: number[]; im: number[] } };

interface Named {
  name?: string;
}

interface Laid extends Named {
  lengthM: number;
  lengthToleranceM?: number;
  temperatureC?: number;
}

export interface CableElement<L = Line> extends Laid {
  kind: "cable";
  line: L;
  paralleled?: number;
}

export interface ParallelElement<L = Line> extends Named {
  kind: "parallel";
  branches: { line: L; lengthM: number }[];
  temperatureC?: number;
}

export interface StubElement<L = Line> extends Laid {
  kind: "stub";
  connection: "shunt" | "series";
  end: "open" | "short" | Termination;
  line: L;
  paralleled?: number;
}

export interface ShuntElement extends Named {
  kind: "shunt";
  termination: Termination;
}

export interface PartElement extends Named {
  kind: "part";
  connection: "shunt" | "series";
  rOhm?: number;
  lH?: number;
  cF?: number;
  q?: number;
  qAtHz?: number;
}

export interface PadElement extends Named {
  kind: "pad";
  topology?: "T" | "pi";
  lossDb: number;
  inputOhm: number;
  outputOhm: number;
}

export interface JointElement extends Named {
  kind: "joint";
  lossDb?: number;
  lossDbAtOneGhz?: number;
  referenceOhm?: number;
  shuntF?: number;
}

export interface TransformerElement extends Named {
  kind: "transformer";
  turnsRatio: number;
}

export type Element<L = Line> =
  | CableElement<L>
  | ParallelElement<L>
  | StubElement<L>
  | ShuntElement
  | PartElement
  | PadElement
  | JointElement
  | TransformerElement;

/** Elements run from source to load. */
export interface Circuit<L = Line> {
  source: Termination;
  elements: Element<L>[];
  load: Termination;
  /** reference for reflections at planes other than the source; default Re(source), required where that is 0 */
  referenceOhm?: number;
}

export type Plane = { at: "source" } | { at: "load" } | { beforeElement: number };

/** Elements that lie on the main path and have a length along it. */
export function lengthAlongPath<L>(element: Element<L>): number {
  if (element.kind === "cable") return element.lengthM;
  if (element.kind === "parallel") return element.branches[0]?.lengthM ?? 0;
  return 0;
}
