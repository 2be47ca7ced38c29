/** Voltage and current at every plane of a run at one complex frequency: the load is set, the rest follows toward the source. */
import { product, quotient, sum, times, type Analytic } from "@/lib/line/analytic";
import type { Complex } from "@/lib/line/complex";
import type { Circuit, Termination } from "@/lib/line/element";
import { prepareElements } from "@/lib/line/element-two-port";
import { terminationPort, type Port } from "@/lib/line/termination";
import { throughTwoPort, type TwoPort, type TwoPortAt } from "@/lib/line/two-port";

export interface PreparedRun {
  source: Termination;
  elements: TwoPortAt[];
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
  return { source, elements: prepareElements(circuit, temperatureC), load, referenceOhm };
}

/** One frequency of a run. Plane k is before element k, plane N (N elements) is the load. */
export interface Walk {
  /** length N + 1; at plane k in a unit e^{scale[k] + … + scale[N−1]} times smaller than the load's */
  planes: Port[];
  /** length N, neper at least 0; Infinity where an element lets nothing through */
  scales: number[];
  /** Σ nominal loss of cables, pads and joints, neper */
  matchedLoss: number;
  /** the source's impedance as a pair, v : i */
  source: Port;
  /** what the source's e.m.f. times source.i must be for the planes to be as they are, before scales */
  drive: Analytic;
}

/** Beyond this a voltage or current is brought back to about 1, and the scale remembers by how much. */
const largest = 1e100;

/**
 * Walks a run from load to source at s.
 * @throws RangeError where the load or an end is sampled and s lies outside it
 */
export function walk(run: PreparedRun, s: Complex): Walk {
  const count = run.elements.length;
  const planes = new Array<Port>(count + 1);
  const scales = new Array<number>(count);
  let port = terminationPort(run.load, s);
  let matchedLoss = 0;
  planes[count] = port;
  for (let k = count - 1; k >= 0; k--) {
    const twoPort: TwoPort = run.elements[k]!(s);
    port = throughTwoPort(twoPort, port);
    const size = Math.max(Math.abs(port.v.re), Math.abs(port.v.im), Math.abs(port.i.re), Math.abs(port.i.im));
    scales[k] = twoPort.logScale;
    if (size > largest || size < 1 / largest) {
      port = { v: times(port.v, 1 / size), i: times(port.i, 1 / size) };
      scales[k]! += Math.log(size);
    }
    planes[k] = port;
    matchedLoss += twoPort.matchedLoss;
  }
  const source = terminationPort(run.source, s);
  return { planes, scales, matchedLoss, source, drive: sum(product(source.i, port.v), product(source.v, port.i)) };
}

/** Impedance of the source, ohm; infinite for one that passes no current. */
export function sourceImpedance({ source }: Walk): Complex {
  return source.i.re === 0 && source.i.im === 0 ? { re: Infinity, im: NaN } : quotient(source.v, source.i);
}

/**
 * Power through a plane toward the load, in the unit of that plane.
 * @param behind - power leaving the next element, in the same unit: a passive run never takes less, which keeps
 * rounding from making it so
 * @param reference - ohm, to tell power from the rounding of a wave reflected whole
 */
export function powerThrough({ v, i }: { v: Complex; i: Complex }, behind: number, reference: number): number {
  const power = v.re * i.re + v.im * i.im;
  if (behind > 0) return Math.max(power, behind);
  const waves = (v.re * v.re + v.im * v.im) / reference + (i.re * i.re + i.im * i.im) * reference;
  return power > 1e-14 * waves ? power : 0;
}
