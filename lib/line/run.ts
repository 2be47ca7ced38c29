import { slopeOf, type Analytic } from "@/lib/line/analytic";
import { abs, divide, type Complex } from "@/lib/line/complex";
import { DB_PER_NEPER } from "@/lib/line/constants";
import type { Circuit, Plane } from "@/lib/line/element";
import { complexArray, type ComplexArray } from "@/lib/line/line-figures";
import { portReflection, returnLossDb, vswr } from "@/lib/line/reflection";
import { portImpedance } from "@/lib/line/termination";
import { powerThrough, prepareRun, sourceImpedance, walk, type PreparedRun, type Walk } from "@/lib/line/walk";

/** What stands at one plane over frequency, looking toward the load. */
export interface PlaneFigures {
  plane: Plane;
  impedance: ComplexArray;
  reflection: ComplexArray;
  returnLossDb: Float64Array;
  vswr: Float64Array;
}

/**
 * A run over frequency. Every array has one value per frequency. A value without a finite number is Infinity where
 * that is its limit (return loss of a perfect match, VSWR of total reflection, loss where no power arrives, impedance
 * of an open) and NaN where it is not defined (losses of a source without available power, delay of no signal);
 * on the wire both are null.
 */
export interface Sweep {
  frequencies: Float64Array;
  /** at the source plane, ohm */
  inputImpedance: ComplexArray;
  /** power-wave reflection at the source plane */
  reflection: ComplexArray;
  returnLossDb: Float64Array;
  vswr: Float64Array;
  /** of the load in the run's real reference */
  loadReflection: ComplexArray;
  /** load voltage per volt of source e.m.f. */
  loadVoltage: ComplexArray;
  /** available source power over power in the load */
  transducerLossDb: Float64Array;
  /** what cables, pads and joints would lose between matched ends */
  matchedLossDb: Float64Array;
  /** available source power over power into the run */
  mismatchLossDb: Float64Array;
  /** power into the run over power in the load, less the matched loss; may be slightly negative */
  extraLossDb: Float64Array;
  /** −dφ/dω of load voltage (current into a short) over source e.m.f., second; exact at each frequency */
  groupDelayS: Float64Array;
  /** [i][k]: power into element i over power out of it, at frequency k */
  elementLossDb: Float64Array[];
  /** in the order asked */
  atPlanes: PlaneFigures[];
}

export interface SweepOptions {
  /** °C, for elements without a temperature of their own; default 20 */
  temperatureC?: number;
  planes?: readonly Plane[];
}

/**
 * A run over frequency, at any plane.
 * @param circuit - elements from source to load
 * @param frequencies - hertz, each above 0, length N
 * @throws RangeError when a frequency is not positive, an element or plane is impossible, a sampled termination does
 * not cover a frequency, or the source has no resistance and the circuit no referenceOhm
 */
export function sweep(circuit: Circuit, frequencies: ArrayLike<number>, options: SweepOptions = {}): Sweep {
  const run = prepareRun(circuit, options.temperatureC);
  const result = emptySweep(frequencies, circuit.elements.length, options.planes ?? []);
  const planes = result.atPlanes.map(({ plane }) => planeIndex(plane, circuit.elements.length));
  for (let k = 0; k < result.frequencies.length; k++) {
    const frequency = result.frequencies[k]!;
    if (!(frequency > 0 && frequency < Infinity))
      throw new RangeError(`sweep: frequencies must be positive, got ${frequency}`);
    const at = walk(run, { re: 0, im: 2 * Math.PI * frequency });
    const reference = planeReference(run, at);
    fillSourcePlane(result, k, at);
    fillLoad(result, k, at, reference);
    fillLosses(result, k, at, reference);
    result.atPlanes.forEach((figures, index) => fillPlane(figures, k, at, planes[index]!, reference));
  }
  return result;
}

function emptySweep(frequencies: ArrayLike<number>, elements: number, planes: readonly Plane[]): Sweep {
  const count = frequencies.length;
  const array = () => new Float64Array(count);
  return {
    frequencies: Float64Array.from(frequencies),
    inputImpedance: complexArray(count),
    reflection: complexArray(count),
    returnLossDb: array(),
    vswr: array(),
    loadReflection: complexArray(count),
    loadVoltage: complexArray(count),
    transducerLossDb: array(),
    matchedLossDb: array(),
    mismatchLossDb: array(),
    extraLossDb: array(),
    groupDelayS: array(),
    elementLossDb: Array.from({ length: elements }, array),
    atPlanes: planes.map((plane) => ({
      plane,
      impedance: complexArray(count),
      reflection: complexArray(count),
      returnLossDb: array(),
      vswr: array(),
    })),
  };
}

/** Plane n is before element n; the source is plane 0, the load plane N. A load plane of an empty run is the load's. */
interface PlaneIndex {
  index: number;
  isSource: boolean;
}

function planeIndex(plane: Plane, elements: number): PlaneIndex {
  if ("at" in plane) return plane.at === "source" ? { index: 0, isSource: true } : { index: elements, isSource: false };
  const index = plane.beforeElement;
  if (!(Number.isInteger(index) && index >= 0 && index < elements))
    throw new RangeError(`sweep: beforeElement must be a whole number from 0 to ${elements - 1}, got ${index}`);
  return { index, isSource: index === 0 };
}

/**
 * The real reference of reflections at every plane but the source's: the circuit's own, else the source's resistance.
 * @throws RangeError when the source has no resistance and the circuit names no reference
 */
function planeReference(run: PreparedRun, at: Walk): number {
  const reference = run.referenceOhm ?? sourceImpedance(at).re;
  if (!(reference > 0 && reference < Infinity))
    throw new RangeError(`sweep: referenceOhm is needed where the source has no resistance, got ${reference}`);
  return reference;
}

function put(array: ComplexArray, k: number, value: Complex): void {
  array.re[k] = value.re;
  array.im[k] = value.im;
}

function fillSourcePlane(result: Sweep, k: number, at: Walk): void {
  const { v, i } = at.planes[0]!;
  put(result.inputImpedance, k, portImpedance({ v, i }));
  const gamma = portReflection(v, i, sourceImpedance(at));
  put(result.reflection, k, gamma);
  const magnitude = abs(gamma);
  result.returnLossDb[k] = returnLossDb(magnitude);
  result.vswr[k] = vswr(magnitude);
}

function fillPlane(figures: PlaneFigures, k: number, at: Walk, { index, isSource }: PlaneIndex, reference: number): void {
  const { v, i } = at.planes[index]!;
  put(figures.impedance, k, portImpedance({ v, i }));
  const gamma = portReflection(v, i, isSource ? sourceImpedance(at) : { re: reference, im: 0 });
  put(figures.reflection, k, gamma);
  const magnitude = abs(gamma);
  figures.returnLossDb[k] = returnLossDb(magnitude);
  figures.vswr[k] = vswr(magnitude);
}

function fillLoad(result: Sweep, k: number, at: Walk, reference: number): void {
  const load = at.planes[at.scales.length]!;
  put(result.loadReflection, k, portReflection(load.v, load.i, { re: reference, im: 0 }));
  let scale = 0;
  for (const each of at.scales) scale += each;
  put(result.loadVoltage, k, loadVoltage(at, load.v, scale));
  result.groupDelayS[k] = scale === Infinity ? NaN : groupDelay(at, load.v.re === 0 && load.v.im === 0 ? load.i : load.v);
}

function loadVoltage(at: Walk, v: Analytic, scale: number): Complex {
  const factor = Math.exp(-scale);
  if (factor === 0) return { re: 0, im: 0 };
  const { i } = at.source;
  const ratio = divide({ re: v.re * i.re - v.im * i.im, im: v.re * i.im + v.im * i.re }, at.drive);
  return { re: ratio.re * factor, im: ratio.im * factor };
}

/** −Re d ln(quantity·source.i / drive)/ds; on the imaginary axis that is −dφ/dω. */
function groupDelay(at: Walk, quantity: Analytic): number {
  return logSlope(at.drive) - logSlope(quantity) - logSlope(at.source.i);
}

function logSlope(a: Analytic): number {
  return divide(slopeOf(a), a).re;
}

function fillLosses(result: Sweep, k: number, at: Walk, reference: number): void {
  const { planes, scales } = at;
  const load = planes[scales.length]!;
  const inLoad = Math.max(0, load.v.re * load.i.re + load.v.im * load.i.im);
  let power = inLoad;
  let runLossDb = 0;
  for (let n = scales.length - 1; n >= 0; n--) {
    const scale = scales[n]!;
    const entering = powerThrough(planes[n]!, power * Math.exp(-2 * scale), reference);
    const lossDb =
      power > 0 && scale < Infinity ? Math.max(0, 10 * Math.log10(entering / power) + scale * DB_PER_NEPER) : Infinity;
    result.elementLossDb[n]![k] = lossDb;
    runLossDb += lossDb;
    power = entering;
  }
  if (!(inLoad > 0)) runLossDb = Infinity;
  const matchedLossDb = at.matchedLoss * DB_PER_NEPER;
  const mismatchDb = mismatchDbOf(at, power);
  result.matchedLossDb[k] = matchedLossDb;
  result.mismatchLossDb[k] = mismatchDb;
  result.transducerLossDb[k] = mismatchDb + runLossDb;
  result.extraLossDb[k] = runLossDb - matchedLossDb;
}

/** Available source power over power into the run, dB: |drive|² / (4·Re(Zs)·|source.i|²·P). */
function mismatchDbOf(at: Walk, power: number): number {
  const { v, i } = at.source;
  const resistive = 4 * (v.re * i.re + v.im * i.im);
  if (!(resistive > 0)) return NaN;
  if (!(power > 0)) return Infinity;
  const { re, im } = at.drive;
  return Math.max(0, 10 * Math.log10((re * re + im * im) / (resistive * power)));
}
