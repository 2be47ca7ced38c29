/**
 * The one x-axis of a run: metres from the source to px, shared by the strip, its ruler and everything drawn under it.
 * Straight proportion, except where a piece would be narrower than it can be seen: that piece is widened, carries a
 * break mark, and every registered drawing stretches with it.
 */

export interface Extent {
  /** metres along the path; null where the length is not known; left out for what stands at a place */
  lengthM?: number | null;
  /** px that the symbol of a piece without length takes */
  symbolPx: number;
}

/** A symbol this wide takes room of its own on the axis, with no metres in it; a narrower one stands over its neighbours. */
const widestOverlayPx = 24;

function takesRoom(extent: Extent): boolean {
  return extent.lengthM !== undefined || extent.symbolPx > widestOverlayPx;
}

export interface Place {
  fromX: number;
  toX: number;
  /** drawn wider than to scale */
  isBroken: boolean;
}

export interface LineScale {
  startX: number;
  endX: number;
  totalM: number;
  /** one per piece, in order */
  places: Place[];
  /** px of the ends of every piece that takes room, ascending, without repeats */
  boundariesX: number[];
  /** where a distance is; behind a part that stands there */
  x: (distanceM: number) => number;
  /** where a distance is; before a part that stands there */
  xBefore: (distanceM: number) => number;
  m: (x: number) => number;
}

/** A piece narrower than this is widened to it, px. */
const leastPx = 20;
/** Room for a piece whose length is not known, px. */
const unknownPx = 110;
const symbolGapPx = 3;

/** Px of parts that take room of their own: their symbols, never more than half of the line together. */
function symbolShare(extents: readonly Extent[], fullPx: number): number {
  const wanted = extents.reduce((sum, e) => sum + (e.lengthM === undefined && takesRoom(e) ? e.symbolPx : 0), 0);
  return Math.min(1, (0.5 * fullPx) / Math.max(1, wanted));
}

/**
 * Which of some lengths are too short to be seen at the scale that the others leave, and that scale.
 * Widening one takes room from the others, so it is asked again until nothing changes.
 */
function shortOnes(lengths: readonly number[], roomPx: number, least: number) {
  const isShort = lengths.map(() => false);
  for (;;) {
    const shorts = isShort.filter(Boolean).length;
    const metres = lengths.reduce((sum, length, i) => sum + (isShort[i] ? 0 : length), 0);
    // A share of the metres first: the px of a metre alone would be infinite on a line of next to nothing.
    const toScale = (length: number) => (metres > 0 ? (length / metres) * (roomPx - shorts * least) : 0);
    const more = lengths.flatMap((length, i) => (!isShort[i] && toScale(length) < least ? [i] : []));
    if (more.length === 0) return { isShort, toScale, shortPx: shorts === lengths.length ? roomPx / shorts : least };
    more.forEach((i) => (isShort[i] = true));
  }
}

/** Widths in px of the pieces that take room along the line; others get 0. */
function widths(extents: readonly Extent[], fullPx: number): { px: number; isBroken: boolean }[] {
  const shrink = symbolShare(extents, fullPx);
  const symbolPx = (e: Extent) => (e.lengthM === undefined && takesRoom(e) ? e.symbolPx * shrink : 0);
  const roomPx = fullPx - extents.reduce((sum, e) => sum + symbolPx(e), 0);
  const lengths = extents.flatMap((e) => (typeof e.lengthM === "number" ? [e.lengthM] : []));
  const unknowns = extents.filter((e) => e.lengthM === null).length;
  const share = (lengths.length > 0 ? 0.5 : 1) * (roomPx / Math.max(1, unknowns));
  const unknown = lengths.length > 0 ? Math.min(unknownPx, share) : share;
  const least = Math.min(leastPx, (0.7 * roomPx) / Math.max(1, lengths.length + unknowns));
  const { isShort, toScale, shortPx } = shortOnes(lengths, roomPx - unknowns * unknown, least);
  let k = -1;
  return extents.map((extent) => {
    if (extent.lengthM === undefined) return { px: symbolPx(extent), isBroken: false };
    if (extent.lengthM === null) return { px: unknown, isBroken: false };
    k++;
    const px = toScale(extent.lengthM);
    return isShort[k] ? { px: shortPx, isBroken: px < 0.95 * shortPx } : { px, isBroken: false };
  });
}

function isOverlay(extent: Extent | undefined): boolean {
  return extent !== undefined && !takesRoom(extent);
}

/** Stands neighbours without room of their own side by side about the place they share, inside the line's ends. */
function placeSymbols(extents: readonly Extent[], places: Place[], startX: number, endX: number): void {
  let first = 0;
  while (first < extents.length) {
    if (!isOverlay(extents[first])) {
      first++;
      continue;
    }
    let last = first;
    while (isOverlay(extents[last + 1])) last++;
    const group = extents.slice(first, last + 1);
    const total = group.reduce((sum, extent) => sum + extent.symbolPx, 0) + symbolGapPx * (group.length - 1);
    const middle = places[first]?.fromX ?? startX;
    let x = Math.max(startX, Math.min(endX - total, middle - total / 2));
    group.forEach((extent, i) => {
      places[first + i] = { fromX: x, toX: x + extent.symbolPx, isBroken: false };
      x += extent.symbolPx + symbolGapPx;
    });
    first = last + 1;
  }
}

/** Piecewise linear; where `from` stands still, `value` there means the end of the stand, or its beginning for `isBefore`. */
function interpolate(from: readonly number[], to: readonly number[], value: number, isBefore = false): number {
  const last = from.length - 1;
  let i = from.findIndex((edge) => (isBefore ? value <= edge : value < edge)) - 1;
  if (i < -1) i = last - 1;
  i = Math.max(0, Math.min(last - 1, i));
  const [a = 0, b = 0, c = 0, d = 0] = [from[i], from[i + 1], to[i], to[i + 1]];
  return b === a ? c : c + ((d - c) * (value - a)) / (b - a);
}

/**
 * The scale of a run between two places of the screen.
 * @param extents - the pieces from source to load
 */
export function lineScale(extents: readonly Extent[], startX: number, endX: number): LineScale {
  const taken = widths(extents, endX - startX);
  const [knotsM, knotsX] = [[0], [startX]];
  const places: Place[] = [];
  let [m, x] = [0, startX];
  extents.forEach((extent, i) => {
    const { px, isBroken } = taken[i] ?? { px: 0, isBroken: false };
    places.push({ fromX: x, toX: x + px, isBroken });
    m += extent.lengthM ?? 0;
    x += px;
    if (px > 0) {
      knotsM.push(m);
      knotsX.push(x);
    }
  });
  placeSymbols(extents, places, startX, endX);
  return {
    startX,
    endX,
    totalM: m,
    places,
    boundariesX: [...new Set(knotsX)],
    x: (distanceM) => (knotsM.length < 2 ? startX : interpolate(knotsM, knotsX, distanceM)),
    xBefore: (distanceM) => (knotsM.length < 2 ? startX : interpolate(knotsM, knotsX, distanceM, true)),
    m: (at) => (knotsX.length < 2 ? 0 : interpolate(knotsX, knotsM, Math.max(startX, Math.min(endX, at)))),
  };
}
