/** Reading a signal between its values. */
import type { Signal } from "@/lib/line/time/time-response";

/** The value at a time, by the cubic through the four values about it; the first or last value outside. */
export function valueAt({ stepS, values }: Signal, timeS: number): number {
  const place = timeS / stepS;
  const last = values.length - 1;
  if (!(place > 0)) return values[0]!;
  if (place >= last) return values[last]!;
  const from = Math.floor(place);
  return cubic(values, from, place - from);
}

/** Between values `from` and `from + 1`, at a part 0 to 1 of the way. */
function cubic(values: Float64Array, from: number, part: number): number {
  const last = values.length - 1;
  const before = values[Math.max(0, from - 1)]!;
  const near = values[from]!;
  const far = values[Math.min(last, from + 1)]!;
  const after = values[Math.min(last, from + 2)]!;
  const inside = part * (1 - part);
  return (
    near * (1 - part) +
    far * part -
    (inside / 6) * ((far - 2 * near + before) * (2 - part) + (after - 2 * far + near) * (1 + part))
  );
}

/**
 * The first time from a start on at which a signal passes a level upward or downward, to a small part of a step.
 * @param upward - whether the signal comes from below
 * @returns second, NaN where it never does
 */
export function crossing(signal: Signal, level: number, upward: boolean, fromS = 0): number {
  const { stepS, values } = signal;
  const beyond = (value: number) => (upward ? value >= level : value <= level);
  const first = Math.max(0, Math.floor(fromS / stepS));
  if (beyond(values[first]!)) return Math.max(fromS, first * stepS);
  for (let n = first + 1; n < values.length; n++) {
    if (!beyond(values[n]!)) continue;
    let [low, high] = [0, 1];
    for (let halving = 0; halving < 40; halving++) {
      const middle = (low + high) / 2;
      if (beyond(cubic(values, n - 1, middle))) high = middle;
      else low = middle;
    }
    return (n - 1 + high) * stepS;
  }
  return NaN;
}
