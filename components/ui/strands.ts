/**
 * Two strands laid round each other, as paths. The rising strand is always in front.
 * Used by the mark, by twisted pairs on the strip, by the strands laid while work is under way and by the front door.
 */

export interface Strands {
  first: string;
  second: string;
  /** rising stretches of each strand, to be drawn again on top of the other */
  firstRising: string;
  secondRising: string;
  /** the gap to cut in the strand behind first: a little shorter, so that no seam shows */
  firstGap: string;
  secondGap: string;
}

interface Lay {
  fromX: number;
  toX: number;
  middleY: number;
  amplitude: number;
  /** distance between two crossings, px */
  pitch: number;
  /** where the first strand is at its top, px */
  topAtX?: number;
}

/** The stretch each side of a crossing that is drawn in front, and the gap cut for it, as shares of the pitch. */
const frontShare = 0.4;
const gapShare = 0.32;

/** Strand number `side` (+1 first, −1 second) as a smooth path. Four cubics a pitch: within 0.1 % of the amplitude. */
function trace({ middleY, amplitude, pitch, topAtX = 0 }: Lay, side: 1 | -1, fromX: number, toX: number): string {
  const turn = Math.PI / pitch;
  const height = (x: number) => middleY - side * amplitude * Math.cos(turn * (x - topAtX));
  const slope = (x: number) => side * amplitude * turn * Math.sin(turn * (x - topAtX));
  const count = Math.max(1, Math.ceil((4 * (toX - fromX)) / pitch));
  const h = (toX - fromX) / count;
  let path = `M${fromX.toFixed(2)} ${height(fromX).toFixed(2)}`;
  for (let i = 0; i < count; i++) {
    const [a, b] = [fromX + i * h, fromX + (i + 1) * h];
    const points = [a + h / 3, height(a) + (slope(a) * h) / 3, b - h / 3, height(b) - (slope(b) * h) / 3, b, height(b)];
    path += `C${points.map((p) => p.toFixed(2)).join(" ")}`;
  }
  return path;
}

/** Stretches of both strands about the crossings where they rise. */
function risings(lay: Required<Lay>, share: number): { first: string; second: string } {
  const { fromX, toX, pitch, topAtX } = lay;
  let [first, second] = ["", ""];
  for (let k = Math.ceil((fromX - topAtX) / pitch - 0.5); topAtX + (k + 0.5) * pitch <= toX; k++) {
    const x = topAtX + (k + 0.5) * pitch;
    const [from, to] = [Math.max(fromX, x - share * pitch), Math.min(toX, x + share * pitch)];
    // From its top the first strand falls through even crossings and rises through odd ones.
    if (k % 2 === 0) second += trace(lay, -1, from, to);
    else first += trace(lay, 1, from, to);
  }
  return { first, second };
}

/** Paths of two strands between two places; y grows downwards. */
export function strands(given: Lay): Strands {
  const lay = { ...given, topAtX: given.topAtX ?? given.fromX };
  const [rising, gap] = [risings(lay, frontShare), risings(lay, gapShare)];
  return {
    first: trace(lay, 1, lay.fromX, lay.toX),
    second: trace(lay, -1, lay.fromX, lay.toX),
    firstRising: rising.first,
    secondRising: rising.second,
    firstGap: gap.first,
    secondGap: gap.second,
  };
}
