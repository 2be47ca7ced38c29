"use client";

import { seriesColour } from "@/components/plot/series";
import { limitEnds, useFrame, type Domains, type Frame, type SweepOverlay } from "@/components/plot/sweep-frame";

type TargetProps = SweepOverlay & Domains;

/** Under the curves: the column of the target's band and the forbidden part of it. */
export function SweepTarget(props: TargetProps) {
  const frame = useFrame();
  const { band, limit } = props;
  if (!frame) return null;
  const { top, bottom } = frame;
  const [from, to] = limitEnds(props).map(frame.x) as [number, number];
  const limitY = limit ? frame.y(limit.value) : 0;
  const isBelow = limit?.forbidden === "below";
  const [y, height] = isBelow ? [limitY, bottom - limitY] : [top, limitY - top];
  return (
    <g>
      {band && (
        <rect
          x={frame.x(band.from)}
          y={top}
          width={frame.x(band.to) - frame.x(band.from)}
          height={bottom - top}
          fill="var(--sailcloth)"
        />
      )}
      {limit && <rect x={from} y={y} width={to - from} height={height} fill="url(#rw-hatch-fail)" opacity="0.55" />}
    </g>
  );
}

function Limit({ props, frame }: { props: TargetProps; frame: Frame }) {
  if (!props.limit) return null;
  const { value, forbidden, label } = props.limit;
  const [from, to] = limitEnds(props).map(frame.x) as [number, number];
  const y = frame.y(value);
  return (
    <g>
      <path d={`M${from} ${y}H${to}`} stroke="var(--ink)" strokeWidth="1.75" />
      <text x={from + 5} y={forbidden === "below" ? y - 5 : y + 14} className="key">
        {label}
      </text>
    </g>
  );
}

function Worst({ props: { worst, yDomain }, frame }: { props: TargetProps; frame: Frame }) {
  if (!worst) return null;
  const [x, y] = [frame.x(worst.x), frame.y(worst.y)];
  const isOff = worst.y < yDomain[0] || worst.y > yDomain[1];
  const isLeft = x - frame.left > 60;
  return (
    <g>
      <circle cx={x} cy={y} r="4" fill="var(--paper)" stroke={seriesColour[worst.look ?? 1]} strokeWidth="2" />
      <text
        x={isLeft ? x - 8 : x + 8}
        y={Math.min(frame.bottom - 4, y + 12)}
        textAnchor={isLeft ? "end" : "start"}
        className="figures key"
      >
        {worst.label}
        {isOff && " off scale"}
      </text>
    </g>
  );
}

/** Over the curves: the limit with its figure, the worst point, a marked place. */
export function SweepLimit(props: TargetProps) {
  const frame = useFrame();
  const { band, mark } = props;
  if (!frame) return null;
  return (
    <g>
      {mark !== undefined && (
        <path d={`M${frame.x(mark)} ${frame.top}V${frame.bottom}`} stroke="var(--ink-2)" strokeDasharray="2 3" />
      )}
      {band && (
        <text x={(frame.x(band.from) + frame.x(band.to)) / 2} y={frame.top + 13} textAnchor="middle">
          {band.label}
        </text>
      )}
      <Limit props={props} frame={frame} />
      <Worst props={props} frame={frame} />
    </g>
  );
}
