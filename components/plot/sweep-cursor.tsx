"use client";

import type { PointerEvent } from "react";
import { useCursor } from "@/components/plot/cursor";
import { nearestIndex } from "@/components/plot/curve";
import { Readout } from "@/components/plot/readout";
import { useFrame, type Domains, type SweepOverlay } from "@/components/plot/sweep-frame";

interface CursorProps extends SweepOverlay, Domains {
  kind: "linear" | "log";
}

/** Value of the x-axis at a share of its length. */
function valueAt(kind: "linear" | "log", [from, to]: readonly [number, number], share: number): number {
  return kind === "log" ? from * (to / from) ** share : from + (to - from) * share;
}

/** Takes the pointer over the frame, and reads out at the shared cursor. */
export function SweepCursor({ kind, xs, series, xDomain, formatX, formatY, cursorAxis = "frequency" }: CursorProps) {
  const frame = useFrame();
  const cursor = useCursor(cursorAxis);
  if (!frame) return null;
  const { left, top, right, bottom } = frame;
  const point = (event: PointerEvent<SVGRectElement>) => {
    const box = event.currentTarget.getBoundingClientRect();
    const share = box.width > 0 ? (event.clientX - box.left) / box.width : 0;
    cursor.set(valueAt(kind, xDomain, Math.max(0, Math.min(1, share))));
  };
  const isInside = cursor.value !== null && cursor.value >= xDomain[0] && cursor.value <= xDomain[1];
  const at = isInside ? nearestIndex(xs, cursor.value ?? 0) : -1;
  const said = (value: number | null | undefined) => (value == null ? "–" : formatY(value));
  const words = [formatX(xs[at] ?? 0), ...series.map(({ label, values }) => `${said(values[at])} ${label}`)];
  const size = { x: left, y: top, width: right - left, height: bottom - top };
  return (
    <g>
      <rect {...size} fill="transparent" onPointerMove={point} onPointerLeave={() => cursor.set(null)} />
      {at >= 0 && <Readout x={frame.x(xs[at] ?? 0)} fromY={top} toY={bottom} limits={[left, right]} words={words} />}
    </g>
  );
}
