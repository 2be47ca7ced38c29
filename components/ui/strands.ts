/**
 * Two strands laid round each other, as paths. The rising strand is always in front.
 * Used by the mark, by the strands laid while work is under way and by the picture on the front door.
 */

export interface Strands {
  first: string;
  second: string;
  /** rising stretches of each strand, to be drawn again on top */
  firstRising: string[];
  secondRising: string[];
}

interface Lay {
  fromX: number;
  toX: number;
  middleY: number;
  amplitude: number;
  /** distance between two crossings, px */
  pitch: number;
  /** where along the pitch the first strand is at its top, px */
  topAtX?: number;
  step?: number;
}

function trace(height: (x: number) => number, fromX: number, toX: number, step: number): string {
  const count = Math.max(1, Math.ceil((toX - fromX) / step));
  const points = Array.from({ length: count + 1 }, (_, i) => fromX + ((toX - fromX) * i) / count);
  return points.map((x, i) => `${i === 0 ? "M" : "L"}${x.toFixed(2)} ${height(x).toFixed(2)}`).join("");
}

/** The stretch each side of a crossing that is drawn in front, as a share of the pitch. */
const frontShare = 0.32;

/** Paths of two strands between two places; y grows downwards. */
export function strands({ fromX, toX, middleY, amplitude, pitch, topAtX = fromX, step = 0.75 }: Lay): Strands {
  const first = (x: number) => middleY - amplitude * Math.cos((Math.PI * (x - topAtX)) / pitch);
  const second = (x: number) => 2 * middleY - first(x);
  const rising: { first: string[]; second: string[] } = { first: [], second: [] };
  const firstCrossing = Math.ceil((fromX - topAtX) / pitch - 0.5);
  for (let k = firstCrossing; topAtX + (k + 0.5) * pitch <= toX; k++) {
    const x = topAtX + (k + 0.5) * pitch;
    const from = Math.max(fromX, x - frontShare * pitch);
    const to = Math.min(toX, x + frontShare * pitch);
    // The first strand falls at even crossings and rises at odd ones.
    const isFirst = Math.abs(k % 2) === 1;
    (isFirst ? rising.first : rising.second).push(trace(isFirst ? first : second, from, to, step));
  }
  return {
    first: trace(first, fromX, toX, step),
    second: trace(second, fromX, toX, step),
    firstRising: rising.first,
    secondRising: rising.second,
  };
}
