/** When a letter that could not be handed over is tried again. Pure. */

const minute = 60_000;
const hour = 60 * minute;

/**
 * Pauses after the first, second, … failed try. Close together at first, then hours apart, given up after more than four
 * days: RFC 5321 section 4.5.4.1.
 */
export const pausesMs: readonly number[] = [
  ...[minute, 5 * minute, 30 * minute],
  ...[2 * hour, 6 * hour, 12 * hour, 24 * hour, 24 * hour, 36 * hour],
];

export const mostTries = pausesMs.length + 1;

/**
 * @param tries - how often it has been tried, at least 1
 * @param nowMs - milliseconds since 1970
 * @returns when it is tried again, ISO 8601; null when it has been tried often enough
 */
export function nextTry(tries: number, nowMs: number): string | null {
  const pause = pausesMs[tries - 1];
  return pause === undefined ? null : new Date(nowMs + pause).toISOString();
}
