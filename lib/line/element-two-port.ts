import { prepareLine, type LineAt } from "@/lib/line/cable";
import { partBranch, shuntBranch, stubBranch } from "@/lib/line/branch";
import type { Complex } from "@/lib/line/complex";
import { steady } from "@/lib/line/analytic";
import type { CableElement, Circuit, Element, LineModel, StubElement, Termination } from "@/lib/line/element";
import { jointReference, jointTwoPort } from "@/lib/line/joint";
import { padTwoPort } from "@/lib/line/pad";
import { lineSection, parallelSections } from "@/lib/line/section";
import { atTemperature } from "@/lib/line/temperature";
import { terminationPort } from "@/lib/line/termination";
import { NONE, type TwoPort, type TwoPortAt } from "@/lib/line/two-port";

export interface ElementOptions {
  /** °C, where the element has no temperature of its own; default 20 */
  temperatureC?: number;
  /** impedance of a joint that names none, ohm */
  jointReferenceOhm?: number | undefined;
  /** where the lines of a run are looked up, so that elements of one cable and temperature share it */
  lines?: LinesAtTemperature;
}

/** A line of a model at a temperature, the same one for the same model (by identity) and temperature. */
type LinesAtTemperature = (model: LineModel, temperatureC: number) => LineAt;

function linesAtTemperature(): LinesAtTemperature {
  const known = new Map<LineModel, Map<number, LineAt>>();
  return (model, temperatureC) => {
    const ofModel = known.get(model) ?? new Map<number, LineAt>();
    known.set(model, ofModel);
    const line = ofModel.get(temperatureC) ?? prepareLine(atTemperature(model, temperatureC).model);
    ofModel.set(temperatureC, line);
    return line;
  };
}

/**
 * An element as a two-port, its constants at its temperature worked out once.
 * @throws RangeError when the element is impossible (a length below 0, a pad below its least loss, a joint without an
 * impedance, …); the message names function, argument and value
 */
export function prepareElement(element: Element, options: ElementOptions = {}): TwoPortAt {
  const temperatureC = ("temperatureC" in element ? element.temperatureC : undefined) ?? options.temperatureC ?? 20;
  const lineOf = options.lines ?? linesAtTemperature();
  const section = ({ line, lengthM, paralleled }: CableElement | StubElement) =>
    lineSection(lineOf(line.model, temperatureC), lengthM, paralleled);
  switch (element.kind) {
    case "cable":
      return section(element);
    case "parallel":
      return parallelSections(
        element.branches.map(({ line, lengthM }) => ({ line: lineOf(line.model, temperatureC), length: lengthM })),
      );
    case "stub":
      return stubBranch(element.connection, section(element), stubEnd(element));
    case "shunt":
      return (s) => shuntBranch(terminationPort(element.termination, s));
    case "part":
      return partBranch(element);
    case "pad":
      return constant(padTwoPort(element));
    case "joint":
      return jointTwoPort(element, neededReference(element.referenceOhm ?? options.jointReferenceOhm));
    case "transformer":
      return constant(transformerTwoPort(element.turnsRatio));
  }
}

/** @throws RangeError where nothing says what impedance a joint's loss is stated in */
function neededReference(referenceOhm: number | undefined): number {
  if (referenceOhm !== undefined) return referenceOhm;
  throw new RangeError("prepareElement: a joint in a run without cable needs a referenceOhm");
}

/** The element's two-port at one complex frequency. For a sweep prepare once. Throws as `prepareElement`. */
export function elementTwoPort(element: Element, s: Complex, options?: ElementOptions): TwoPort {
  return prepareElement(element, options)(s);
}

/** An element ready for a walk; a cable carries its parts too, for the step that makes no objects. */
export interface PreparedElement {
  twoPort: TwoPortAt;
  cable?: { line: LineAt; length: number; paralleled: number };
}

/** A run, of which only the elements need be known; a joint without any cable about takes the reference or the source's resistance. */
type Chain = Pick<Circuit, "elements"> & Partial<Circuit>;

function constantResistance(source: Termination | undefined): number | undefined {
  return source?.kind === "constant" && source.reOhm > 0 ? source.reOhm : undefined;
}

/** Every element of a run, source side first; joints find their impedance beside them. Throws as `prepareElement`. */
export function prepareSteps(circuit: Chain, temperatureC = 20): PreparedElement[] {
  const { elements } = circuit;
  const referenceOhm = circuit.referenceOhm ?? constantResistance(circuit.source);
  const lines = linesAtTemperature();
  return elements.map((element, index) => {
    const jointReferenceOhm = element.kind === "joint" ? (jointReference(elements, index) ?? referenceOhm) : undefined;
    const twoPort = prepareElement(element, { temperatureC, lines, jointReferenceOhm });
    if (element.kind !== "cable") return { twoPort };
    const line = lines(element.line.model, element.temperatureC ?? temperatureC);
    return { twoPort, cable: { line, length: element.lengthM, paralleled: element.paralleled ?? 1 } };
  });
}

/** The same as two-ports alone. Throws as `prepareElement`. */
export function prepareElements(circuit: Chain, temperatureC = 20): TwoPortAt[] {
  return prepareSteps(circuit, temperatureC).map(({ twoPort }) => twoPort);
}

function stubEnd({ end }: StubElement): Termination {
  return typeof end === "string" ? { kind: end } : end;
}

function constant(twoPort: TwoPort): TwoPortAt {
  return () => twoPort;
}

/** Ideal transformer: V1 = n·V2, I1 = I2/n. */
function transformerTwoPort(turnsRatio: number): TwoPort {
  if (!(turnsRatio > 0 && turnsRatio < Infinity))
    throw new RangeError(`transformerTwoPort: turnsRatio must be positive, got ${turnsRatio}`);
  return { a: steady(turnsRatio), b: NONE, c: NONE, d: steady(1 / turnsRatio), logScale: 0, matchedLoss: 0 };
}
