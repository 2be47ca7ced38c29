/** The range two handles keep on the axis of a histogram. */

export interface Bin {
  from: number;
  to: number;
  count: number;
}

/** An absent end does not bind. */
export interface HistogramRange {
  from?: number;
  to?: number;
}

export type HandleEnd = "from" | "to";

/** Places of a handle between two edges of bins. */
const stepsPerBin = 4;

/** Twelve digits, so that a place is 0.705 and not 0.7050000000000001. */
const tidy = (value: number) => Number(value.toPrecision(12));

/** Lowest and highest value of the axis. */
export function axisEnds(bins: readonly Bin[]): [number, number] {
  return [bins[0]?.from ?? 0, bins.at(-1)?.to ?? 1];
}

/** How many steps a handle takes from one end of the axis to the other. */
export function stepCount(bins: readonly Bin[]): number {
  return Math.max(1, bins.length * stepsPerBin);
}

/** The value at a step. Counted from the right: the first bin alone may be cut short, at 0. */
export function valueAtStep(bins: readonly Bin[], step: number): number {
  const [low, high] = axisEnds(bins);
  const last = bins.at(-1);
  const width = last ? (last.to - last.from) / stepsPerBin : high - low;
  return Math.max(low, tidy(high - (stepCount(bins) - step) * width));
}

/** The step nearest to a value. */
export function stepNearest(bins: readonly Bin[], value: number): number {
  const last = bins.at(-1);
  if (!last) return 0;
  const step = stepCount(bins) - Math.round((stepsPerBin * (last.to - value)) / (last.to - last.from));
  return Math.max(0, Math.min(stepCount(bins), step));
}

/** The ends of a range as places on the axis; what lies outside is put on its ends. */
export function handlePlaces(bins: readonly Bin[], { from, to }: HistogramRange): [number, number] {
  const [low, high] = axisEnds(bins);
  const within = (value: number) => Math.max(low, Math.min(high, value));
  return [within(from ?? low), within(to ?? high)];
}

/** The range that a handle makes when it is put somewhere: it never passes the other, and at the end it does not bind. */
export function movedTo(bins: readonly Bin[], range: HistogramRange, end: HandleEnd, value: number): HistogramRange {
  const [low, high] = axisEnds(bins);
  const [from, to] = handlePlaces(bins, range);
  if (end === "from") {
    const next = Math.min(value, to);
    return { ...(next > low && { from: next }), ...(range.to !== undefined && { to: range.to }) };
  }
  const next = Math.max(value, from);
  return { ...(range.from !== undefined && { from: range.from }), ...(next < high && { to: next }) };
}
