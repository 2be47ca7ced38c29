import { abs, add, divide, multiply, scale, subtract, type Complex } from "@/lib/line/complex";
import { lengthAlongPath, type Element, type ParallelElement } from "@/lib/line/element";
import { lineWave, peakCurrent, peakVoltage, phasorsAt, type LineWave, type Peak, type Phasors } from "@/lib/line/line-wave";
import { lineSection } from "@/lib/line/section";
import { atTemperature } from "@/lib/line/temperature";

/** One element between its two planes, as the standing wave sees it; distances in metre along the main path. */
export interface Stretch {
  /** metre; 0 for what has no length */
  length: number;
  /** rms magnitudes at a distance from the source end, 0 to length */
  at: (distance: number) => { voltage: number; current: number };
  peakVoltage: Peak;
  peakCurrent: Peak;
}

/**
 * What lies between two planes whose voltage and current are known.
 * @param s - on the imaginary axis, not 0
 * @param temperatureC - °C, where the element has none of its own
 */
export function stretchOf(element: Element, near: Phasors, far: Phasors, s: Complex, temperatureC: number): Stretch | null {
  if (lengthAlongPath(element) === 0) return null;
  if (element.kind === "cable") {
    const model = atTemperature(element.line.model, element.temperatureC ?? temperatureC).model;
    return alongLine(lineWave(model, element.lengthM, element.paralleled ?? 1, s, near, far));
  }
  if (element.kind === "parallel") return alongBundle(bundleWaves(element, near, far, s, temperatureC));
  return null;
}

function magnitudes({ v, i }: Phasors): { voltage: number; current: number } {
  return { voltage: abs(v), current: abs(i) };
}

function alongLine(wave: LineWave): Stretch {
  return {
    length: wave.length,
    at: (distance) => magnitudes(phasorsAt(wave, distance)),
    peakVoltage: peakVoltage(wave),
    peakCurrent: peakCurrent(wave),
  };
}

/** Each branch carries the current its own two-port asks for between the common voltages. */
function bundleWaves(element: ParallelElement, near: Phasors, far: Phasors, s: Complex, temperatureC: number): LineWave[] {
  return element.branches.map(({ line, lengthM }) => {
    const model = atTemperature(line.model, element.temperatureC ?? temperatureC).model;
    const { a, b, logScale } = lineSection(model, lengthM)(s);
    const through = Math.exp(-logScale);
    const entering = divide(subtract(multiply(a, near.v), scale(far.v, through)), b);
    const leaving = divide(subtract(scale(near.v, through), multiply(a, far.v)), b);
    return lineWave(model, lengthM, 1, s, { v: near.v, i: entering }, { v: far.v, i: leaving });
  });
}

/** Highest voltage and summed current at the same fraction of every branch's length; the path is the first's. */
function alongBundle(waves: LineWave[]): Stretch {
  const length = waves[0]!.length;
  const at = (distance: number) => {
    const places = waves.map((wave) => phasorsAt(wave, (distance / length) * wave.length));
    const current = places.map(({ i }) => i).reduce(add);
    return { voltage: Math.max(...places.map(({ v }) => abs(v))), current: abs(current) };
  };
  const highest = waves
    .map((wave) => ({ wave, peak: peakVoltage(wave) }))
    .reduce((best, next) => (next.peak.value > best.peak.value ? next : best));
  const halfWaves = waves.reduce((most, wave) => Math.max(most, (wave.gamma.im * wave.length) / Math.PI), 0);
  return {
    length,
    at,
    peakVoltage: { value: highest.peak.value, at: (highest.peak.at / highest.wave.length) * length },
    peakCurrent: largestOf((distance) => at(distance).current, length, halfWaves),
  };
}

/** Most places at which a bundle's current is looked at before refining. */
const mostSamples = 20_000;

/** Largest value over 0 to length: the highest of many samples, then golden section between its neighbours. */
function largestOf(value: (distance: number) => number, length: number, halfWaves: number): Peak {
  const count = Math.min(mostSamples, 64 + Math.ceil(32 * halfWaves));
  let best = 0;
  let highest = -Infinity;
  for (let n = 0; n <= count; n++) {
    const each = value((length * n) / count);
    if (each > highest) {
      highest = each;
      best = n;
    }
  }
  const golden = (Math.sqrt(5) - 1) / 2;
  let low = (length * Math.max(0, best - 1)) / count;
  let high = (length * Math.min(count, best + 1)) / count;
  for (let n = 0; n < 60; n++) {
    const left = high - golden * (high - low);
    const right = low + golden * (high - low);
    if (value(left) > value(right)) high = right;
    else low = left;
  }
  const at = (low + high) / 2;
  return value(at) > highest ? { value: value(at), at } : { value: highest, at: (length * best) / count };
}
