import type { AxisScale } from "@/components/plot/axes";
import { nearestIndex } from "@/components/plot/curve";
import { separate, seriesColour, type SweepSeries } from "@/components/plot/series";

/** A value somebody gave: a ring, or the short bar of a limit. */
export interface GivenPoint {
  x: number;
  y: number;
  shape: "ring" | "bar";
}

/** The frame of a plot of curves, px, and its scales. */
export interface CurveFrame {
  left: number;
  right: number;
  top: number;
  bottom: number;
  x: AxisScale;
  y: AxisScale;
}

interface Curves {
  /** ascending */
  xs: readonly number[];
  series: readonly SweepSeries[];
}

/** Whether a value has a place on the axis: a logarithmic one has none for what is not above 0. */
function hasPlace(frame: CurveFrame, value: number | null | undefined): value is number {
  return value != null && Number.isFinite(frame.y(value));
}

/** Names at the ends of the curves. */
export function Labels({ series, frame, xs }: Curves & { frame: CurveFrame }) {
  const last = nearestIndex(xs, frame.x.domain()[1] ?? 0);
  const named = series.filter(({ label, values }) => label !== "" && hasPlace(frame, values[last]));
  const within = (y: number) => Math.max(frame.top, Math.min(frame.bottom, y));
  const wishes = named.map(({ values }) => within(frame.y(values[last] ?? 0)));
  const places = separate(wishes, 13, frame.top + 4, frame.bottom);
  return named.map(({ id, label, look }, i) => (
    <text
      key={id}
      x={frame.right + 6}
      y={places[i]}
      dy="0.32em"
      style={{ fill: look === 5 ? "var(--ink-2)" : seriesColour[look], fontWeight: 600 }}
    >
      {label}
    </text>
  ));
}

/** What somebody gave: rings, and short bars for limits. */
export function Given({ points, frame }: { points: readonly GivenPoint[]; frame: CurveFrame }) {
  return points.map(({ x, y, shape }, i) =>
    shape === "ring" ? (
      <circle key={i} cx={frame.x(x)} cy={frame.y(y)} r="4" fill="var(--paper)" stroke="var(--ink)" strokeWidth="1.5" />
    ) : (
      <path key={i} d={`M${frame.x(x) - 6} ${frame.y(y)}h12`} stroke="var(--ink-2)" strokeWidth="1.5" />
    ),
  );
}

/** The chosen place: a dashed line, and a ring where the first curve passes it. */
export function Mark({ mark, xs, series, frame }: Curves & { mark: number; frame: CurveFrame }) {
  const [low = 0, high = 0] = frame.x.domain();
  if (!(mark >= low && mark <= high)) return null;
  const first = series[0];
  const at = nearestIndex(xs, mark);
  const value = first?.values[at];
  const x = frame.x(xs[at] ?? mark);
  return (
    <g>
      <path d={`M${frame.x(mark)} ${frame.top}V${frame.bottom}`} stroke="var(--ink-2)" strokeDasharray="2 2" />
      {first && hasPlace(frame, value) && (
        <circle
          cx={x}
          cy={frame.y(value)}
          r="3.4"
          fill="var(--paper)"
          stroke={seriesColour[first.look]}
          strokeWidth="1.6"
        />
      )}
    </g>
  );
}

/** A place on the x-axis with words. */
export function Limit({ limit, frame }: { limit: { x: number; label: string }; frame: CurveFrame }) {
  const [low = 0, high = 0] = frame.x.domain();
  if (!(limit.x > low && limit.x < high)) return null;
  const x = frame.x(limit.x);
  return (
    <g>
      <path d={`M${x} ${frame.top}V${frame.bottom}`} stroke="var(--ink-2)" />
      <text x={x - 4} y={frame.bottom - 6} textAnchor="end">
        {limit.label}
      </text>
    </g>
  );
}

/** Words above the first curve at a place, to its left: a rising curve leaves room there. */
export function Note({ note, xs, series, frame }: Curves & { note: { x: number; label: string }; frame: CurveFrame }) {
  const value = series[0]?.values[nearestIndex(xs, note.x)];
  if (!hasPlace(frame, value)) return null;
  return (
    <text x={frame.x(note.x) - 8} y={Math.max(frame.top + 12, frame.y(value) - 6)} textAnchor="end">
      {note.label}
    </text>
  );
}
