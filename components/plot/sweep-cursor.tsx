"use client";

import type { PointerEvent } from "react";
import { axisScale } from "@/components/plot/axes";
import { useCursor } from "@/components/plot/cursor";
import { nearestIndex } from "@/components/plot/curve";
import { Readout } from "@/components/plot/readout";
import { usePlot, type Domains, type SweepOverlay } from "@/components/plot/sweep-overlay";

interface CursorProps extends SweepOverlay, Domains {
  kind: "linear" | "log";
  width: number;
}

/** Takes the pointer over the frame, and reads out at the shared cursor. */
export function SweepCursor(props: CursorProps) {
  const plot = usePlot();
  const cursor = useCursor(props.cursorAxis ?? "frequency");
  if (!plot) return null;
  const scale = axisScale(props.kind, props.xDomain, [0, 1]);
  const invert = (share: number) => {
    const [a, b] = props.xDomain;
    return props.kind === "log" ? a * (b / a) ** share : a + (b - a) * share;
  };
  const point = (event: PointerEvent<SVGRectElement>) => {
    const frame = event.currentTarget.getBoundingClientRect();
    if (frame.width > 0) cursor.set(invert(Math.max(0, Math.min(1, (event.clientX - frame.left) / frame.width))));
  };
  const at = cursor.value === null ? -1 : nearestIndex(props.xs, cursor.value);
  const share = cursor.value === null ? -1 : scale(cursor.value);
  const words = props.series.map(
    ({ label, values }) => `${values[at] == null ? "–" : props.formatY(values[at] as number)} ${label}`,
  );
  return (
    <g>
      <rect
        x={plot.left}
        y={plot.top}
        width={plot.right - plot.left}
        height={plot.bottom - plot.top}
        fill="transparent"
        onPointerMove={point}
        onPointerLeave={() => cursor.set(null)}
      />
      {at >= 0 && share >= 0 && share <= 1 && (
        <Readout
          x={plot.x(cursor.value ?? 0)}
          fromY={plot.top}
          toY={plot.bottom}
          limits={[plot.left, plot.right]}
          words={[props.formatX(props.xs[at] ?? 0), ...words]}
        />
      )}
    </g>
  );
}
