/** Which frequencies a run is shown over, and how many. Pure. */
import { nominalFigures } from "@/lib/line/cable";
import type { Circuit, Line } from "@/lib/line/element";

interface Band {
  designHz: number;
  bandHz: readonly [number, number] | null;
}

/** Band wider than this times its lower end: what lies beside it would drown it. */
const wideBand = 2;

/**
 * Frequencies shown: a narrow band and as much again on both sides, a wide one with a twentieth on both sides; the band's
 * ends are among the points.
 */
export function shownFrequencies({ designHz, bandHz }: Band, points = 1001): Float64Array {
  const [from, to] = bandHz && bandHz[1] > bandHz[0] ? bandHz : [designHz * 0.98, designHz * 1.02];
  const inside = Math.floor((points - 1) / (to > wideBand * from ? 1.1 : 3));
  const step = (to - from) / inside;
  const before = Math.min(Math.floor((points - 1 - inside) / 2), Math.ceil(from / step) - 1);
  return Float64Array.from({ length: points }, (_, i) => from + (i - before) * step);
}

const fewestPoints = 1001;
const mostPoints = 4001;

/** Time through everything that is laid, stubs too, second. */
function delayOf(circuit: Circuit): number {
  const delay = (line: Line, lengthM: number) => lengthM * nominalFigures(line.model).delay;
  return circuit.elements.reduce((sum, element) => {
    if (element.kind === "cable" || element.kind === "stub") return sum + delay(element.line, element.lengthM);
    if (element.kind !== "parallel") return sum;
    return sum + Math.max(0, ...element.branches.map((branch) => delay(branch.line, branch.lengthM)));
  }, 0);
}

/** Points enough to follow the ripple of the run, eight to a ripple, within bounds: 1/(2·delay) is its period. */
export function pointsFor(circuit: Circuit, { bandHz }: Band): number {
  const ripples = bandHz ? (bandHz[1] - bandHz[0]) * 2 * delayOf(circuit) : 0;
  return Math.min(mostPoints, Math.max(fewestPoints, Math.ceil(ripples * 8)));
}

/** The points of one band, its ends among them: for finding the worst inside it. */
export function bandFrequencies(circuit: Circuit, [from, to]: readonly [number, number]): Float64Array {
  if (from === to) return Float64Array.of(from);
  const ripples = (to - from) * 2 * delayOf(circuit);
  const count = Math.min(mostPoints, Math.max(101, Math.ceil(ripples * 8)));
  return Float64Array.from({ length: count }, (_, i) => from + ((to - from) * i) / (count - 1));
}
