/** Curves as plots take them: plain arrays, null where there is no finite number, thinned where a screen shows no more. Pure. */

export function plotted(values: ArrayLike<number>): (number | null)[] {
  return Array.from(values, (value) => (Number.isFinite(value) ? value : null));
}

/**
 * Range of an axis over what is shown of a return loss: whole steps, from the worst up to where most of it lies and well
 * above the limit. What rises beyond, a near-perfect match, leaves the frame.
 */
export function returnLossDomain(
  curves: readonly (readonly (number | null)[])[],
  limitDb: number | null,
): [number, number] {
  const values = curves
    .flat()
    .filter((value) => value !== null)
    .sort((a, b) => a - b);
  const low = Math.min(values[0] ?? Infinity, limitDb ?? Infinity);
  if (!Number.isFinite(low)) return [0, 30];
  const high = Math.max(values.at(-1) ?? -Infinity, limitDb ?? -Infinity);
  const most = values[Math.floor(values.length * 0.9)] ?? low;
  const bottom = Math.max(0, Math.floor((low - 2) / 2) * 2);
  const wanted = Math.min(high + 2, Math.max(most + 2, (limitDb ?? low) + 6));
  return [bottom, Math.max(bottom + 6, Math.min(80, Math.ceil(wanted / 2) * 2))];
}

/** Every n-th of a list, its last included, so that a table has about `most` rows. */
export function thinned<T>(list: readonly T[], most: number): T[] {
  const every = Math.max(1, Math.ceil(list.length / most));
  return list.filter((_, i) => i % every === 0 || i === list.length - 1);
}
