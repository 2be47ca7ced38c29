"use client";

import { AxisX, axisScale } from "@/components/plot/axes";
import { seriesColour, type SeriesLook } from "@/components/plot/series";

export interface Dumbbell {
  id: string;
  label: string;
  look: SeriesLook;
  /** the filled end; both in the axis's quantity, not finite where there is no such figure */
  from: number;
  /** the ring */
  to: number;
}

interface DumbbellsProps {
  rows: readonly Dumbbell[];
  domain: readonly [number, number];
  /** what lies beyond it is hatched */
  limit: number;
  format: (value: number) => string;
  ticks?: number;
  width?: number;
}

const top = 4;
const rowHeight = 50;
/** Room at the left for a letter and for the figure of a row that begins there. */
const gutter = { left: 62, right: 14 };

/** Two ends of one quantity a row, on a common axis: as drawn, and as bad as it may be made. */
export function Dumbbells({ rows, domain, limit, format, ticks = 4, width = 286 }: DumbbellsProps) {
  const [fromX, toX] = [gutter.left, width - gutter.right];
  const bottom = top + rows.length * rowHeight + 8;
  const scale = axisScale("linear", domain, [fromX, toX]);
  const limitX = Math.min(toX, Math.max(fromX, scale(limit)));
  return (
    <svg viewBox={`0 0 ${width} ${bottom + 20}`} width="100%" aria-hidden="true" className="block max-w-100 text-note">
      <rect x={limitX} y={top} width={toX - limitX} height={bottom - top} fill="url(#rw-hatch-fail)" opacity="0.55" />
      <AxisX scale={scale} ticks={scale.ticks(ticks)} format={format} fromY={top} toY={bottom} />
      {limit >= domain[0] && limit <= domain[1] && (
        <path d={`M${limitX} ${top}V${bottom}`} stroke="var(--ink)" strokeWidth="1.75" />
      )}
      {rows.map((row, i) => (
        <Row key={row.id} row={row} y={top + (i + 0.5) * rowHeight} place={placeOn(scale, domain)} format={format} />
      ))}
    </svg>
  );
}

/** Where a value stands; what the axis does not reach stands at its end. */
function placeOn(scale: (value: number) => number, [low, high]: readonly [number, number]) {
  return (value: number) => {
    const isOver = !(value <= high);
    return { x: scale(isOver ? high : Math.max(low, value)), isOver };
  };
}

interface RowProps {
  row: Dumbbell;
  y: number;
  place: (value: number) => { x: number; isOver: boolean };
  format: (value: number) => string;
}

function Row({ row, y, place, format }: RowProps) {
  const [from, to] = [place(row.from), place(row.to)];
  const colour = seriesColour[row.look];
  const hasRoom = to.x < 232;
  return (
    <g>
      <text x="0" y={y} dy="0.36em" className="fill-ink font-[560]" style={{ fill: colour }}>
        {row.label}
      </text>
      <path d={`M${from.x} ${y}H${to.x}`} stroke={colour} strokeWidth="2.5" />
      {!from.isOver && <circle cx={from.x} cy={y} r="4.5" fill={colour} />}
      {to.isOver ? (
        <path d={`M${to.x - 6} ${y - 5}l6 5l-6 5`} fill="none" stroke={colour} strokeWidth="2" />
      ) : (
        <circle cx={to.x} cy={y} r="4.5" fill="var(--paper)" stroke={colour} strokeWidth="2" />
      )}
      <text x={from.x - 9} y={y} dy="0.36em" textAnchor="end" className="figures">
        {format(row.from)}
      </text>
      <text
        x={hasRoom ? to.x + 9 : to.x}
        y={hasRoom ? y : y - 14}
        dy="0.36em"
        textAnchor={hasRoom ? "start" : "end"}
        className="figures"
      >
        {format(row.to)}
      </text>
    </g>
  );
}
