"use client";

import { thickness } from "@/components/line/cable-lengthwise";
import { LoadSymbol, SourceSymbol } from "@/components/line/end-symbols";
import { LinePieces } from "@/components/line/line-pieces";
import type { LineScale } from "@/components/line/line-scale";
import { stubDropPx } from "@/components/line/piece-drawing";
import { StripList, type StripActions } from "@/components/line/strip-list";
import { hangs, isLaid, thicknessScale, type StripEnd, type StripPiece } from "@/components/line/strip-piece";
import { WordsAbove, WordsBelow } from "@/components/line/strip-words";
import { useCursor } from "@/components/plot/cursor";

export interface StripProps extends StripActions {
  pieces: readonly StripPiece[];
  source: StripEnd;
  load: StripEnd;
  /** from `useLineScale` or `scaleOfPieces`; everything under the strip takes the same one */
  scale: LineScale;
  width: number;
}

/** y of the line's axis inside the strip, px. */
const axisY = 70;

function CursorPlace({ scale, height }: { scale: LineScale; height: number }) {
  const { value } = useCursor("distance");
  if (value === null) return null;
  const x = scale.x(value);
  return <path d={`M${x} 46V${height}`} stroke="var(--ink)" strokeWidth="1" strokeDasharray="2 3" />;
}

/** The empty line: source and load with a dashed length between. */
function EmptyLine({ scale }: { scale: LineScale }) {
  return (
    <g>
      <rect
        x={scale.startX}
        y={axisY - 13}
        width={scale.endX - scale.startX}
        height="26"
        fill="none"
        stroke="var(--rule)"
        strokeWidth="1.4"
        strokeDasharray="5 5"
      />
      <text x={(scale.startX + scale.endX) / 2} y={axisY + 4} textAnchor="middle" style={{ fontSize: 12.5 }}>
        no cable yet
      </text>
    </g>
  );
}

/** y of the words under the line, of the ends of what hangs there, and of the foot, px. */
function heights(pieces: readonly StripPiece[], mmToPx: number) {
  const halves = pieces.map((piece) => (piece.cable && isLaid(piece) ? thickness(piece.cable, mmToPx) / 2 : 0));
  const belowY = axisY + Math.max(31, Math.max(0, ...halves) + 18);
  const hangsTo = axisY + stubDropPx + (pieces.some((piece) => piece.end === "load") ? 12 : 2);
  return { belowY, hangsTo, height: pieces.some(hangs) ? hangsTo + 34 : belowY + 13 };
}

/** A run as a strip drawn to scale from source to load. */
export function Strip({ pieces, source, load, scale, width, ...actions }: StripProps) {
  const mmToPx = thicknessScale(pieces);
  const { belowY, hangsTo, height } = heights(pieces, mmToPx);
  const place = actions.selected === null ? undefined : scale.places[actions.selected];
  const common = { pieces, scale, selected: actions.selected, width };
  return (
    <div className="relative" style={{ height }}>
      <svg
        width="100%"
        height={height}
        viewBox={`0 0 ${width} ${height}`}
        preserveAspectRatio="xMinYMin meet"
        aria-hidden="true"
        className="block overflow-visible"
      >
        {place && (
          <rect x={place.fromX} y="45" width={place.toX - place.fromX} height={height - 45} fill="var(--copper-wash)" />
        )}
        <SourceSymbol x={scale.startX} y={axisY} />
        {pieces.length === 0 && <EmptyLine scale={scale} />}
        <LinePieces pieces={pieces} scale={scale} selected={actions.selected} y={axisY} mmToPx={mmToPx} />
        <LoadSymbol x={scale.endX} y={axisY} kind={load.kind} />
        <WordsAbove {...common} mmToPx={mmToPx} source={source} load={load} />
        <WordsBelow {...common} belowY={belowY} hangsTo={hangsTo} />
        <CursorPlace scale={scale} height={height} />
      </svg>
      <StripList
        {...actions}
        pieces={pieces}
        scale={scale}
        name={`The line from ${source.label} to ${load.label}`}
        band={{ from: 45, size: height - 45 }}
      />
    </div>
  );
}
