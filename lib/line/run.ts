import type { Circuit, Plane } from "@/lib/line/element";
import { complexArray, type ComplexArray } from "@/lib/line/line-figures";
import { fillLoad, fillLosses, fillPlane, fillSourcePlane, type PlaneIndex } from "@/lib/line/run-figures";
import { prepareRun, walk, type PreparedRun, type Walk } from "@/lib/line/walk";

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
  return sweepPrepared(prepareRun(circuit, options.temperatureC), frequencies, options.planes);
}

/** `sweep` of a run whose constants are worked out already: for asking one run again and again, as a search does. */
export function sweepPrepared(run: PreparedRun, frequencies: ArrayLike<number>, asked: readonly Plane[] = []): Sweep {
  const count = run.elements.length;
  const result = emptySweep(frequencies, count, asked);
  const planes = asked.map((plane) => planeIndex(plane, count));
  let at: Walk | undefined;
  for (let k = 0; k < result.frequencies.length; k++) {
    const frequency = result.frequencies[k]!;
    if (!(frequency > 0 && frequency < Infinity))
      throw new RangeError(`sweep: frequencies must be positive, got ${frequency}`);
    at = walk(run, { re: 0, im: 2 * Math.PI * frequency }, at);
    const reference = planeReference(run, at);
    fillSourcePlane(result, k, at);
    fillLoad(result, k, at, reference);
    fillLosses(result, k, at, reference);
    for (let n = 0; n < planes.length; n++) fillPlane(result.atPlanes[n]!, k, at, planes[n]!, reference);
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
  const reference = run.referenceOhm ?? at.sourceImpedance.re;
  if (!(reference > 0 && reference < Infinity))
    throw new RangeError(`sweep: referenceOhm is needed where the source has no resistance, got ${reference}`);
  return reference;
}
