import { goldenSection } from "@/lib/line/golden-section";
import { prepareLine } from "@/lib/line/cable";
import { abs, add, divide, multiply, scale, subtract, type Complex } from "@/lib/line/complex";
import { lengthAlongPath, type Element, type ParallelElement } from "@/lib/line/element";
import {
  lineWave,
  magnitudesAt,
  peakCurrent,
  peakVoltage,
  phasorsAt,
  type LineWave,
  type Peak,
  type Phasors,
} from "@/lib/line/line-wave";
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
export function stretchOf(
  element: Element,
  near: Phasors,
  far: Phasors,
  s: Complex,
  temperatureC: number,
): Stretch | null {
  if (lengthAlongPath(element) === 0) return null;
  if (element.kind === "cable") {
    const model = atTemperature(element.line.model, element.temperatureC ?? temperatureC).model;
    return alongLine(lineWave(model, element.lengthM, element.paralleled ?? 1, s, near, far));
  }
  if (element.kind === "parallel") return alongBundle(bundleWaves(element, near, far, s, temperatureC));
  return null;
}

function alongLine(wave: LineWave): Stretch {
  return {
    length: wave.length,
    at: (distance) => magnitudesAt(wave, distance),
    peakVoltage: peakVoltage(wave),
    peakCurrent: peakCurrent(wave),
  };
}

/** Each branch carries the current its own two-port asks for between the common voltages. */
function bundleWaves(
  element: ParallelElement,
  near: Phasors,
  far: Phasors,
  s: Complex,
  temperatureC: number,
): LineWave[] {
  return element.branches.map(({ line, lengthM }) => {
    const model = atTemperature(line.model, element.temperatureC ?? temperatureC).model;
    const { a, b, logScale } = lineSection(prepareLine(model), lengthM)(s);
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

/** Most places at which a bundle's current is looked at before refining; a longer bundle is looked at less densely. */
const mostSamples = 20_000;
/** With 32 places in each half wave a crest is at most 0.13 % above its highest place; all that may win are refined. */
const mayWin = 0.995;

/** Largest value over 0 to length: every crest of many samples that may be the highest, then golden section. */
function largestOf(value: (distance: number) => number, length: number, halfWaves: number): Peak {
  const count = Math.min(mostSamples, 64 + Math.ceil(32 * halfWaves));
  const samples = Float64Array.from({ length: count + 1 }, (_, n) => value((length * n) / count));
  const highest = samples.reduce((most, each) => Math.max(most, each), 0);
  let best: Peak = { value: -Infinity, at: 0 };
  samples.forEach((each, n) => {
    const isCrest = each >= (samples[n - 1] ?? -Infinity) && each >= (samples[n + 1] ?? -Infinity);
    if (!isCrest || each < mayWin * highest) return;
    if (each > best.value) best = { value: each, at: (length * n) / count };
    const crest = goldenSection(
      value,
      (length * Math.max(0, n - 1)) / count,
      (length * Math.min(count, n + 1)) / count,
      50,
    );
    if (crest.value > best.value) best = crest;
  });
  return best;
}
