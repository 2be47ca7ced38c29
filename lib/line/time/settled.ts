import { divide, scale, type Complex } from "@/lib/line/complex";
import type { Circuit } from "@/lib/line/element";
import { portAt, prepareRun, walk, type Walk } from "@/lib/line/walk";

/** rad/s; low enough that whatever takes less than an hour to settle has settled */
const nearlyDc = 1e-9;
/** Two decades further down a level that is one has not moved by this part; one that vanishes is a tenth or less. */
const vanishing = 0.5;

/**
 * Where the voltages along a run come to rest, per volt of e.m.f. that stays: the limit of s·V(s) as s → 0 for a unit
 * step. A skin-effect tail reaches it long after any window; a lossless resonator swings about it for ever.
 * @param planes - 0 the source, n before element n, the number of elements the load
 * @param temperatureC - °C, for elements without one of their own
 * @returns one value a plane
 * @throws RangeError when an element is impossible
 */
export function settledLevels(circuit: Circuit, planes: readonly number[], temperatureC = 20): number[] {
  const run = prepareRun(circuit, temperatureC);
  const still = walk(run, { re: 0, im: 0 });
  if (isPlain(still)) return planes.map((plane) => levelAt(still, plane));
  // behind a capacitor in the line, or beside a coil across it, the level is a ratio of two that vanish
  const slow = walk(run, { re: nearlyDc, im: 0 });
  const slower = walk(run, { re: nearlyDc / 100, im: 0 });
  return planes.map((plane) => limitOf(levelAt(slow, plane), levelAt(slower, plane)));
}

function isPlain({ scales, drive }: Walk): boolean {
  return scales.every(Number.isFinite) && Number.isFinite(drive.re) && drive.re !== 0;
}

/** What is left over of a level that goes on falling toward dc is none: nothing may be read against it. */
function limitOf(slow: number, slower: number): number {
  return Math.abs(slower) < vanishing * Math.abs(slow) ? 0 : slow;
}

function levelAt(at: Walk, plane: number): number {
  let away = 0;
  for (let k = 0; k < plane; k++) away += at.scales[k]!;
  const { v } = portAt(at, plane);
  const { i } = at.source;
  const driven: Complex = { re: v.re * i.re - v.im * i.im, im: v.re * i.im + v.im * i.re };
  return scale(divide(driven, at.drive), Math.exp(-away)).re;
}
