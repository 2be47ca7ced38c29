/** Axes of the product's own drawings: thin rules, figures outside the frame. Scales come from d3-scale. */
import { scaleLinear, scaleLog } from "d3-scale";

export interface AxisScale {
  (value: number): number;
  ticks: (count?: number) => number[];
  domain: () => number[];
}

/**
 * A scale whose ends are what they are told to be. A log scale takes only positive ends. Places are rounded to
 * hundredths of a px, so that the server and the browser, whose logarithms differ in the last digit, draw the same.
 */
export function axisScale(
  kind: "linear" | "log",
  domain: readonly [number, number],
  range: readonly [number, number],
): AxisScale {
  const scale = kind === "log" ? scaleLog([...domain], [...range]) : scaleLinear([...domain], [...range]);
  const place = (value: number) => Math.round(scale(value) * 100) / 100;
  return Object.assign(place, { ticks: (count?: number) => scale.ticks(count), domain: () => scale.domain() });
}

/** From 0 to a round figure at or above the greatest of the values that are there. */
export function roundedFromZero(values: readonly (number | null)[], ticks = 5): [number, number] {
  const greatest = values.reduce<number>(
    (most, value) => (value !== null && Number.isFinite(value) ? Math.max(most, value) : most),
    0,
  );
  if (!(greatest > 0)) return [0, 1];
  const [low = 0, high = greatest] = scaleLinear([0, greatest], [0, 1]).nice(ticks).domain();
  return [low, high];
}

/** The ends of a log axis that holds values above 0: the nearest 1, 2 or 5 times a power of ten below and above them. */
export function decadesAround(values: readonly (number | null)[]): [number, number] {
  const there = values.flatMap((value) => (value !== null && value > 0 && Number.isFinite(value) ? [value] : []));
  if (there.length === 0) return [0.1, 10];
  const [least, most] = [Math.min(...there), Math.max(...there)];
  const steps = (value: number) => [1, 2, 5, 10].map((step) => step * 10 ** Math.floor(Math.log10(value) + 1e-9));
  const low = steps(least).findLast((step) => step <= least * 1.0001) ?? least;
  const high = steps(most).find((step) => step >= most * 0.9999) ?? most;
  return [low, high > low ? high : low * 10];
}

/** Decades of a log axis, and the steps 2 and 5 where there are few of them. */
export function logTicks([low, high]: readonly [number, number]): number[] {
  const first = Math.floor(Math.log10(low) + 1e-9);
  const last = Math.ceil(Math.log10(high) - 1e-9);
  const steps = last - first <= 2 ? [1, 2, 5] : [1];
  const ticks: number[] = [];
  for (let decade = first; decade <= last; decade++) steps.forEach((step) => ticks.push(step * 10 ** decade));
  return ticks.filter((tick) => tick >= low * 0.9999 && tick <= high * 1.0001);
}

interface AxisProps {
  scale: AxisScale;
  ticks: readonly number[];
  format: (value: number) => string;
}

/** Grid lines from `fromX` to `toX` with figures to their left. */
export function AxisY({ scale, ticks, format, fromX, toX }: AxisProps & { fromX: number; toX: number }) {
  return ticks.map((tick) => {
    const y = scale(tick).toFixed(1);
    return (
      <g key={tick}>
        <path d={`M${fromX} ${y}H${toX}`} stroke="var(--line)" />
        <text x={fromX - 7} y={y} dy="0.36em" textAnchor="end" className="figures">
          {format(tick)}
        </text>
      </g>
    );
  });
}

/** Grid lines from `fromY` down to `toY` with figures below. */
export function AxisX({ scale, ticks, format, fromY, toY }: AxisProps & { fromY: number; toY: number }) {
  return ticks.map((tick) => {
    const x = scale(tick).toFixed(1);
    return (
      <g key={tick}>
        <path d={`M${x} ${fromY}V${toY}`} stroke="var(--line)" />
        <text x={x} y={toY + 14} textAnchor="middle" className="figures">
          {format(tick)}
        </text>
      </g>
    );
  });
}
