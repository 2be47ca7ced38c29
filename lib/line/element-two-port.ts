import { partBranch, shuntBranch, stubBranch } from "@/lib/line/branch";
import type { Complex } from "@/lib/line/complex";
import { steady } from "@/lib/line/analytic";
import type { Circuit, Element, LineModel, StubElement, Termination } from "@/lib/line/element";
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
  jointReferenceOhm?: number;
}

/**
 * An element as a two-port, its constants at its temperature worked out once.
 * @throws RangeError when the element is impossible (a length below 0, a pad below its least loss, a joint without an
 * impedance, …); the message names function, argument and value
 */
export function prepareElement(element: Element, options: ElementOptions = {}): TwoPortAt {
  const temperatureC = ("temperatureC" in element ? element.temperatureC : undefined) ?? options.temperatureC ?? 20;
  const warm = (model: LineModel) => atTemperature(model, temperatureC).model;
  switch (element.kind) {
    case "cable":
      return lineSection(warm(element.line.model), element.lengthM, element.paralleled);
    case "parallel":
      return parallelSections(element.branches.map(({ line, lengthM }) => ({ model: warm(line.model), length: lengthM })));
    case "stub":
      return stubBranch(element.connection, lineSection(warm(element.line.model), element.lengthM, element.paralleled), stubEnd(element));
    case "shunt":
      return (s) => shuntBranch(terminationPort(element.termination, s));
    case "part":
      return partBranch(element);
    case "pad":
      return constant(padTwoPort(element));
    case "joint":
      return jointTwoPort(element, element.referenceOhm ?? options.jointReferenceOhm ?? NaN);
    case "transformer":
      return constant(transformerTwoPort(element.turnsRatio));
  }
}

/** The element's two-port at one complex frequency. For a sweep prepare once. Throws as `prepareElement`. */
export function elementTwoPort(element: Element, s: Complex, options?: ElementOptions): TwoPort {
  return prepareElement(element, options)(s);
}

/** Every element of a run, source side first; joints find their impedance beside them. Throws as `prepareElement`. */
export function prepareElements(circuit: Pick<Circuit, "elements" | "referenceOhm">, temperatureC = 20): TwoPortAt[] {
  const { elements, referenceOhm } = circuit;
  return elements.map((element, index) =>
    prepareElement(element, {
      temperatureC,
      ...(element.kind === "joint" ? { jointReferenceOhm: jointReference(elements, index) ?? referenceOhm } : {}),
    }),
  );
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
