"use client";

import { AxisX, AxisY, axisScale, logTicks } from "@/components/plot/axes";
import { useMeasuredWidth } from "@/components/plot/measured-width";

export interface Residual {
  /** hertz, above 0 */
  x: number;
  /** per cent */
  percent: number;
}

interface ResidualStripProps {
  residuals: readonly Residual[];
  /** a second set, as rings: what another curve leaves over */
  others?: readonly Residual[];
  xDomain: readonly [number, number];
  formatX: (value: number) => string;
  xUnit: string;
  /** beside the strip, one line each */
  words: readonly string[];
  /** per cent that need no second look */
  fine: number;
  leftRoom?: number;
  labelRoom?: number;
  firstWidth?: number;
}

const box = { top: 6, bottom: 62, height: 96 };

/** Half the height of the strip, per cent: the nearest round figure that holds everything. */
export function residualReach(residuals: readonly Residual[], fine: number): number {
  const most = residuals.reduce((far, { percent }) => Math.max(far, Math.abs(percent)), fine);
  return [1, 2, 4, 6, 10, 20, 40, 60, 100].find((round) => round >= most * 1.05) ?? Math.ceil(most);
}

/** What a curve leaves over of each given point, in per cent, under the curve's own axis. */
export function ResidualStrip(props: ResidualStripProps) {
  const { residuals, others = [], xDomain, formatX, xUnit, words, fine, leftRoom = 38, labelRoom = 92 } = props;
  const { ref, width } = useMeasuredWidth(props.firstWidth ?? 560);
  const [left, right] = [leftRoom, Math.max(leftRoom + 40, width - labelRoom)];
  const reach = residualReach([...residuals, ...others], fine);
  const x = axisScale("log", xDomain, [left, right]);
  const y = axisScale("linear", [-reach, reach], [box.bottom, box.top]);
  const shown = (value: number) => `${value > 0 ? "+" : value < 0 ? "\u2212" : ""}${Math.abs(value)}`;
  return (
    <div ref={ref} className="min-w-0">
      <svg width={width} height={box.height} aria-hidden="true" className="block max-w-full overflow-visible">
        <rect x={left} y={y(fine)} width={right - left} height={y(-fine) - y(fine)} fill="var(--pass-wash)" />
        <AxisX scale={x} ticks={logTicks(xDomain)} format={formatX} fromY={box.top} toY={box.bottom} />
        <AxisY scale={y} ticks={[-reach / 2, 0, reach / 2]} format={shown} fromX={left} toX={right} />
        <path d={`M${left} ${box.top}V${box.bottom}H${right}`} fill="none" stroke="var(--rule)" />
        {residuals.map((residual) => (
          <g key={residual.x}>
            <path d={`M${x(residual.x)} ${y(0)}V${y(residual.percent)}`} stroke="var(--ink)" strokeWidth="1.4" />
            <circle cx={x(residual.x)} cy={y(residual.percent)} r="2.6" fill="var(--ink)" />
          </g>
        ))}
        {others.map((residual) => (
          <circle
            key={residual.x}
            cx={x(residual.x)}
            cy={y(residual.percent)}
            r="3.4"
            fill="none"
            stroke="var(--series-1)"
            strokeWidth="1.4"
          />
        ))}
        {words.map((word, i) => (
          <text key={word} x={right + 6} y={box.top + 13 + i * 14}>
            {word}
          </text>
        ))}
        <text x={right} y={box.bottom + 29} textAnchor="end">
          {xUnit}
        </text>
      </svg>
    </div>
  );
}
