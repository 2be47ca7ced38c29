/** A run as lines and the junctions between them, as a wave front meets it: lossless, at the highest frequencies. */
import { nominalFigures } from "@/lib/line/cable";
import { DB_PER_NEPER } from "@/lib/line/constants";
import type { Circuit, Element, JointElement, LineModel, StubElement, Termination } from "@/lib/line/element";
import { jointReference } from "@/lib/line/joint";
import { padTwoPort } from "@/lib/line/pad";
import type { Closing, Junction, LineEnd, Link } from "@/lib/line/time/junction";
import { frontResistance, rationalPart, rationalTermination } from "@/lib/line/time/rational-port";
import { chainMatrix } from "@/lib/line/two-port";

export interface LatticeLine {
  /** ohm, of all paralleled cables together */
  impedance: number;
  /** one way, second */
  delayS: number;
  /** of the run's elements, which one it is part of */
  element: number;
}

export interface LatticeGraph {
  /** line n ends at ends[2n] and ends[2n + 1], which are indices of junctions */
  lines: LatticeLine[];
  ends: number[];
  junctions: Junction[];
  /** index of the junction in which the source is */
  source: number;
}

const SHORT: Closing = { v: 0, i: 1 };
const OPEN: Closing = { v: 1, i: 0 };

function closingOf(resistance: number): Closing {
  return resistance === Infinity ? OPEN : { v: resistance, i: 1 };
}

function frontOf(termination: Termination): number {
  return frontResistance(rationalTermination(termination));
}

/** Collects lines and junctions while the run is walked from source to load. */
class Builder {
  lines: LatticeLine[] = [];
  ends: number[] = [];
  junctions: Junction[] = [];
  /** the element that is being added */
  element = 0;
  private place = "source";
  private left: Closing;
  private links: Link[] = [];

  constructor(source: Termination) {
    this.left = { ...closingOf(frontOf(source)), isDriven: true };
  }

  add(link: Link): void {
    this.links.push(link);
  }

  /** Ends the junction that is open and begins the next behind what ends it. */
  close(right: Closing, place: string, left: Closing): void {
    const index = this.junctions.push({ place: this.place, left: this.left, links: this.links, right }) - 1;
    for (const end of endsOf(this.junctions[index]!)) this.ends[end] = index;
    this.place = place;
    this.left = left;
    this.links = [];
  }

  finish(right: Closing): void {
    if (this.place !== "source") this.place = "load";
    this.close(right, "", OPEN);
  }

  /** @returns the end at the source side */
  line(model: LineModel, length: number, paralleled = 1): LineEnd {
    const { z0, delay } = nominalFigures(model);
    const line = { impedance: z0 / paralleled, delayS: delay * length, element: this.element };
    return 2 * (this.lines.push(line) - 1);
  }

  through(lines: LineEnd[], place: string): void {
    this.close({ ends: lines }, place, { ends: lines.map((end) => end + 1) });
  }

  /** Across the line or in it; what lets nothing through ends one junction and begins another. */
  resistor(connection: "shunt" | "series", ohm: number, place: string): void {
    if (connection === "shunt" && ohm === 0) this.close(SHORT, place, SHORT);
    else if (connection === "series" && ohm === Infinity) this.close(OPEN, place, OPEN);
    else if (connection === "shunt") this.add({ kind: "matrix", a: 1, b: 0, c: 1 / ohm, d: 1 });
    else this.add({ kind: "matrix", a: 1, b: ohm, c: 0, d: 1 });
  }

  stub(element: StubElement, place: string): void {
    const { line, lengthM, paralleled, connection } = element;
    const end: Termination = typeof element.end === "string" ? { kind: element.end } : element.end;
    if (lengthM === 0) return this.resistor(connection, frontOf(end), place);
    const near = this.line(line.model, lengthM, paralleled);
    const index = this.junctions.push({
      place: `${place}.end`,
      left: { ends: [near + 1] },
      links: [],
      right: closingOf(frontOf(end)),
    });
    this.ends[near + 1] = index - 1;
    this.add({ kind: connection === "shunt" ? "shuntLine" : "seriesLine", end: near });
  }
}

function endsOf({ left, links, right }: Junction): LineEnd[] {
  const inside = links.flatMap((link) => ("end" in link ? [link.end] : []));
  return [...("ends" in left ? left.ends : []), ...inside, ...("ends" in right ? right.ends : [])];
}

/**
 * Lines and junctions of a run. Delay and impedance are √(L∞C) and √(L∞/C); a capacitor is a short to a front and a coil
 * an opening. Of a joint its flat loss counts; its shunt capacitance, small beside any edge, does not.
 * @throws RangeError for what is known on the imaginary axis only, and for a joint that has no impedance
 */
export function latticeGraph(circuit: Circuit): LatticeGraph {
  const { source, elements, load } = circuit;
  const builder = new Builder(source);
  builder.add({ kind: "node", name: "source" });
  let taps = 0;
  elements.forEach((element, k) => {
    if (element.kind === "stub" && element.connection === "shunt")
      builder.add({ kind: "node", name: `taps.${taps++}` });
    builder.element = k;
    addElement(builder, element, k, circuit);
  });
  builder.add({ kind: "node", name: "load" });
  builder.finish(closingOf(frontOf(load)));
  const { lines, ends, junctions } = builder;
  const driven = junctions.findIndex(({ left }) => "isDriven" in left);
  return { lines, ends, junctions, source: driven };
}

function addElement(builder: Builder, element: Element, k: number, circuit: Circuit): void {
  const after = k === circuit.elements.length - 1 ? "load" : `beforeElement.${k + 1}`;
  switch (element.kind) {
    case "cable":
      if (element.lengthM > 0)
        builder.through([builder.line(element.line.model, element.lengthM, element.paralleled)], after);
      return;
    case "parallel":
      return builder.through(
        element.branches.map(({ line, lengthM }) => builder.line(line.model, lengthM)),
        after,
      );
    case "stub":
      return builder.stub(element, `elements.${k}`);
    case "shunt":
      return builder.resistor("shunt", frontOf(element.termination), after);
    case "part":
      return builder.resistor(element.connection, frontResistance(rationalPart(element)), after);
    case "pad":
      return builder.add(padLink(element));
    case "joint":
      return builder.add(jointLink(element, k, circuit));
    case "transformer":
      return builder.add({ kind: "matrix", a: element.turnsRatio, b: 0, c: 0, d: 1 / element.turnsRatio });
  }
}

function padLink(element: Extract<Element, { kind: "pad" }>): Link {
  const { a, b, c, d } = chainMatrix(padTwoPort(element));
  return { kind: "matrix", a: a.re, b: b.re, c: c.re, d: d.re };
}

function jointLink({ lossDb = 0 }: JointElement, k: number, { elements, source, referenceOhm }: Circuit): Link {
  if (lossDb === 0) return { kind: "matrix", a: 1, b: 0, c: 0, d: 1 };
  const resistance = source.kind === "constant" && source.reOhm > 0 ? source.reOhm : undefined;
  const reference = jointReference(elements, k) ?? referenceOhm ?? resistance;
  if (reference === undefined)
    throw new RangeError("latticeGraph: a joint in a run without cable needs a referenceOhm");
  const theta = lossDb / DB_PER_NEPER;
  const [cosh, sinh] = [Math.cosh(theta), Math.sinh(theta)];
  return { kind: "matrix", a: cosh, b: reference * sinh, c: sinh / reference, d: cosh };
}
