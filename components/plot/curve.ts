/** Polylines from arrays; a value that could not be computed leaves a gap. */

export type Values = readonly (number | null)[];

/** Path through points; starts anew after a gap. */
export function polyline(points: readonly ({ x: number; y: number } | null)[]): string {
  let path = "";
  let isDrawing = false;
  for (const point of points) {
    if (!point || !Number.isFinite(point.x) || !Number.isFinite(point.y)) {
      isDrawing = false;
      continue;
    }
    path += `${isDrawing ? "L" : "M"}${point.x.toFixed(1)} ${point.y.toFixed(1)}`;
    isDrawing = true;
  }
  return path;
}

/** Index of the greatest value, or −1 when there is none. */
export function greatestIndex(values: Values): number {
  let best = -1;
  values.forEach((value, i) => {
    if (value !== null && Number.isFinite(value) && (best < 0 || value > (values[best] ?? -Infinity))) best = i;
  });
  return best;
}

/** Index of the place nearest to `at` in an ascending list. */
export function nearestIndex(places: readonly number[], at: number): number {
  if (places.length === 0) return -1;
  let [low, high] = [0, places.length - 1];
  while (high - low > 1) {
    const middle = (low + high) >> 1;
    if ((places[middle] ?? 0) <= at) low = middle;
    else high = middle;
  }
  return Math.abs((places[high] ?? 0) - at) < Math.abs(at - (places[low] ?? 0)) ? high : low;
}
