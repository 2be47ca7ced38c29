"use client";

/** What the product draws over and under the curves of a sweep. Lives inside the chart, on the chart's own scales. */
import { usePlotArea, useYAxisScale, useXAxisScale } from "recharts";
import type { CursorAxis } from "@/components/plot/cursor";
import type { Values } from "@/components/plot/curve";
import { separate, seriesColour, type SweepSeries } from "@/components/plot/series";

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

/** Scales and frame of the chart around; null while it has none. */
export function usePlot() {
  const [area, xScale, yScale] = [usePlotArea(), useXAxisScale(), useYAxisScale()];
  if (!area || !xScale || !yScale) return null;
  const [left, top, right, bottom] = [area.x, area.y, area.x + area.width, area.y + area.height];
  const within = (value: number, low: number, high: number) => Math.max(low, Math.min(high, value));
  return {
    left,
    top,
    right,
    bottom,
    x: (value: number) => within(xScale(value) ?? left, left, right),
    y: (value: number) => within(yScale(value) ?? bottom, top, bottom),
  };
}

function limitEnds({
  limit,
  band,
  xDomain,
}: Pick<SweepOverlay, "limit" | "band"> & Pick<Domains, "xDomain">): [number, number] {
  return [limit?.from ?? band?.from ?? xDomain[0], limit?.to ?? band?.to ?? xDomain[1]];
}

/** Under the curves: the column of the target's band and the forbidden part of it. */
export function SweepTarget(props: SweepOverlay & Domains) {
  const plot = usePlot();
  const { band, limit } = props;
  if (!plot) return null;
  const [from, to] = limitEnds(props).map(plot.x) as [number, number];
  const limitY = limit ? plot.y(limit.value) : 0;
  return (
    <g>
      {band && (
        <rect
          x={plot.x(band.from)}
          y={plot.top}
          width={plot.x(band.to) - plot.x(band.from)}
          height={plot.bottom - plot.top}
          fill="var(--sailcloth)"
        />
      )}
      {limit && (
        <rect
          x={from}
          y={limit.forbidden === "below" ? limitY : plot.top}
          width={to - from}
          height={limit.forbidden === "below" ? plot.bottom - limitY : limitY - plot.top}
          fill="url(#rw-hatch-fail)"
          opacity="0.55"
        />
      )}
    </g>
  );
}

/** Over the curves: the limit with its figure, the worst point, a marked place. */
export function SweepLimit(props: SweepOverlay & Domains) {
  const plot = usePlot();
  const { band, limit, worst, mark, yDomain } = props;
  if (!plot) return null;
  const [from, to] = limitEnds(props).map(plot.x) as [number, number];
  const isWorstOff = worst !== undefined && (worst.y < yDomain[0] || worst.y > yDomain[1]);
  const isLeft = worst !== undefined && plot.x(worst.x) - plot.left > 60;
  return (
    <g>
      {band && (
        <text x={(plot.x(band.from) + plot.x(band.to)) / 2} y={plot.top + 13} textAnchor="middle">
          {band.label}
        </text>
      )}
      {mark !== undefined && (
        <path d={`M${plot.x(mark)} ${plot.top}V${plot.bottom}`} stroke="var(--ink-2)" strokeDasharray="2 3" />
      )}
      {limit && (
        <>
          <path d={`M${from} ${plot.y(limit.value)}H${to}`} stroke="var(--ink)" strokeWidth="1.75" />
          <text x={from + 5} y={plot.y(limit.value) + (limit.forbidden === "below" ? -5 : 14)} className="key">
            {limit.label}
          </text>
        </>
      )}
      {worst && (
        <>
          <circle
            cx={plot.x(worst.x)}
            cy={plot.y(worst.y)}
            r="4"
            fill="var(--paper)"
            stroke={seriesColour[worst.look ?? 1]}
            strokeWidth="2"
          />
          <text
            x={plot.x(worst.x) + (isLeft ? -8 : 8)}
            y={Math.min(plot.bottom - 4, plot.y(worst.y) + 12)}
            textAnchor={isLeft ? "end" : "start"}
            className="figures key"
          >
            {worst.label}
            {isWorstOff && " off scale"}
          </text>
        </>
      )}
    </g>
  );
}

/** Index of the last place inside the frame that has a value. */
function lastInside(xs: readonly number[], values: Values, to: number): number {
  for (let i = xs.length - 1; i >= 0; i--) if ((xs[i] ?? Infinity) <= to * (1 + 1e-9) && values[i] != null) return i;
  return -1;
}

/** The side on which a series leaves the frame furthest, and where. */
function offScale({ xs, xDomain, yDomain }: Domains, values: Values, side: "above" | "below"): number | null {
  let [worst, at] = [0, -1];
  values.forEach((value, i) => {
    const x = xs[i] ?? NaN;
    if (value == null || !(x >= xDomain[0] && x <= xDomain[1])) return;
    const over = side === "above" ? value - yDomain[1] : yDomain[0] - value;
    if (over > worst) [worst, at] = [over, i];
  });
  return at < 0 ? null : (xs[at] ?? null);
}

/** Names at the ends of the lines, the unit of the x-axis, and where a curve leaves the frame. */
export function SweepLabels({ xUnit, ...props }: SweepOverlay & Domains & { xUnit: string }) {
  const plot = usePlot();
  if (!plot) return null;
  const named = props.series.filter(({ values }) => lastInside(props.xs, values, props.xDomain[1]) >= 0);
  const wishes = named.map(({ values }) => plot.y(values[lastInside(props.xs, values, props.xDomain[1])] ?? 0));
  const places = separate(wishes, 13, plot.top + 4, plot.bottom + 8);
  const leaves = (["above", "below"] as const).map((side) => ({
    side,
    at: named.map(({ values }) => offScale(props, values, side)).find((x) => x !== null) ?? null,
  }));
  return (
    <g>
      {named.map(({ id, label, look }, i) => (
        <text
          key={id}
          x={plot.right + 6}
          y={places[i]}
          dy="0.32em"
          style={{ fill: look === 5 ? "var(--ink-2)" : seriesColour[look], fontWeight: 600 }}
        >
          {label}
        </text>
      ))}
      {leaves.map(({ side, at }) =>
        at === null ? null : (
          <text
            key={side}
            x={Math.max(plot.left + 30, Math.min(plot.right - 30, plot.x(at)))}
            textAnchor="middle"
            y={side === "above" ? plot.top - 4 : plot.bottom - 4}
            className="off-scale"
          >
            {side === "above" ? "↑" : "↓"} off scale
          </text>
        ),
      )}
      <text x={plot.right} y={plot.bottom + 30} textAnchor="end">
        {xUnit}
      </text>
    </g>
  );
}
