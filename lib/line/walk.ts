/** Voltage and current at every plane of a run at one complex frequency: the load is set, the rest follows toward the source. */
import { sumOfProducts, type Analytic } from "@/lib/line/analytic";
import type { Complex } from "@/lib/line/complex";
import type { Circuit, Termination } from "@/lib/line/element";
import { prepareSteps, type PreparedElement } from "@/lib/line/element-two-port";
import { PLANE, put, stepThroughLine, take, VALUE } from "@/lib/line/packed";
import { portImpedance, terminationPort, type Port } from "@/lib/line/termination";
import { throughTwoPort } from "@/lib/line/two-port";

export interface PreparedRun {
  source: Termination;
  elements: PreparedElement[];
  load: Termination;
  referenceOhm: number | undefined;
}

/**
 * A run with the constants of its elements worked out once.
 * @param circuit - elements from source to load
 * @param temperatureC - °C, for elements without one of their own
 * @throws RangeError when an element is impossible, or the source is open or sampled
 */
export function prepareRun(circuit: Circuit, temperatureC = 20): PreparedRun {
  const { source, load, referenceOhm } = circuit;
  if (source.kind === "open" || source.kind === "sampled")
    throw new RangeError(`prepareRun: source must not be ${source.kind}`);
  if (referenceOhm !== undefined && !(referenceOhm > 0))
    throw new RangeError(`prepareRun: referenceOhm must be positive, got ${referenceOhm}`);
  return { source, elements: prepareSteps(circuit, temperatureC), load, referenceOhm };
}

/** One frequency of a run of N elements. Plane k is before element k, plane N is the load. */
export interface Walk {
  /** packed, N + 1 planes; plane k is in a unit e^{scales[k] + … + scales[N−1]} times smaller than the load's */
  planes: Float64Array;
  /** length N, neper; Infinity where an element lets nothing through */
  scales: Float64Array;
  /** Σ nominal loss of cables, pads and joints, neper */
  matchedLoss: number;
  /** plane 0 */
  input: Port;
  /** plane N */
  load: Port;
  /** the source's impedance as a pair, v : i */
  source: Port;
  /** the same in ohm; infinite for a source that passes no current */
  sourceImpedance: Complex;
  /** what the source's e.m.f. times source.i must be for the planes to be as they are, before scales */
  drive: Analytic;
}

/** Voltage and current at a plane, in its own unit. */
export function portAt(walk: Pick<Walk, "planes">, plane: number): Port {
  return { v: take(walk.planes, plane * PLANE), i: take(walk.planes, plane * PLANE + VALUE) };
}

/**
 * Walks a run from load to source at s.
 * @param into - an earlier walk of the same run whose arrays may be written over
 * @throws RangeError where the load or an end is sampled and s lies outside it
 */
export function walk(run: PreparedRun, s: Complex, into?: Walk): Walk {
  const count = run.elements.length;
  const planes = into?.planes ?? new Float64Array((count + 1) * PLANE);
  const scales = into?.scales ?? new Float64Array(count);
  const load = terminationPort(run.load, s);
  put(planes, count * PLANE, load.v);
  put(planes, count * PLANE + VALUE, load.i);
  let matchedLoss = 0;
  for (let k = count - 1; k >= 0; k--) matchedLoss += step(run.elements[k]!, s, planes, scales, k);
  const source = terminationPort(run.source, s);
  const sourceImpedance = portImpedance(source);
  const input = portAt({ planes }, 0);
  const drive = sumOfProducts(source.i, input.v, source.v, input.i);
  return { planes, scales, matchedLoss, input, load, source, sourceImpedance, drive };
}

/** From plane k + 1 to plane k. Returns the element's nominal loss, neper. */
function step(
  { cable, twoPort }: PreparedElement,
  s: Complex,
  planes: Float64Array,
  scales: Float64Array,
  k: number,
): number {
  const to = k * PLANE;
  let matchedLoss: number;
  if (cable !== undefined) {
    matchedLoss = stepThroughLine(cable.line(s), cable.length, cable.paralleled, planes, to + PLANE, to);
    scales[k] = matchedLoss;
  } else {
    const element = twoPort(s);
    const { v, i } = throughTwoPort(element, portAt({ planes }, k + 1));
    put(planes, to, v);
    put(planes, to + VALUE, i);
    matchedLoss = element.matchedLoss;
    scales[k] = element.logScale;
  }
  scales[k]! += normalise(planes, to);
  return matchedLoss;
}

/** Beyond this a voltage or current is brought back to about 1, and the scale remembers by how much. */
const largest = 1e100;

function normalise(planes: Float64Array, at: number): number {
  const size = Math.max(
    Math.abs(planes[at]!),
    Math.abs(planes[at + 1]!),
    Math.abs(planes[at + 4]!),
    Math.abs(planes[at + 5]!),
  );
  if (size <= largest && size >= 1 / largest) return 0;
  for (let n = at; n < at + PLANE; n++) planes[n]! /= size;
  return Math.log(size);
}

/**
 * Power through a plane toward the load.
 * @param behind - power leaving the next element, in the same unit: a passive run never takes less, which keeps
 * rounding from making it so
 * @param reference - ohm, to tell power from the rounding of a wave reflected whole
 */
export function powerThrough(
  vRe: number,
  vIm: number,
  iRe: number,
  iIm: number,
  behind: number,
  reference: number,
): number {
  const power = vRe * iRe + vIm * iIm;
  if (behind > 0) return Math.max(power, behind);
  const waves = (vRe * vRe + vIm * vIm) / reference + (iRe * iRe + iIm * iIm) * reference;
  return power > 1e-14 * waves ? power : 0;
}
