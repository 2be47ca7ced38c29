"use client";

import { useId, useState } from "react";
import { seriesColour, seriesDash, type SeriesLook } from "@/components/plot/series";
import { SmithGrid } from "@/components/plot/smith-grid";
import { SmithKey } from "@/components/plot/smith-key";

/** A reflection coefficient in the plane. */
export interface Reflection {
  re: number;
  im: number;
}

export interface SmithTrace {
  id: string;
  label: string;
  look: SeriesLook;
  /** ascending in frequency; null where nothing could be computed */
  points: readonly (Reflection | null)[];
  /** band ends get a dot and these words: "156", "162.1" */
  ends?: readonly [string, string];
}

export interface SmithChartProps {
  traces: readonly SmithTrace[];
  /** the way of the chosen match from load to source, dotted */
  steps?: { label: string; points: readonly Reflection[]; note?: { at: number; words: string } };
  /** every reflection inside the disc meets the target */
  target?: { magnitude: number; label: string };
  /** |Γ| at the edge of the centre view; without it all that is drawn fits */
  edge?: number;
  size?: number;
}

const magnitude = ({ re, im }: Reflection) => Math.hypot(re, im);

/** The smallest of a few round edges that holds everything; 1 is the whole chart. */
export function fittingEdge(points: readonly (Reflection | null)[], target = 0): number {
  const most = points.reduce((far, point) => (point ? Math.max(far, magnitude(point)) : far), target * 1.3);
  const fits = Math.ceil(most * 1.18 * 50) / 50;
  return Math.max(0.1, Math.min(1, fits));
}

/** px from the centre, y downwards, on tenths. */
function placeOf(point: Reflection, r: number): [number, number] {
  return [Math.round(point.re * r * 10) / 10, Math.round(-point.im * r * 10) / 10];
}

function pathOf(points: readonly (Reflection | null)[], r: number): string {
  let path = "";
  let isDrawing = false;
  for (const point of points) {
    const isThere = point !== null && Number.isFinite(point.re) && Number.isFinite(point.im);
    if (isThere) path += `${isDrawing ? "L" : "M"}${(point.re * r).toFixed(1)} ${(-point.im * r).toFixed(1)}`;
    isDrawing = isThere;
  }
  return path;
}

function Ends({ trace, r }: { trace: SmithTrace; r: number }) {
  const known = trace.points.filter((point): point is Reflection => point !== null);
  const ends = [known[0], known.at(-1)];
  if (!trace.ends) return null;
  return ends.map((point, i) => {
    if (!point) return null;
    const [x, y] = placeOf(point, r);
    const isRight = i === 1;
    return (
      <g key={i}>
        <circle cx={x} cy={y} r="3.2" fill="var(--ink)" />
        <text
          x={x + (isRight ? 7 : -7)}
          y={y + (isRight ? 4 : 13)}
          textAnchor={isRight ? "start" : "end"}
          className="figures"
        >
          {trace.ends?.[i]}
        </text>
      </g>
    );
  });
}

function Traces({ traces, steps, r }: Pick<SmithChartProps, "traces" | "steps"> & { r: number }) {
  return (
    <g fill="none">
      {traces.map((trace) => (
        <path
          key={trace.id}
          d={pathOf(trace.points, r)}
          stroke={seriesColour[trace.look]}
          strokeWidth="1.75"
          strokeDasharray={trace.look === 5 ? undefined : seriesDash[trace.look]}
          strokeLinejoin="round"
        />
      ))}
      {steps && <path d={pathOf(steps.points, r)} stroke="var(--ink)" strokeWidth="1.3" strokeDasharray="1.5 2.5" />}
    </g>
  );
}

/** Words at one of the steps, kept inside the frame. */
function StepNote({ steps, r, frame }: Pick<SmithChartProps, "steps"> & { r: number; frame: number }) {
  const at = steps?.note ? steps.points[steps.note.at] : undefined;
  if (!at || Math.hypot(at.re, at.im) * r > frame) return null;
  const [x, y] = placeOf(at, r);
  return (
    <text x={x} y={y < -frame + 26 ? y + 16 : y - 8} textAnchor="middle" className="key">
      {steps?.note?.words}
    </text>
  );
}

interface PlaneProps extends SmithChartProps {
  size: number;
  /** |Γ| at the frame */
  shown: number;
}

function Plane({ traces, steps, target, size, shown }: PlaneProps) {
  const clip = useId();
  const frame = size / 2 - 2;
  const r = frame / shown;
  const half = size / 2;
  return (
    <svg width={size} height={size} viewBox={`${-half} ${-half} ${size} ${size}`} className="max-w-full shrink-0">
      <defs>
        <clipPath id={clip}>
          <circle r={frame} />
        </clipPath>
      </defs>
      <g clipPath={`url(#${clip})`}>
        <SmithGrid r={r} edge={shown} />
        {target && (
          <circle
            r={target.magnitude * r}
            fill="var(--pass-wash)"
            fillOpacity="0.7"
            stroke="var(--pass)"
            strokeWidth="1.25"
          />
        )}
        <Traces traces={traces} steps={steps} r={r} />
      </g>
      <circle r={frame} fill="none" stroke="var(--ink)" strokeWidth="1.5" />
      <StepNote steps={steps} r={r} frame={frame} />
      {traces.map((trace) => (
        <Ends key={trace.id} trace={trace} r={r} />
      ))}
    </svg>
  );
}

/** Reflections in the plane: the centre enlarged, with a switch to the whole chart. */
export function SmithChart(props: SmithChartProps) {
  const { traces, steps, target, edge, size = 266 } = props;
  const [isFull, setFull] = useState(false);
  const drawn = [...traces.flatMap((trace) => trace.points), ...(steps?.points ?? [])];
  const fitted = edge ?? fittingEdge(drawn, target?.magnitude);
  const shown = isFull ? 1 : fitted;
  return (
    <div className="flex flex-wrap items-start gap-x-4 gap-y-2">
      <Plane {...props} size={size} shown={shown} />
      <SmithKey {...{ traces, steps, target, shown, isFull, fitted }} onToggle={() => setFull(!isFull)} />
    </div>
  );
}
