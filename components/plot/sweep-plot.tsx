"use client";

import { Area, CartesianGrid, ComposedChart, Line, XAxis, YAxis, ZIndexLayer } from "recharts";
import { axisScale, logTicks } from "@/components/plot/axes";
import { useMeasuredWidth } from "@/components/plot/measured-width";
import { SweepCursor } from "@/components/plot/sweep-cursor";
import { seriesColour, seriesDash, type SweepSeries } from "@/components/plot/series";
import { SweepLabels, SweepLimit, SweepTarget, type SweepOverlay } from "@/components/plot/sweep-overlay";

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

type Row = Record<string, number | null | [number, number] | undefined>;

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

const tickLook = { fill: "var(--ink-2)", fontSize: 11, fontFamily: "var(--font-figures)", letterSpacing: "-0.02em" };

function curves(series: readonly SweepSeries[]) {
  return series.flatMap(({ id, look, spread, isMeasured }, k) => {
    const plain = { isAnimationActive: false, activeDot: false, dot: false, legendType: "none" } as const;
    const line = (
      <Line
        key={id}
        {...plain}
        dataKey={`y${k}`}
        type="linear"
        stroke={seriesColour[look]}
        strokeWidth={isMeasured ? 2 : 1.75}
        strokeDasharray={isMeasured ? undefined : seriesDash[look]}
        strokeLinejoin="round"
      />
    );
    if (!spread) return [line];
    return [
      <Area
        key={`${id} spread`}
        {...plain}
        dataKey={`spread${k}`}
        type="linear"
        stroke="none"
        fill={seriesColour[look]}
        fillOpacity={0.16}
      />,
      line,
    ];
  });
}

/** Values against frequency: the target's column, the forbidden part, the limit, the worst point, a label at the end of each line. */
export function SweepPlot(props: SweepPlotProps) {
  const {
    kind = "linear",
    xs,
    series,
    xDomain,
    yDomain,
    xUnit,
    height = 290,
    labelRoom = 92,
    formatX,
    formatY,
  } = props;
  const { ref, width } = useMeasuredWidth(830);
  const plain = axisScale(kind, xDomain, [0, 1]);
  const xTicks =
    props.xTicks ?? (kind === "log" ? logTicks(xDomain) : plain.ticks(Math.max(3, Math.min(9, width / 90))));
  const yTicks = props.yTicks ?? axisScale("linear", yDomain, [0, 1]).ticks(6);
  const axis = {
    type: "number",
    allowDataOverflow: true,
    tick: tickLook,
    tickLine: false,
    axisLine: { stroke: "var(--rule)" },
    interval: 0,
  } as const;
  return (
    <div ref={ref} className="touch-pan-y overflow-hidden">
      <ComposedChart
        width={width}
        height={height}
        data={rowsOf(xs, series)}
        margin={{ top: 15, right: labelRoom, bottom: 4, left: 0 }}
        accessibilityLayer={false}
        style={{ outline: "none" }}
      >
        <SweepTarget {...props} />
        <CartesianGrid stroke="var(--line)" />
        <XAxis
          {...axis}
          dataKey="x"
          scale={kind}
          domain={[...xDomain]}
          ticks={[...xTicks]}
          tickFormatter={formatX}
          height={34}
          tickMargin={5}
        />
        <YAxis
          {...axis}
          domain={[...yDomain]}
          ticks={[...yTicks]}
          tickFormatter={formatY}
          width={leftRoom}
          tickMargin={4}
        />
        {curves(series)}
        <ZIndexLayer zIndex={700}>
          <SweepLimit {...props} />
          <SweepLabels {...props} xUnit={xUnit} />
          <SweepCursor {...props} kind={kind} width={width} />
        </ZIndexLayer>
      </ComposedChart>
    </div>
  );
}
