/** Curves as plots take them: plain arrays, null where there is no finite number, thinned where a screen shows no more. Pure. */

export function plotted(values: ArrayLike<number>): (number | null)[] {
  return Array.from(values, (value) => (Number.isFinite(value) ? value : null));
}

/** Range of an axis over what is shown of a return loss: whole steps, the best part cut where nobody needs it. */
export function returnLossDomain(
  curves: readonly (readonly (number | null)[])[],
  limitDb: number | null,
): [number, number] {
  const values = curves.flat().filter((value) => value !== null);
  const low = Math.min(...values, limitDb ?? Infinity);
  const high = Math.max(...values, limitDb ?? -Infinity);
  if (!Number.isFinite(low)) return [0, 30];
  const bottom = Math.max(0, Math.floor((low - 2) / 2) * 2);
  const top = Math.min(Math.ceil((high + 2) / 2) * 2, Math.max(bottom + 30, Math.ceil(((limitDb ?? 0) + 16) / 2) * 2));
  return [bottom, Math.max(top, bottom + 6)];
}

/** Every n-th of a list, its last included, so that a table has about `most` rows. */
export function thinned<T>(list: readonly T[], most: number): T[] {
  const every = Math.max(1, Math.ceil(list.length / most));
  return list.filter((_, i) => i % every === 0 || i === list.length - 1);
}
