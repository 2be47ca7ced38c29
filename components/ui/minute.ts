/** A time as a person reads it, to the minute: 2026-03-01 12:00 UTC. */
export const minuteOf = (at: string): string => `${at.slice(0, 10)} ${at.slice(11, 16)} UTC`;
