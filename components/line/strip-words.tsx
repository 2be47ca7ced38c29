import { FigureText } from "@/components/line/figure-text";
import type { LineScale } from "@/components/line/line-scale";
import { SectionDrawing, sectionRadius } from "@/components/line/section-view";
import { figuresWidth, labelsAbove, labelsBelow, nameWidth } from "@/components/line/strip-labels";
import { endRoomPx, hangs, type StripEnd, type StripPiece } from "@/components/line/strip-piece";

interface WordsProps {
  pieces: readonly StripPiece[];
  scale: LineScale;
  selected: number | null;
  mmToPx: number;
  width: number;
}

const nameStyle = { fontSize: 13 };

function endWidth(end: StripEnd): number {
  return Math.max(nameWidth(end.label), figuresWidth(end.figures));
}

interface EndWordsProps {
  end: StripEnd;
  x: number;
  anchor: "start" | "end";
}

function EndWords({ end, x, anchor }: EndWordsProps) {
  return (
    <g>
      <text x={x} y="18" textAnchor={anchor} className="key" style={nameStyle}>
        {end.label}
      </text>
      <FigureText x={x} y={33} figures={end.figures ?? []} anchor={anchor} />
    </g>
  );
}

/** Names and figures of the cables, over the line, each beside its section; source and load at the edges. */
export function WordsAbove({ source, load, ...props }: WordsProps & { source: StripEnd; load: StripEnd }) {
  const { pieces, scale, selected, mmToPx, width } = props;
  const sourceX = Math.max(0, endRoomPx.before - 46);
  // Where the strip leaves room beside it, the ends' words stand next to their symbols.
  const isInset = scale.startX - endWidth(source) - 24 > sourceX && width - scale.endX - endWidth(load) > 40;
  const sectionPx = (piece: StripPiece) => (piece.cable ? 2 * sectionRadius(piece.cable, mmToPx) : 0);
  const from = Math.max(scale.startX, sourceX + endWidth(source) + 8);
  const to = Math.min(scale.endX + 20, width - endWidth(load) - 14);
  return (
    <g>
      <EndWords
        end={source}
        {...(isInset ? { x: scale.startX - 14, anchor: "end" } : { x: sourceX, anchor: "start" })}
      />
      <EndWords end={load} {...(isInset ? { x: scale.endX + 34, anchor: "start" } : { x: width, anchor: "end" })} />
      {labelsAbove(pieces, scale, selected, from, to, sectionPx).map(({ index, x }) => {
        const piece = pieces[index];
        if (!piece?.cable) return null;
        const radius = sectionPx(piece) / 2;
        const textX = x + 2 * radius + 7;
        return (
          <g key={piece.id}>
            <SectionDrawing x={x + radius} y={22} mmToPx={mmToPx} {...piece.cable} />
            <text x={textX} y="18" className="key" style={nameStyle}>
              {piece.label}
            </text>
            <FigureText x={textX} y={33} figures={piece.figures ?? []} />
          </g>
        );
      })}
    </g>
  );
}

/** Names of joints, stubs and parts, and what is wrong, under the line. */
export function WordsBelow({
  pieces,
  scale,
  selected,
  width,
  belowY,
  hangsTo,
}: Omit<WordsProps, "mmToPx"> & { belowY: number; hangsTo: number }) {
  return labelsBelow(pieces, scale, selected, 0, width).map((label) => {
    const piece = pieces[label.index];
    if (!piece) return null;
    const x = label.x + label.width / 2;
    const at = hangs(piece) ? hangsTo + 13 : belowY;
    return (
      <g key={piece.id}>
        <text
          x={x}
          y={at}
          textAnchor="middle"
          style={piece.fault ? { fill: "var(--fail)", fontWeight: 600 } : undefined}
        >
          {piece.fault ?? piece.label}
        </text>
        {!piece.fault && hangs(piece) && <FigureText x={x} y={at + 14} figures={piece.figures ?? []} anchor="middle" />}
      </g>
    );
  });
}
