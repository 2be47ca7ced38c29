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

/** Widths in px of the pieces that take room along the line; others get 0. */
function widths(extents: readonly Extent[], fullPx: number): { px: number; isBroken: boolean }[] {
  const laid = extents.filter((extent) => extent.lengthM !== undefined);
  const unknowns = laid.filter((extent) => extent.lengthM === null).length;
  const symbols = extents.filter((extent) => extent.lengthM === undefined && takesRoom(extent));
  const wanted = symbols.reduce((sum, extent) => sum + extent.symbolPx, 0);
  // Parts never take more than half of the line.
  const shrink = Math.min(1, (0.5 * fullPx) / Math.max(1, wanted));
  const roomPx = fullPx - wanted * shrink;
  const unknown = unknowns === 0 ? 0 : Math.min(unknownPx, (0.5 * roomPx) / unknowns);
  const least = Math.min(leastPx, (0.7 * roomPx) / Math.max(1, laid.length));
  const isShort = new Set<Extent>();
  const known = laid.filter((extent) => extent.lengthM !== null);
  let pxPerM = 0;
  for (let changed = true; changed;) {
    const free = known.filter((extent) => !isShort.has(extent));
    const metres = free.reduce((sum, extent) => sum + (extent.lengthM ?? 0), 0);
    pxPerM = metres > 0 ? (roomPx - unknowns * unknown - isShort.size * least) / metres : 0;
    const shorter = free.filter((extent) => (extent.lengthM ?? 0) * pxPerM < least);
    shorter.forEach((extent) => isShort.add(extent));
    changed = shorter.length > 0;
  }
  // Where every piece is short of the least width they share the room there is.
  const share =
    isShort.size === known.length && isShort.size > 0 ? (roomPx - unknowns * unknown) / isShort.size : least;
  return extents.map((extent) => {
    if (extent.lengthM === undefined) return { px: takesRoom(extent) ? extent.symbolPx * shrink : 0, isBroken: false };
    if (extent.lengthM === null) return { px: unknown, isBroken: false };
    if (isShort.has(extent)) return { px: share, isBroken: extent.lengthM * pxPerM < 0.95 * share };
    return { px: extent.lengthM * pxPerM, isBroken: false };
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
