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
    const [x, y] = [point.re * r, -point.im * r];
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
  const y = -at.im * r;
  return (
    <text x={at.re * r} y={y < -frame + 26 ? y + 16 : y - 8} textAnchor="middle" className="key">
      {steps?.note?.words}
    </text>
  );
}

/** Reflections in the plane: the centre enlarged, with a switch to the whole chart. */
export function SmithChart({ traces, steps, target, edge, size = 266 }: SmithChartProps) {
  const clip = useId();
  const [isFull, setFull] = useState(false);
  const fitted =
    edge ?? fittingEdge([...traces.flatMap((trace) => trace.points), ...(steps?.points ?? [])], target?.magnitude);
  const shown = isFull ? 1 : fitted;
  const frame = size / 2 - 2;
  const r = frame / shown;
  return (
    <div className="flex flex-wrap items-start gap-x-4 gap-y-2">
      <svg
        width={size}
        height={size}
        viewBox={`${-size / 2} ${-size / 2} ${size} ${size}`}
        className="max-w-full shrink-0"
      >
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
      <SmithKey
        traces={traces}
        steps={steps}
        target={target}
        shown={shown}
        isFull={isFull}
        fitted={fitted}
        onToggle={() => setFull(!isFull)}
      />
    </div>
  );
}
