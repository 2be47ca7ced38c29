import { abs, divide, multiply, scale, type Complex } from "@/lib/line/complex";
import type { Circuit } from "@/lib/line/element";
import type { Peak, Phasors } from "@/lib/line/line-wave";
import { stretchOf, type Stretch } from "@/lib/line/stretch";
import { portAt, powerThrough, prepareRun, walk, type Walk } from "@/lib/line/walk";

/**
 * Voltage and current along the main path of a run at one frequency, rms. Arrays have one value per point, from source
 * to load; an element with a length has `pointsPerElement` of them, both ends counted, one without has two.
 */
export interface StandingWave {
  /** metre from the source along the main path; equal for both points of an element without length */
  positionM: Float64Array;
  voltageV: Float64Array;
  currentA: Float64Array;
  /** which element a point lies in, counted from 0 */
  elementIndex: Int32Array;
  /** true maxima, which may lie between two points */
  maxVoltageV: number;
  maxVoltageAtM: number;
  maxCurrentA: number;
  maxCurrentAtM: number;
  /** what stays in each element, watt, at least 0; a stub's end and a tap's node are the element's own */
  elements: { dissipatedW: number }[];
  /** watt */
  loadPowerW: number;
  /** watt; load power and all dissipation */
  inputPowerW: number;
}

export interface StandingWaveOptions {
  /** °C, for elements without a temperature of their own; default 20 */
  temperatureC?: number;
  /** at least 2; default 101 */
  pointsPerElement?: number;
}

/**
 * Standing wave of a run for a stated available power of its source.
 * Current is that of all paralleled cables together. Where different cables lie side by side the voltage is the
 * highest of them and the current their sum at the same fraction of their lengths; the path's length is the first's.
 * @param frequency - hertz, above 0
 * @param availablePower - watt, at least 0
 * @throws RangeError when a figure is out of range, an element impossible, or the source without resistance, since
 * such a source has no available power
 */
export function standingWave(
  circuit: Circuit,
  frequency: number,
  availablePower: number,
  { temperatureC = 20, pointsPerElement = 101 }: StandingWaveOptions = {},
): StandingWave {
  if (!(frequency > 0 && frequency < Infinity))
    throw new RangeError(`standingWave: frequency must be positive, got ${frequency}`);
  if (!(availablePower >= 0 && availablePower < Infinity))
    throw new RangeError(`standingWave: availablePower must be at least 0, got ${availablePower}`);
  if (!(Number.isInteger(pointsPerElement) && pointsPerElement >= 2))
    throw new RangeError(
      `standingWave: pointsPerElement must be a whole number of at least 2, got ${pointsPerElement}`,
    );
  const s = { re: 0, im: 2 * Math.PI * frequency };
  const at = walk(prepareRun(circuit, temperatureC), s);
  const resistance = at.sourceImpedance.re;
  if (!(resistance > 0))
    throw new RangeError(`standingWave: the source's resistance must be positive, got ${resistance}`);
  const planes = phasorsAtPlanes(at, Math.sqrt(4 * resistance * availablePower));
  const stretches = circuit.elements.map((element, k) =>
    stretchOf(element, planes[k]!, planes[k + 1]!, s, temperatureC),
  );
  return {
    ...pointsAlong(stretches, planes, pointsPerElement),
    ...peaksAlong(stretches, planes),
    ...powers(planes, resistance),
  };
}

/** Voltage and current at every plane for an e.m.f., rms; what lies behind a short or an open has none. */
function phasorsAtPlanes(at: Walk, emf: number): Phasors[] {
  const unit: Complex = divide(scale(at.source.i, emf), at.drive);
  let passed = 0;
  return Array.from({ length: at.scales.length + 1 }, (_, k) => {
    if (k > 0) passed += at.scales[k - 1]!;
    const { v, i } = portAt(at, k);
    const here = scale(unit, Math.exp(-passed));
    return { v: multiply(v, here), i: multiply(i, here) };
  });
}

type Points = Pick<StandingWave, "positionM" | "voltageV" | "currentA" | "elementIndex">;

function pointsAlong(stretches: (Stretch | null)[], planes: Phasors[], perElement: number): Points {
  const count = stretches.length === 0 ? 1 : stretches.reduce((sum, stretch) => sum + (stretch ? perElement : 2), 0);
  const points: Points = {
    positionM: new Float64Array(count),
    voltageV: new Float64Array(count),
    currentA: new Float64Array(count),
    elementIndex: new Int32Array(count),
  };
  let n = 0;
  const put = (position: number, voltage: number, current: number, element: number) => {
    points.positionM[n] = position;
    points.voltageV[n] = voltage;
    points.currentA[n] = current;
    points.elementIndex[n] = element;
    n += 1;
  };
  const putPlane = (position: number, plane: number, element: number) =>
    put(position, abs(planes[plane]!.v), abs(planes[plane]!.i), element);
  if (stretches.length === 0) putPlane(0, 0, 0);
  let start = 0;
  stretches.forEach((stretch, k) => {
    const length = stretch?.length ?? 0;
    putPlane(start, k, k);
    for (let point = 1; stretch && point < perElement - 1; point++) {
      const distance = (length * point) / (perElement - 1);
      const { voltage, current } = stretch.at(distance);
      put(start + distance, voltage, current, k);
    }
    start += length;
    putPlane(start, k + 1, k);
  });
  return points;
}

type Peaks = Pick<StandingWave, "maxVoltageV" | "maxVoltageAtM" | "maxCurrentA" | "maxCurrentAtM">;

function peaksAlong(stretches: (Stretch | null)[], planes: Phasors[]): Peaks {
  let voltage: Peak = { value: -Infinity, at: 0 };
  let current = voltage;
  let start = 0;
  const higher = (best: Peak, value: number, at: number) => (value > best.value ? { value, at } : best);
  planes.forEach(({ v, i }, k) => {
    voltage = higher(voltage, abs(v), start);
    current = higher(current, abs(i), start);
    const stretch = stretches[k];
    if (!stretch) return;
    voltage = higher(voltage, stretch.peakVoltage.value, start + stretch.peakVoltage.at);
    current = higher(current, stretch.peakCurrent.value, start + stretch.peakCurrent.at);
    start += stretch.length;
  });
  return {
    maxVoltageV: voltage.value,
    maxVoltageAtM: voltage.at,
    maxCurrentA: current.value,
    maxCurrentAtM: current.at,
  };
}

type Powers = Pick<StandingWave, "elements" | "loadPowerW" | "inputPowerW">;

function powers(planes: Phasors[], reference: number): Powers {
  const { v, i } = planes[planes.length - 1]!;
  const loadPowerW = v.re * i.re + v.im * i.im;
  const elements = new Array<{ dissipatedW: number }>(planes.length - 1);
  let leaving = loadPowerW;
  for (let k = planes.length - 2; k >= 0; k--) {
    const { v, i } = planes[k]!;
    const entering = powerThrough(v.re, v.im, i.re, i.im, leaving, reference);
    elements[k] = { dissipatedW: entering - leaving };
    leaving = entering;
  }
  return { elements, loadPowerW, inputPowerW: leaving };
}
