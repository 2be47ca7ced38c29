"use client";

import { AxisX, axisScale, type AxisScale } from "@/components/plot/axes";

export interface SignalDownProps {
  /** the drawing shares this time axis with what stands beside it; px of a time */
  y: (timeS: number) => number;
  height: number;
  width: number;
  /** room above for the axis, px */
  top: number;
  timeS: ArrayLike<number>;
  volts: ArrayLike<number>;
  /** least and greatest of the volt axis */
  range: readonly [number, number];
  settledV: number;
  /** half width of the band about the settled level, volt; none without it */
  bandV?: number;
  /** volts grow to the left, toward the source's side of the page */
  isMirrored?: boolean;
  format: (volt: number) => string;
  /** a moment to mark, with its words */
  mark?: { timeS: number; words: string };
  /** the greatest value, with its words */
  peak?: { timeS: number; volt: number; words: string };
}

function path(props: SignalDownProps, x: AxisScale): string {
  const { timeS, volts, y } = props;
  return Array.from(volts)
    .map((volt, k) => `${k === 0 ? "M" : "L"}${x(volt).toFixed(1)} ${y(timeS[k] ?? 0).toFixed(1)}`)
    .join("");
}

/** A voltage over time, time running down: what an end of the line sees, beside the lattice. */
export function SignalDown(props: SignalDownProps) {
  const { y, height, width, top, range, settledV, bandV, isMirrored = false, format, mark, peak } = props;
  const x = axisScale("linear", isMirrored ? [range[1], range[0]] : range, [0, width]);
  const isSettled = Number.isFinite(settledV);
  return (
    <g>
      <g transform={`translate(0 ${top})`}>
        <AxisX scale={x} ticks={x.ticks(3)} format={() => ""} fromY={0} toY={height} />
      </g>
      {x.ticks(3).map((tick) => (
        <text key={tick} x={x(tick)} y={top - 6} textAnchor="middle" className="figures">
          {format(tick)}
        </text>
      ))}
      {isSettled && bandV !== undefined && (
        <rect
          x={Math.min(x(settledV - bandV), x(settledV + bandV))}
          y={top}
          width={Math.abs(x(settledV + bandV) - x(settledV - bandV))}
          height={height}
          fill="var(--pass)"
          opacity="0.16"
        />
      )}
      {isSettled && (
        <path
          d={`M${x(settledV)} ${top}V${top + height}`}
          stroke={bandV === undefined ? "var(--rule)" : "var(--pass)"}
          strokeDasharray={bandV === undefined ? "3 3" : undefined}
          strokeWidth="1.2"
        />
      )}
      <path d={path(props, x)} fill="none" stroke="var(--series-1)" strokeWidth="1.75" strokeLinejoin="round" />
      {mark && (
        <g>
          <path d={`M0 ${y(mark.timeS)}H${width}`} stroke="var(--ink)" strokeDasharray="3 3" />
          <text x="4" y={y(mark.timeS) - 5} style={{ fontWeight: 600, fill: "var(--ink)" }}>
            {mark.words}
          </text>
        </g>
      )}
      {peak && (
        <g>
          <circle
            cx={x(peak.volt)}
            cy={y(peak.timeS)}
            r="4"
            fill="var(--paper)"
            stroke="var(--series-1)"
            strokeWidth="1.5"
          />
          <text
            x={x(peak.volt) - 8}
            y={y(peak.timeS) - 8}
            textAnchor="end"
            className="figures"
            style={{ fill: "var(--ink)", fontWeight: 600 }}
          >
            {peak.words}
          </text>
        </g>
      )}
    </g>
  );
}
