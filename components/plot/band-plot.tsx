"use client";

import { AxisX, AxisY, axisScale, type AxisScale } from "@/components/plot/axes";
import { useMeasuredWidth } from "@/components/plot/measured-width";
import { usePlotPointer } from "@/components/plot/plot-pointer";
import { Readout } from "@/components/plot/readout";
import { separate } from "@/components/plot/series";

export interface BandCurves {
  min: ArrayLike<number>;
  p05: ArrayLike<number>;
  median: ArrayLike<number>;
  p95: ArrayLike<number>;
  max: ArrayLike<number>;
}

interface BandPlotProps {
  /** hertz, ascending */
  xs: readonly number[];
  curves: BandCurves;
  yDomain: readonly [number, number];
  formatX: (value: number) => string;
  formatY: (value: number) => string;
  xUnit: string;
  /** the run's own band, shaded */
  band?: readonly [number, number];
  /** a limit, with the side that is forbidden */
  limit?: { value: number; forbidden: "above" | "below"; label: string };
  height?: number;
}

const room = { left: 44, right: 74, top: 10, bottom: 34 };

/** Through the points that have a number; what is beyond the frame leaves it at its edge. */
function path(xs: readonly number[], values: ArrayLike<number>, x: AxisScale, y: AxisScale): string {
  const [low = 0, high = 0] = y.domain();
  let isDrawing = false;
  return xs
    .map((at, k) => {
      const value = values[k]!;
      if (Number.isNaN(value)) return ((isDrawing = false), "");
      const point = `${x(at)} ${y(Math.max(low, Math.min(high, value)))}`;
      const command = isDrawing ? "L" : "M";
      isDrawing = true;
      return command + point;
    })
    .join("");
}

function wash({ xs, curves }: BandPlotProps, x: AxisScale, y: AxisScale): string {
  const [low = 0, high = 0] = y.domain();
  const place = (k: number, value: number) => `${x(xs[k]!)} ${y(Math.max(low, Math.min(high, value)))}`;
  const there = xs.map((_, k) => k).filter((k) => !Number.isNaN(curves.p05[k]!) && !Number.isNaN(curves.p95[k]!));
  const up = there.map((k) => place(k, curves.p95[k]!));
  const down = [...there].reverse().map((k) => place(k, curves.p05[k]!));
  return there.length > 1 ? `M${[...up, ...down].join("L")}Z` : "";
}

/** A quantity of many builds over frequency: the wash holds 90 of 100, the line is the median, dashes are the extremes. */
export function BandPlot(props: BandPlotProps) {
  const { xs, curves, yDomain, formatX, formatY, xUnit, band, limit, height = 290 } = props;
  const { ref, width } = useMeasuredWidth(880);
  const [from, to] = [xs[0] ?? 0, xs.at(-1) ?? 1];
  const x = axisScale("linear", [from, to], [room.left, width - room.right]);
  const y = axisScale("linear", yDomain, [height - room.bottom, room.top]);
  const [left, right, bottom] = [room.left, width - room.right, height - room.bottom];
  const toValue = (px: number) => from + ((px - left) / (right - left)) * (to - from);
  const { cursor, handlers } = usePlotPointer("frequency", { fromPx: left, toPx: right, toValue, toPxOf: x, width });
  const pointed = cursor === null ? -1 : Math.round(((cursor - from) / (to - from)) * (xs.length - 1));
  const last = xs.length - 1;
  const clampY = (value: number) => y(Math.max(yDomain[0], Math.min(yDomain[1], value)));
  return (
    <div ref={ref}>
      <svg
        {...handlers}
        tabIndex={0}
        role="group"
        aria-label="Arrow keys read out along the chart"
        width="100%"
        height={height}
        viewBox={`0 0 ${width} ${height}`}
        className="block touch-pan-y overflow-visible"
      >
        {band && band[1] > band[0] && (
          <rect
            x={x(band[0])}
            y={room.top}
            width={x(band[1]) - x(band[0])}
            height={bottom - room.top}
            fill="var(--sailcloth)"
          />
        )}
        <AxisX scale={x} ticks={x.ticks(7)} format={formatX} fromY={room.top} toY={bottom} />
        <AxisY scale={y} ticks={y.ticks(6)} format={formatY} fromX={left} toX={right} />
        <text x={right} y={bottom + 28} textAnchor="end">
          {xUnit}
        </text>
        <path d={wash(props, x, y)} fill="var(--copper-wash)" />
        {(["min", "max"] as const).map((which) => (
          <path
            key={which}
            d={path(xs, curves[which], x, y)}
            fill="none"
            stroke="var(--series-5)"
            strokeDasharray="4 3"
            strokeWidth="1"
          />
        ))}
        <path d={path(xs, curves.median, x, y)} fill="none" stroke="var(--series-1)" strokeWidth="1.75" />
        {limit && limit.value >= yDomain[0] && limit.value <= yDomain[1] && (
          <g>
            <path d={`M${left} ${y(limit.value)}H${right}`} stroke="var(--ink)" strokeWidth="1.75" />
            <text
              x={left + 6}
              y={y(limit.value) + (limit.forbidden === "below" ? -5 : 14)}
              style={{ fill: "var(--ink)" }}
            >
              {limit.label}
            </text>
          </g>
        )}
        <Names curves={curves} last={last} x={right + 8} y={clampY} limits={[room.top, bottom]} />
        {pointed >= 0 && cursor !== null && (
          <Readout
            x={x(cursor)}
            fromY={room.top}
            toY={bottom}
            limits={[left, right]}
            words={[
              `${formatX(xs[pointed] ?? cursor)} ${xUnit}`,
              `median ${formatY(curves.median[pointed]!)}`,
              `5–95 % ${formatY(curves.p05[pointed]!)}–${formatY(curves.p95[pointed]!)}`,
              `all ${formatY(curves.min[pointed]!)}–${formatY(curves.max[pointed]!)}`,
            ]}
          />
        )}
      </svg>
    </div>
  );
}

interface NamesProps {
  curves: BandCurves;
  last: number;
  x: number;
  y: (value: number) => number;
  /** px they stay within */
  limits: readonly [number, number];
}

/** The names of the curves at their right ends, kept apart. */
function Names({ curves, last, x, y, limits }: NamesProps) {
  const wished = [
    { words: "highest", at: curves.max[last]! },
    { words: "95 %", at: curves.p95[last]! },
    { words: "median", at: curves.median[last]! },
    { words: "5 %", at: curves.p05[last]! },
    { words: "lowest", at: curves.min[last]! },
  ].filter(({ at }) => !Number.isNaN(at));
  const wishes = wished.map(({ at }) => y(at));
  const places = separate(wishes, 13, ...limits);
  return wished.map(({ words }, i) => (
    <text
      key={words}
      x={x}
      y={places[i]}
      dy="0.36em"
      style={words === "median" ? { fill: "var(--series-1)", fontWeight: 600 } : undefined}
    >
      {words}
    </text>
  ));
}
