"use client";

import { useState, type KeyboardEvent, type PointerEvent } from "react";
import type { LineScale } from "@/components/line/line-scale";
import { inWords, scaled } from "@/lib/format/quantity";

interface MomentProps {
  scale: LineScale;
  width: number;
  sourceName: string;
  loadName: string;
  y: number;
  atS: number;
  source: number | undefined;
  load: number | undefined;
}

/** The moment that is read out, across everything. */
export function Moment({ scale, y, atS, source, load, sourceName, loadName, width }: MomentProps) {
  const words = [
    inWords(scaled("time", atS, 4)),
    `${sourceName} ${inWords(scaled("voltage", source, 3))}`,
    `${loadName} ${inWords(scaled("voltage", load, 3))}`,
  ].join("   ");
  const boxWidth = Math.min(scale.endX - scale.startX, words.length * 6.4 + 14);
  return (
    <g pointerEvents="none">
      <path d={`M0 ${y}H${width}`} stroke="var(--ink)" strokeDasharray="2 3" />
      <rect x={scale.startX + 6} y={y - 22} width={boxWidth} height="18" fill="var(--paper)" stroke="var(--rule)" />
      <text x={scale.startX + 13} y={y - 9} className="figures" style={{ fill: "var(--ink)" }}>
        {words}
      </text>
    </g>
  );
}

/** The moment pointed at, by pointer and by arrow keys. */
export function useTimeCursor(windowS: number, y: (timeS: number) => number) {
  const [at, setAt] = useState<number | null>(null);
  const clamp = (timeS: number) => Math.max(0, Math.min(windowS, timeS));
  const handlers = {
    onPointerMove(event: PointerEvent<SVGSVGElement>) {
      const frame = event.currentTarget.getBoundingClientRect();
      const timeS = ((event.clientY - frame.top - y(0)) / (y(windowS) - y(0))) * windowS;
      setAt(timeS >= -0.01 * windowS && timeS <= 1.01 * windowS ? clamp(timeS) : null);
    },
    onPointerLeave: () => setAt(null),
    onBlur: () => setAt(null),
    onKeyDown(event: KeyboardEvent<SVGSVGElement>) {
      const by = { ArrowDown: 1, ArrowUp: -1 }[event.key];
      if (event.key === "Escape") setAt(null);
      if (by === undefined) return;
      event.preventDefault();
      setAt(clamp((at ?? 0) + (by * (event.shiftKey ? 10 : 1) * windowS) / 300));
    },
  };
  return { at, handlers };
}
