/**
 * A run at direct current: what an ohm-meter reads at each access point, and voltage and power with a supply on it.
 * From either side a run is a source behind a resistance; `dc-side.ts` carries both through it.
 */
import {
  AT_REST,
  endAtRest,
  meeting,
  powerAt,
  sidesFromLoad,
  sidesFromSource,
  together,
  type Meeting,
} from "@/lib/line/dc-side";
import { prepareSteps } from "@/lib/line/element-two-port";
import type { Circuit, Element, StubElement } from "@/lib/line/element";
import { lineSection } from "@/lib/line/section";
import { prepareLine } from "@/lib/line/cable";
import { atTemperature } from "@/lib/line/temperature";
import { terminationPort } from "@/lib/line/termination";

/** A place where a meter can be put: the run's ends, its joints and its taps. */
export interface DcPoint {
  at: "end" | "joint" | "tap";
  /** index of the joint or tap; absent at the ends */
  element?: number;
  /** the run unpowered, as wired: everything to both sides in parallel; Infinity where nothing conducts */
  ohmMeterReadsOhm: number;
  /** NaN without a supply */
  voltageV: number;
  /** at the far end of a tap that has a length: the node's own level */
  nodeVoltageV?: number;
  /** source end: in the source's resistance; joint: 0; tap: in all that hangs on it; load end: all that arrives there */
  dissipatedW: number;
}

export interface Dc {
  /** resistance of the trunk's cables alone, both conductors, ohm */
  loopResistanceOhm: number;
  /** from source end to load end */
  points: DcPoint[];
  /** in each element, watt; NaN without a supply */
  elementDissipatedW: number[];
  /** current out of the source, ampere; NaN without a supply */
  supplyCurrentA: number;
}

export interface DcOptions {
  /** e.m.f. behind the source's resistance, volt; without it only resistances are known */
  supplyV?: number | undefined;
  /** drawn at the load end besides what the load's own resistance takes, ampere; default 0 */
  loadCurrentA?: number | undefined;
  /** °C, for elements without one of their own; default 20 */
  temperatureC?: number | undefined;
}

/**
 * A run at direct current. Of a line its dc resistance and leakage count, of a coil its fixed resistance; a capacitor
 * is open; a joint's flat loss counts as 0 Ω; an ideal transformer passes direct current as it does everything.
 * @param circuit - elements from source to load
 * @throws RangeError when an element is impossible, or an end is sampled and says nothing about direct current
 */
export function directCurrent(circuit: Circuit, options: DcOptions = {}): Dc {
  const { supplyV = NaN, loadCurrentA = 0, temperatureC = 20 } = options;
  const { elements } = circuit;
  const atRest = elements.map((element) => elementAtRest(element, temperatureC));
  const twoPorts = prepareSteps({ ...circuit, elements: atRest }, temperatureC).map((each) => each.twoPort(AT_REST));
  const fromSource = sidesFromSource(circuit.source, twoPorts, supplyV);
  const fromLoad = sidesFromLoad(circuit.load, twoPorts, loadCurrentA);
  const planes = fromSource.map((side, plane) => meeting(side, fromLoad[plane]!));
  const first = planes[0]!;
  const dissipated = elements.map((_, k) => lost(planes[k]!, planes[k + 1]!));
  const inside = accessPoints(elements).map(({ at, element }) => ({
    ...{ at, element, voltageV: planes[element]!.v },
    ohmMeterReadsOhm: together(fromSource[element]!, fromLoad[element]!),
    ...nodeLevel(atRest[element]!, planes[element]!.v, temperatureC),
    dissipatedW: at === "joint" ? 0 : dissipated[element]!,
  }));
  const end = (plane: number, dissipatedW: number): DcPoint => ({
    ...{ at: "end", voltageV: planes[plane]!.v, dissipatedW },
    ohmMeterReadsOhm: together(fromSource[plane]!, fromLoad[plane]!),
  });
  const last = planes[elements.length]!;
  return {
    loopResistanceOhm: elements.reduce((sum, element) => sum + loopResistance(element, temperatureC), 0),
    points: [end(0, first.i === 0 ? 0 : (supplyV - first.v) * first.i), ...inside, end(elements.length, powerAt(last))],
    elementDissipatedW: dissipated,
    supplyCurrentA: first.i,
  };
}

/** Power that goes in and does not come out. */
function lost(before: Meeting, after: Meeting): number {
  return powerAt(before) - powerAt(after);
}

function accessPoints(elements: readonly Element[]): { at: "joint" | "tap"; element: number }[] {
  return elements.flatMap((element, index): { at: "joint" | "tap"; element: number }[] => {
    if (element.kind === "joint") return [{ at: "joint", element: index }];
    const isTap = element.kind === "shunt" || (element.kind === "stub" && element.connection === "shunt");
    return isTap ? [{ at: "tap", element: index }] : [];
  });
}

/** An element as it is at rest: no flat loss of a joint, no reactance of an end that is stated for all frequencies. */
function elementAtRest(element: Element, temperatureC: number): Element {
  if (element.kind === "joint") return { kind: "joint", referenceOhm: 1 };
  if (element.kind === "shunt") return { ...element, termination: endAtRest(element.termination) };
  if (element.kind === "stub" && typeof element.end !== "string") return { ...element, end: endAtRest(element.end) };
  // side by side with a line of no resistance, the others carry nothing
  if (element.kind === "parallel" && loopResistance(element, temperatureC) === 0)
    return { kind: "joint", referenceOhm: 1 };
  return element;
}

/** Resistance of what lies along the trunk, both conductors, ohm; lines side by side share the current. */
function loopResistance(element: Element, temperatureC: number): number {
  const laidC = ("temperatureC" in element ? element.temperatureC : undefined) ?? temperatureC;
  const of = (model: Parameters<typeof atTemperature>[0], length: number) =>
    length * atTemperature(model, laidC).model.conductors.reduce((sum, { r0OhmPerM }) => sum + r0OhmPerM, 0);
  if (element.kind === "cable") return of(element.line.model, element.lengthM) / (element.paralleled ?? 1);
  if (element.kind !== "parallel") return 0;
  return 1 / element.branches.reduce((sum, { line, lengthM }) => sum + 1 / of(line.model, lengthM), 0);
}

/** The level at the far end of a tap that has a length. */
function nodeLevel(element: Element, trunkV: number, temperatureC: number): Pick<DcPoint, "nodeVoltageV"> {
  if (element.kind !== "stub" || element.connection !== "shunt" || element.end === "short") return {};
  const { v, i } = terminationPort(element.end === "open" ? { kind: "open" } : element.end, AT_REST);
  const { a, b, logScale } = stubSection(element, temperatureC);
  return { nodeVoltageV: (trunkV * v.re) / ((a.re * v.re + b.re * i.re) * Math.exp(logScale)) };
}

function stubSection(stub: StubElement, temperatureC: number) {
  const { model } = atTemperature(stub.line.model, stub.temperatureC ?? temperatureC);
  return lineSection(prepareLine(model), stub.lengthM, stub.paralleled)(AT_REST);
}
