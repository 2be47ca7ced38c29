"use client";

import type { KeyboardEvent } from "react";
import { Area, CartesianGrid, ComposedChart, Line, XAxis, YAxis, ZIndexLayer } from "recharts";
import { axisScale, logTicks } from "@/components/plot/axes";
import { useCursor } from "@/components/plot/cursor";
import { nearestIndex } from "@/components/plot/curve";
import { useMeasuredWidth } from "@/components/plot/measured-width";
import { seriesColour, seriesDash, type SweepSeries } from "@/components/plot/series";
import { SweepCursor } from "@/components/plot/sweep-cursor";
import type { SweepOverlay } from "@/components/plot/sweep-frame";
import { SweepLabels } from "@/components/plot/sweep-labels";
import { SweepLimit, SweepTarget } from "@/components/plot/sweep-target";

export interface SweepPlotProps extends SweepOverlay {
  kind?: "linear" | "log";
  /** ascending, hertz unless `cursorAxis` says otherwise */
  xs: readonly number[];
  series: readonly SweepSeries[];
  xDomain: readonly [number, number];
  yDomain: readonly [number, number];
  xTicks?: readonly number[];
  yTicks?: readonly number[];
  /** under the right end of the x-axis */
  xUnit: string;
  height?: number;
  /** room for the labels at the end of the lines, px */
  labelRoom?: number;
}

const leftRoom = 38;

type Row = Record<string, number | null | [number, number]>;

/** One row per place, as the chart library reads them. */
function rowsOf(xs: readonly number[], series: readonly SweepSeries[]): Row[] {
  return xs.map((x, i) => {
    const row: Row = { x };
    series.forEach(({ values, spread }, k) => {
      row[`y${k}`] = values[i] ?? null;
      const [low, high] = [spread?.low[i], spread?.high[i]];
      if (low != null && high != null) row[`spread${k}`] = [low, high];
    });
    return row;
  });
}

const plain = { isAnimationActive: false, activeDot: false, dot: false, legendType: "none", type: "linear" } as const;

function curves(series: readonly SweepSeries[]) {
  const spreads = series.map(
    ({ id, look, spread }, k) =>
      spread && (
        <Area
          key={`${id} spread`}
          {...plain}
          dataKey={`spread${k}`}
          stroke="none"
          fill={seriesColour[look]}
          fillOpacity={0.16}
        />
      ),
  );
  const lines = series.map(({ id, look, isMeasured }, k) => (
    <Line
      key={id}
      {...plain}
      dataKey={`y${k}`}
      stroke={seriesColour[look]}
      strokeWidth={isMeasured ? 2 : 1.75}
      strokeDasharray={isMeasured ? undefined : seriesDash[look]}
      strokeLinejoin="round"
    />
  ));
  return [...spreads, ...lines];
}

/** The chart library's axes in the product's clothes. */
function axesOf({ kind = "linear", xDomain, yDomain, formatX, formatY, ...props }: SweepPlotProps, width: number) {
  const some = Math.max(3, Math.min(9, Math.floor(width / 90)));
  const xTicks =
    props.xTicks ?? (kind === "log" ? logTicks(xDomain) : axisScale("linear", xDomain, [0, 1]).ticks(some));
  const yTicks = props.yTicks ?? axisScale("linear", yDomain, [0, 1]).ticks(6);
  const common = { type: "number", allowDataOverflow: true, tickLine: false, interval: 0 } as const;
  const look = { tick: { fill: "var(--ink-2)", fontSize: 11 }, axisLine: { stroke: "var(--rule)" } };
  const x = { domain: [...xDomain], ticks: [...xTicks], tickFormatter: formatX, scale: kind, dataKey: "x" };
  const y = { domain: [...yDomain], ticks: [...yTicks], tickFormatter: formatY };
  return {
    x: { ...common, ...look, ...x, height: 34, tickMargin: 5 },
    y: { ...common, ...look, ...y, width: leftRoom, tickMargin: 4 },
  };
}

/** Arrow keys move the shared cursor from one place of the sweep to the next; with Shift ten at once. */
function useArrows({ xs, cursorAxis = "frequency" }: Pick<SweepPlotProps, "xs" | "cursorAxis">) {
  const cursor = useCursor(cursorAxis);
  return (event: KeyboardEvent) => {
    if (event.key === "Escape") cursor.set(null);
    const by = event.key === "ArrowRight" ? 1 : event.key === "ArrowLeft" ? -1 : 0;
    if (by === 0) return;
    event.preventDefault();
    const from = cursor.value === null ? (by > 0 ? -1 : xs.length) : nearestIndex(xs, cursor.value);
    cursor.set(xs[Math.max(0, Math.min(xs.length - 1, from + by * (event.shiftKey ? 10 : 1)))] ?? null);
  };
}

/** Values against frequency: the target's column and its forbidden part, the limit, the worst point, a label at the end of each line. */
export function SweepPlot(props: SweepPlotProps) {
  const { kind = "linear", xs, series, xUnit, height = 290, labelRoom = 92 } = props;
  const { ref, width } = useMeasuredWidth(830);
  const axes = axesOf(props, width);
  const margin = { top: 15, right: labelRoom, bottom: 4, left: 0 };
  return (
    <div
      ref={ref}
      tabIndex={0}
      role="group"
      aria-label="Arrow keys read out along the chart"
      onKeyDown={useArrows(props)}
      className="overflow-hidden outline-offset-0"
    >
      <ComposedChart width={width} height={height} data={rowsOf(xs, series)} margin={margin} accessibilityLayer={false}>
        <ZIndexLayer zIndex={-200}>
          <SweepTarget {...props} />
        </ZIndexLayer>
        <CartesianGrid stroke="var(--line)" />
        <XAxis {...axes.x} />
        <YAxis {...axes.y} />
        {curves(series)}
        <ZIndexLayer zIndex={700}>
          <SweepLimit {...props} />
          <SweepLabels {...props} xUnit={xUnit} />
          <SweepCursor {...props} kind={kind} />
        </ZIndexLayer>
      </ComposedChart>
    </div>
  );
}
