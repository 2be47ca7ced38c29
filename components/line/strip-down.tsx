"use client";

import type { ReactNode } from "react";
import { LoadBelow, SourceAbove } from "@/components/line/end-symbols";
import { FigureText } from "@/components/line/figure-text";
import { LinePieces } from "@/components/line/line-pieces";
import type { LineScale } from "@/components/line/line-scale";
import { rulerMarks } from "@/components/line/ruler";
import { SectionDrawing } from "@/components/line/section-view";
import { StripList, type StripActions } from "@/components/line/strip-list";
import { spread } from "@/components/line/strip-labels";
import { isLaid, thicknessScale, type StripEnd, type StripPiece } from "@/components/line/strip-piece";
import { digits } from "@/lib/format/quantity";

export interface StripDownProps extends StripActions {
  pieces: readonly StripPiece[];
  source: StripEnd;
  load: StripEnd;
  /** from `scaleOfPieces(pieces, stripDownRoom.above, height - stripDownRoom.below)` */
  scale: LineScale;
  width: number;
  height: number;
  /** drawn on the same distances, between `stripDownRoom.plotFromX` and `plotToX` */
  children?: ReactNode;
}

/** Where things stand on a line that runs down a phone, px. */
export const stripDownRoom = { above: 50, below: 64, axisX: 48, rulerX: 20, plotFromX: 92, plotToX: 213, wordsX: 246 };

const { axisX, rulerX, wordsX } = stripDownRoom;

function RulerDown({ scale }: { scale: LineScale }) {
  return (
    <g>
      <path d={`M${rulerX} ${scale.startX}V${scale.endX}`} stroke="var(--rule)" />
      {rulerMarks(scale, 60).map(({ m, isMajor }) => (
        <g key={m}>
          <path d={`M${rulerX} ${scale.x(m).toFixed(1)}h${isMajor ? -7 : -4}`} stroke="var(--rule)" />
          {isMajor && (
            <text x={rulerX - 10} y={scale.x(m)} dy="0.36em" textAnchor="end" className="figures">
              {digits(m, m % 1 === 0 ? 0 : 1)}
            </text>
          )}
        </g>
      ))}
      <text x={rulerX - 10} y={scale.endX + 14} textAnchor="end">
        m
      </text>
    </g>
  );
}

const gapPx = 8;

/** Words beside the line, each near its piece. */
function WordsDown({ pieces, scale, selected }: Pick<StripDownProps, "pieces" | "scale" | "selected">) {
  const mmToPx = Math.min(2, thicknessScale(pieces));
  const wishes = pieces.map((piece, index) => {
    const place = scale.places[index] ?? { fromX: 0, toX: 0 };
    const size = isLaid(piece) && !piece.fault ? 32 : 16;
    const rank = index === selected ? -Infinity : isLaid(piece) ? place.fromX - place.toX : 0;
    return { index, x: place.fromX - 2, width: size, rank };
  });
  return spread(wishes, scale.startX, scale.endX + 12, gapPx).map(({ index, x: y }) => {
    const piece = pieces[index];
    if (!piece) return null;
    const words = piece.fault ? `${piece.label}: ${piece.fault}` : piece.label;
    if (!isLaid(piece) || piece.fault)
      return (
        <text
          key={piece.id}
          x={wordsX + 26}
          y={y + 13}
          style={piece.fault ? { fill: "var(--fail)", fontWeight: 600 } : undefined}
        >
          {words}
        </text>
      );
    return (
      <g key={piece.id}>
        {piece.cable && <SectionDrawing x={wordsX + 10} y={y + 13} mmToPx={Math.min(mmToPx, 1.9)} {...piece.cable} />}
        <text x={wordsX + 26} y={y + 13} className="key" style={{ fontSize: 13 }}>
          {words}
        </text>
        <FigureText x={wordsX + 26} y={y + 28} figures={piece.figures ?? []} />
      </g>
    );
  });
}

/** From what stands at a place to its words. */
function Leaders({ pieces, scale }: Pick<StripDownProps, "pieces" | "scale">) {
  return pieces.map((piece, index) => {
    const place = scale.places[index];
    if (isLaid(piece) || !place) return null;
    const d = `M${axisX + 26} ${(place.fromX + place.toX) / 2}H${wordsX + 22}`;
    return <path key={piece.id} d={d} stroke="var(--rule)" strokeDasharray="2 3" />;
  });
}

/** Source over the line, load under it, and their words. */
function Ends({ source, load, scale, width }: Pick<StripDownProps, "source" | "load" | "scale" | "width">) {
  const loadY = scale.endX + 36;
  return (
    <g>
      <SourceAbove x={axisX} y={scale.startX} />
      <LoadBelow x={axisX} y={scale.endX} kind={load.kind} />
      <text x={wordsX + 26} y="20" className="key" style={{ fontSize: 13 }}>
        {source.label}
      </text>
      <FigureText x={wordsX + 26} y={35} figures={source.figures ?? []} />
      <text x={wordsX} y={loadY} className="key" style={{ fontSize: 13 }}>
        {load.label}
      </text>
      <FigureText x={width} y={loadY} figures={load.figures ?? []} anchor="end" />
    </g>
  );
}

/** A run drawn down the page, for a phone: source at the top, distance downwards. */
export function StripDown({ pieces, source, load, scale, width, height, children, ...actions }: StripDownProps) {
  const { selected } = actions;
  const place = selected === null ? undefined : scale.places[selected];
  const line = { pieces, scale, selected, y: 0, mmToPx: thicknessScale(pieces) * 1.1 };
  return (
    <div className="relative overflow-x-clip" style={{ height }}>
      <svg
        width="100%"
        height={height}
        viewBox={`0 0 ${width} ${height}`}
        preserveAspectRatio="xMinYMin meet"
        aria-hidden="true"
        className="block overflow-visible"
      >
        {place && (
          <rect x="0" y={place.fromX} width={width} height={place.toX - place.fromX} fill="var(--copper-wash)" />
        )}
        <RulerDown scale={scale} />
        {children}
        <Leaders pieces={pieces} scale={scale} />
        <g transform={`translate(${axisX} 0) rotate(90)`}>
          <LinePieces {...line} />
        </g>
        <Ends source={source} load={load} scale={scale} width={width} />
        <WordsDown pieces={pieces} scale={scale} selected={selected} />
      </svg>
      <StripList
        {...{ ...actions, pieces, scale }}
        isDown
        name={`The line from ${source.label} to ${load.label}`}
        band={{ from: 0, size: 88 }}
      />
    </div>
  );
}
