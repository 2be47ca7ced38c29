"use client";

import type { Values } from "@/components/plot/curve";
import { separate, seriesColour } from "@/components/plot/series";
import { useFrame, type Domains, type Frame } from "@/components/plot/sweep-frame";

type Side = "above" | "below";

/** Value of a series at the right end of the frame; null when it has none in it. */
function valueAtEnd({ xs, xDomain }: Domains, values: Values): number | null {
  for (let i = xs.length - 1; i >= 0; i--) {
    const value = values[i];
    if ((xs[i] ?? Infinity) <= xDomain[1] * (1 + 1e-9) && value != null) return value;
  }
  return null;
}

/** Where a series is furthest outside the frame on one side; null when it stays inside. */
function furthestOut({ xs, xDomain, yDomain }: Domains, values: Values, side: Side): number | null {
  let [most, at]: [number, number | null] = [0, null];
  values.forEach((value, i) => {
    const x = xs[i] ?? NaN;
    if (value == null || !(x >= xDomain[0] && x <= xDomain[1])) return;
    const over = side === "above" ? value - yDomain[1] : yDomain[0] - value;
    if (over > most) [most, at] = [over, x];
  });
  return at;
}

/** Says at the edge of the frame that a curve goes on outside it. */
function OffScale({ props, frame, side }: { props: Domains; frame: Frame; side: Side }) {
  const at = props.series.map(({ values }) => furthestOut(props, values, side)).find((x) => x !== null);
  if (at == null) return null;
  const x = Math.max(frame.left + 30, Math.min(frame.right - 30, frame.x(at)));
  return (
    <text x={x} y={side === "above" ? frame.top - 4 : frame.bottom - 4} textAnchor="middle">
      {side === "above" ? "↑" : "↓"} off scale
    </text>
  );
}

/** Names at the ends of the lines, the unit of the x-axis, and where a curve leaves the frame. */
export function SweepLabels({ xUnit, ...props }: Domains & { xUnit: string }) {
  const frame = useFrame();
  if (!frame) return null;
  const ends = props.series.map(({ values }) => valueAtEnd(props, values));
  const named = props.series.filter((_, i) => ends[i] !== null);
  const wishes = ends.filter((end) => end !== null).map(frame.y);
  const places = separate(wishes, 13, frame.top + 4, frame.bottom + 8);
  return (
    <g>
      {named.map(({ id, label, look }, i) => (
        <text
          key={id}
          x={frame.right + 6}
          y={places[i]}
          dy="0.32em"
          style={{ fill: look === 5 ? "var(--ink-2)" : seriesColour[look], fontWeight: 600 }}
        >
          {label}
        </text>
      ))}
      <OffScale props={props} frame={frame} side="above" />
      <OffScale props={props} frame={frame} side="below" />
      <text x={frame.right} y={frame.bottom + 30} textAnchor="end">
        {xUnit}
      </text>
    </g>
  );
}
