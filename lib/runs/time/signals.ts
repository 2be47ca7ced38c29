/** A run and a drive -> everything the Time view shows. Pure; every figure comes from `lib/line`. */
import { nominalFigures } from "@/lib/line/cable";
import { lengthAlongPath, type Circuit, type Element } from "@/lib/line/element";
import { finalEmf, type Drive } from "@/lib/line/time/drive";
import { mostEdges } from "@/lib/line/time/laplace-grid";
import { latticeRays, type ElementRay } from "@/lib/line/time/rays";
import { readings, type Readings } from "@/lib/line/time/readings";
import { settledLevels } from "@/lib/line/time/settled";
import { tapPlanes, timeResponse, type Signal } from "@/lib/line/time/time-response";

export interface NodeSignal {
  /** volt, one value for each time shown */
  volts: Float64Array;
  /** NaN where it never comes to rest */
  settledV: number;
}

export interface TimeSignals {
  timeS: Float64Array;
  source: NodeSignal;
  load: NodeSignal;
  /** one for each shunt stub, in the run's order; `element` is its place */
  taps: (NodeSignal & { element: number; readings: Readings })[];
  /** at the load */
  readings: Readings;
  /** along the path; fronts within stubs are not drawn */
  rays: ElementRay[];
  omittedRays: number;
}

const pointsShown = 601;

/** @throws RangeError where the engine refuses */
export function timeSignals(circuit: Circuit, drive: Drive, windowS: number, temperatureC: number): TimeSignals {
  const tapped = tapPlanes(circuit);
  const planes = [0, circuit.elements.length, ...tapped];
  const response = timeResponse(circuit, drive, { windowS, points: pointsShown }, { planes, temperatureC });
  const levels = settledLevels(circuit, planes, temperatureC);
  const shown = ({ values }: Signal) =>
    Float64Array.from({ length: pointsShown }, (_, k) => values[k * response.every] ?? NaN);
  const read = (n: number) => readings(response.planes[n]!, drive, levels[n]!);
  const node = (n: number) => ({ volts: shown(response.planes[n]!), settledV: read(n).settledV });
  const { rays, omitted } = latticeRays(circuit, drive, windowS);
  const isOnPath = ({ element }: ElementRay) => lengthAlongPath(circuit.elements[element]!) > 0;
  return {
    timeS: Float64Array.from({ length: pointsShown }, (_, k) => (k * windowS) / (pointsShown - 1)),
    source: node(0),
    load: node(1),
    taps: tapped.map((element, n) => ({ element, ...node(n + 2), readings: read(n + 2) })),
    readings: read(1),
    rays: rays.filter(isOnPath),
    omittedRays: omitted,
  };
}

/** One way from source to load, second. */
export function pathDelayS({ elements }: Circuit): number {
  return elements.reduce((sum, element) => sum + delayOf(element), 0);
}

function delayOf(element: Element): number {
  if (element.kind === "cable") return element.lengthM * nominalFigures(element.line.model).delay;
  if (element.kind !== "parallel") return 0;
  return Math.max(0, ...element.branches.map(({ line, lengthM }) => lengthM * nominalFigures(line.model).delay));
}

/** The nearest round figure above a value. */
function rounded(value: number): number {
  const decade = 10 ** Math.floor(Math.log10(value) + 1e-9);
  return [1, 1.5, 2, 2.5, 3, 4, 5, 6, 8, 10].map((step) => step * decade).find((step) => step >= value * 0.98) ?? value;
}

/** What one looks at first: an edge that is short beside the line, and time for two round trips. */
export function usualTimes(circuit: Circuit): { riseS: number; windowS: number } {
  const delay = pathDelayS(circuit);
  if (!(delay > 0)) return { riseS: 1e-9, windowS: 2e-8 };
  const riseS = rounded(delay / 40);
  return { riseS, windowS: Math.min(mostEdges * riseS, rounded(4 * delay)) };
}

export interface Ground {
  /** of each column's middle, metres from the source */
  positionsM: number[];
  rows: number;
  /** volt above where the line comes to rest there, 0 until the first front has arrived; row by row, rows·columns of them */
  aboveSettledV: Float32Array;
}

/** A front has arrived when the voltage has come to this part of the edge. */
const arrived = 5e-3;
const columns = 56;
const rowsShown = 160;
/** Transform values times columns beyond which the ground is not worked out: it would take longer than one waits for. */
const mostGround = 700_000;

/** Elements with their cables cut so that there is a plane about every `stepM` metres. */
function cut(elements: readonly Element[], stepM: number): Element[] {
  return elements.flatMap((element): Element[] => {
    if (element.kind !== "cable" || !(element.lengthM > 0)) return [element];
    const pieces = Math.max(1, Math.round(element.lengthM / stepM));
    return Array.from({ length: pieces }, () => ({ ...element, lengthM: element.lengthM / pieces }));
  });
}

/**
 * The voltage everywhere along the path over time, against where it comes to rest.
 * @returns null where the line has no length, never comes to rest or would take too long to work out
 * @throws RangeError where the engine refuses
 */
export function groundOf(circuit: Circuit, drive: Drive, windowS: number, temperatureC: number): Ground | null {
  const totalM = circuit.elements.reduce((sum, element) => sum + lengthAlongPath(element), 0);
  const work = Math.max(4096, (16 * windowS) / drive.riseS) * columns;
  if (!(totalM > 0) || work > mostGround) return null;
  const elements = cut(circuit.elements, totalM / columns);
  const planes: number[] = [];
  const positionsM: number[] = [];
  let at = 0;
  elements.forEach((element, k) => {
    const length = lengthAlongPath(element);
    if (length > 0) {
      planes.push(k);
      positionsM.push(at);
    }
    at += length;
  });
  planes.push(elements.length);
  positionsM.push(totalM);
  const whole = { ...circuit, elements };
  const levels = settledLevels(whole, planes, temperatureC);
  if (!levels.every(Number.isFinite)) return null;
  const response = timeResponse(whole, drive, { windowS, points: rowsShown }, { planes, temperatureC });
  const settled = levels.map((level) => level * finalEmf(drive));
  const aboveSettledV = new Float32Array(rowsShown * planes.length);
  for (let n = 0; n < planes.length; n++) {
    const { values } = response.planes[n]!;
    const arrives = values.findIndex((volt) => Math.abs(volt) > arrived * Math.abs(drive.amplitudeV));
    for (let row = 0; row < rowsShown; row++)
      if (arrives >= 0 && row * response.every >= arrives)
        aboveSettledV[row * planes.length + n] = values[row * response.every]! - settled[n]!;
  }
  return { positionsM, rows: rowsShown, aboveSettledV };
}
