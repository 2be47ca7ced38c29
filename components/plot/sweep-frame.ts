"use client";

import { usePlotArea, useXAxisScale, useYAxisScale } from "recharts";
import type { CursorAxis } from "@/components/plot/cursor";
import type { SweepSeries } from "@/components/plot/series";

/** What the product draws over and under the curves of a sweep. */
export interface SweepOverlay {
  formatX: (value: number) => string;
  formatY: (value: number) => string;
  /** the target's band: a sailcloth column with its words at the top */
  band?: { from: number; to: number; label: string };
  /** a limit; `forbidden` is the side that is hatched; without ends it runs over the band, or over everything */
  limit?: { value: number; from?: number; to?: number; forbidden: "below" | "above"; label: string };
  /** the worst point in the band: an open ring and its value */
  worst?: { x: number; y: number; label: string; look?: SweepSeries["look"] };
  /** a place marked on the x-axis: the design frequency */
  mark?: number;
  /** the shared cursor this plot belongs to, default frequency */
  cursorAxis?: CursorAxis;
}

export interface Domains {
  xs: readonly number[];
  series: readonly SweepSeries[];
  xDomain: readonly [number, number];
  yDomain: readonly [number, number];
}

/** The frame of a chart and the places of values in it; what lies outside is put on its edge. */
export interface Frame {
  left: number;
  top: number;
  right: number;
  bottom: number;
  x: (value: number) => number;
  y: (value: number) => number;
}

/** The frame of the chart around; null while it has none. */
export function useFrame(): Frame | null {
  const [area, xScale, yScale] = [usePlotArea(), useXAxisScale(), useYAxisScale()];
  if (!area || !xScale || !yScale) return null;
  const [left, top, right, bottom] = [area.x, area.y, area.x + area.width, area.y + area.height];
  const within = (px: number, low: number, high: number) => Math.round(100 * Math.max(low, Math.min(high, px))) / 100;
  return {
    left,
    top,
    right,
    bottom,
    x: (value) => within(xScale(value) ?? left, left, right),
    y: (value) => within(yScale(value) ?? bottom, top, bottom),
  };
}

/** The stretch of the x-axis that a limit runs over. */
export function limitEnds({ limit, band, xDomain }: SweepOverlay & Domains): [number, number] {
  return [limit?.from ?? band?.from ?? xDomain[0], limit?.to ?? band?.to ?? xDomain[1]];
}
