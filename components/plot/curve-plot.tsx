"use client";

import { useId } from "react";
import { AxisX, AxisY, axisScale, logTicks } from "@/components/plot/axes";
import { Given, Labels, Limit, Mark, Note, type CurveFrame, type GivenPoint } from "@/components/plot/curve-marks";
import { CurvePaths, type CurveSeries } from "@/components/plot/curve-paths";
import { nearestIndex } from "@/components/plot/curve";
import { useMeasuredWidth } from "@/components/plot/measured-width";
import { usePlotPointer } from "@/components/plot/plot-pointer";
import { Readout } from "@/components/plot/readout";

export interface CurvePlotProps {
  /** ascending, hertz, each above 0 */
  xs: readonly number[];
  series: readonly CurveSeries[];
  xDomain: readonly [number, number];
  yDomain: readonly [number, number];
  yKind?: "log" | "linear";
  yTicks?: readonly number[];
  xTicks?: readonly number[];
  formatX: (value: number) => string;
  formatY: (value: number) => string;
  /** how the cursor reads a value out; default `formatY` */
  readY?: (value: number) => string;
  readX?: (value: number) => string;
  points?: readonly GivenPoint[];
  /** a place marked on the x-axis, with a ring on the first series */
  mark?: number;
  /** a place on the x-axis with words at its head */
  limit?: { x: number; label: string };
  /** words beside the first curve at a place */
  note?: { x: number; label: string };
  /** under the right end of the x-axis; without it the axis has no figures: a strip below has them */
  xUnit?: string;
  height?: number;
  leftRoom?: number;
  /** room for the labels at the end of the lines, px */
  labelRoom?: number;
  firstWidth?: number;
}

function useFrame(props: CurvePlotProps, width: number): CurveFrame {
  const { xDomain, yDomain, yKind = "log", height = 222, leftRoom = 38, labelRoom = 92, xUnit } = props;
  const [left, right, top, bottom] = [
    leftRoom,
    Math.max(leftRoom + 40, width - labelRoom),
    8,
    height - (xUnit ? 34 : 8),
  ];
  return {
    ...{ left, right, top, bottom },
    x: axisScale("log", xDomain, [left, right]),
    y: axisScale(yKind, yDomain, [bottom, top]),
  };
}

function Grid({ props, frame }: { props: CurvePlotProps; frame: CurveFrame }) {
  const { xDomain, yDomain, yKind = "log", formatX, formatY, xUnit } = props;
  const { left, right, top, bottom, x, y } = frame;
  const xTicks = props.xTicks ?? logTicks(xDomain);
  const yTicks = props.yTicks ?? (yKind === "log" ? logTicks(yDomain) : y.ticks(4));
  return (
    <g>
      <AxisX scale={x} ticks={xTicks} format={xUnit ? formatX : () => ""} fromY={top} toY={bottom} />
      <AxisY scale={y} ticks={yTicks} format={formatY} fromX={left} toX={right} />
      <path d={`M${left} ${top}V${bottom}H${right}`} fill="none" stroke="var(--rule)" />
      {xUnit && (
        <text x={right} y={bottom + 29} textAnchor="end">
          {xUnit}
        </text>
      )}
    </g>
  );
}

/**
 * Values over decades of frequency: own drawing, light enough for pages that have no other chart. What lies beyond the
 * data is dotted. Pointer and arrow keys read out on every plot that shares the cursor.
 */
export function CurvePlot(props: CurvePlotProps) {
  const { xs, series, points = [], mark, limit, height = 222, formatX, formatY, firstWidth = 560 } = props;
  const { ref, width } = useMeasuredWidth(firstWidth);
  const clip = useId();
  const frame = useFrame(props, width);
  const { left, right, top, bottom } = frame;
  const [low = 1, high = 10] = frame.x.domain();
  const span = {
    ...{ fromPx: left, toPx: right, width },
    toValue: (px: number) => low * (high / low) ** ((px - left) / (right - left)),
    toPxOf: (value: number) => frame.x(value),
  };
  const { cursor, handlers } = usePlotPointer("frequency", span);
  const isInside = cursor !== null && cursor >= low && cursor <= high;
  const at = isInside ? nearestIndex(xs, cursor) : -1;
  const said = (value: number | null | undefined) => (value == null ? "–" : (props.readY ?? formatY)(value));
  const words = [
    (props.readX ?? formatX)(xs[at] ?? 0),
    ...series.map(({ label, values }) => `${said(values[at])} ${label}`.trim()),
  ];
  return (
    <div ref={ref} className="min-w-0">
      <svg
        {...handlers}
        width={width}
        height={height}
        role="group"
        tabIndex={0}
        aria-label="Arrow keys read out along the curve"
        className="block max-w-full overflow-visible outline-offset-0"
      >
        <clipPath id={clip}>
          <rect x={left} y={top} width={right - left} height={bottom - top} />
        </clipPath>
        <rect x={left} y={top} width={right - left} height={bottom - top} fill="transparent" />
        <Grid props={props} frame={frame} />
        {limit && <Limit limit={limit} frame={frame} />}
        <g clipPath={`url(#${clip})`}>
          <CurvePaths xs={xs} series={series} x={frame.x} y={frame.y} />
          <Given points={points} frame={frame} />
        </g>
        {props.note && <Note note={props.note} xs={xs} series={series} frame={frame} />}
        {mark !== undefined && <Mark {...{ mark, xs, series, frame }} />}
        <Labels series={series} xs={xs} frame={frame} />
        {at >= 0 && <Readout x={frame.x(xs[at] ?? 0)} fromY={top} toY={bottom} limits={[left, right]} words={words} />}
      </svg>
    </div>
  );
}
