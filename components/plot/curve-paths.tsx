import { polyline, type Values } from "@/components/plot/curve";
import { seriesColour, seriesDash, type SweepSeries } from "@/components/plot/series";

/** Where data reach; null: nowhere; undefined: everywhere. */
export type Reach = readonly [number, number] | null | undefined;

export interface CurveSeries extends SweepSeries {
  /** where the data of this one reach */
  data?: Reach;
}

interface CurvePathsProps {
  /** ascending */
  xs: readonly number[];
  series: readonly CurveSeries[];
  x: (value: number) => number;
  y: (value: number) => number;
}

/** Which stretch of a curve is drawn. */
type Part = "within" | "beyond";

/** Dots that no series has for a dash. */
const dotted = "0.1 4";

/**
 * Path of the part of a curve that lies within the data, or beyond. Both take the place at the edge, so that they meet.
 * @param y - px of a value; a logarithmic axis has no place for one that is not above 0
 */
export function partOf(
  part: Part,
  { xs, x, y }: Omit<CurvePathsProps, "series">,
  { values, data }: { values: Values; data?: Reach },
): string {
  const isWithin = (at: number) => data === undefined || (data !== null && at >= data[0] && at <= data[1]);
  const isDrawn = (i: number): boolean => {
    const at = xs[i];
    if (at === undefined) return false;
    if (part === "within") return isWithin(at);
    const neighbours = [xs[i - 1], xs[i + 1]].filter((other) => other !== undefined);
    return !isWithin(at) || neighbours.some((other) => !isWithin(other));
  };
  return polyline(
    values.map((value, i) => {
      const at = xs[i];
      if (value === null || value === undefined || at === undefined || !isDrawn(i)) return null;
      return { x: x(at), y: y(value) };
    }),
  );
}

/** The curves of a plot; beyond the data they are dotted. */
export function CurvePaths({ series, ...at }: CurvePathsProps) {
  return (
    <g fill="none" strokeLinejoin="round">
      {series.map(({ id, look, values, data }) => {
        const stroke = seriesColour[look];
        return (
          <g key={id} stroke={stroke}>
            <path
              d={partOf("within", at, { values, data })}
              strokeWidth={look === 5 ? 1.25 : 1.75}
              strokeDasharray={seriesDash[look]}
            />
            <path
              d={data === undefined ? "" : partOf("beyond", at, { values, data })}
              strokeWidth="1.75"
              strokeDasharray={dotted}
              strokeLinecap="round"
            />
          </g>
        );
      })}
    </g>
  );
}
