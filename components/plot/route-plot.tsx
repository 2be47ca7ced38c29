"use client";

import { axisScale } from "@/components/plot/axes";
import { useMeasuredWidth } from "@/components/plot/measured-width";

export interface Route {
  name: string;
  value: number;
  from: number;
  to: number;
}

interface RoutePlotProps {
  routes: readonly Route[];
  /** washed: where a value should lie */
  band?: readonly [number, number];
  format: (value: number) => string;
}

const rowHeight = 19;
const nameRoom = 138;
const valueRoom = 50;

/** Ends of the axis: everything, with a little room. */
function ends(routes: readonly Route[], band: readonly [number, number] | undefined): [number, number] {
  const places = [...routes.flatMap(({ from, to, value }) => [from, to, value]), ...(band ?? [])];
  const [low, high] = [Math.min(...places), Math.max(...places)];
  const room = Math.max((high - low) * 0.08, Math.abs(high) * 0.005);
  return [low - room, high + room];
}

/** Several ways to one figure on one axis: a dot each, a triangle outside the band, and how far its tolerances reach. */
export function RoutePlot({ routes, band, format }: RoutePlotProps) {
  const { ref, width } = useMeasuredWidth(342);
  const [left, right] = [nameRoom, Math.max(nameRoom + 60, width - valueRoom)];
  const x = axisScale("linear", ends(routes, band), [left, right]);
  const foot = routes.length * rowHeight;
  return (
    <div ref={ref}>
      <svg
        width={width}
        height={foot + 20}
        role="img"
        aria-label={routes.map(({ name, value }) => `${name} ${format(value)}`).join(", ")}
        className="block max-w-full overflow-visible"
      >
        {band && <rect x={x(band[0])} y="0" width={x(band[1]) - x(band[0])} height={foot} fill="var(--pass-wash)" />}
        {x.ticks(3).map((tick) => (
          <g key={tick}>
            <path d={`M${x(tick)} 0V${foot}`} stroke="var(--line)" />
            <text x={x(tick)} y={foot + 14} textAnchor="middle" className="figures">
              {tick}
            </text>
          </g>
        ))}
        {routes.map(({ name, value, from, to }, i) => {
          const y = i * rowHeight + rowHeight / 2;
          const isOut = band !== undefined && (value < band[0] || value > band[1]);
          const colour = isOut ? "var(--warn)" : "var(--ink)";
          return (
            <g key={name}>
              <text y={y + 4} style={{ fontSize: 12 }}>
                {name}
              </text>
              <path d={`M${x(from)} ${y}H${x(to)}`} stroke={colour} strokeWidth="1.5" />
              {isOut ? (
                <path d={`M${x(value)} ${y - 4.6}l4.8 8.6h-9.6z`} fill={colour} />
              ) : (
                <circle cx={x(value)} cy={y} r="3.8" fill={colour} />
              )}
              <text
                x={width}
                y={y + 4}
                textAnchor="end"
                className="figures key"
                style={{ fontSize: 12, fontWeight: 400 }}
              >
                {format(value)}
              </text>
            </g>
          );
        })}
      </svg>
    </div>
  );
}
