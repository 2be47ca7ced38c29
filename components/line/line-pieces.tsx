import { thickness } from "@/components/line/cable-lengthwise";
import type { LineScale } from "@/components/line/line-scale";
import { PieceDrawing, SelectedOutline } from "@/components/line/piece-drawing";
import { isLaid, type StripPiece } from "@/components/line/strip-piece";

interface LinePiecesProps {
  pieces: readonly StripPiece[];
  scale: LineScale;
  selected: number | null;
  /** of the line's axis */
  y: number;
  mmToPx: number;
}

/** Half the thickness of the thicker cable next to a piece, px. */
function halfBeside(pieces: readonly StripPiece[], index: number, mmToPx: number): number {
  const near = [pieces.slice(0, index).findLast(isLaid), pieces.slice(index + 1).find(isLaid)];
  return Math.max(6, ...near.map((piece) => (piece?.cable ? thickness(piece.cable, mmToPx) / 2 : 0)));
}

/** All pieces of a line along x: cables first, then the outline of the selected one, then what stands over them. */
export function LinePieces({ pieces, scale, selected, y, mmToPx }: LinePiecesProps) {
  const drawing = (isOver: boolean) =>
    pieces.map((piece, index) => {
      const place = scale.places[index];
      if (!place || isLaid(piece) === isOver) return null;
      const besideHalf = halfBeside(pieces, index, mmToPx);
      return <PieceDrawing key={piece.id} {...{ piece, place, y, mmToPx, besideHalf }} />;
    });
  const chosen = selected === null ? undefined : pieces[selected];
  const place = selected === null ? undefined : scale.places[selected];
  // Parts alone do not reach the load; a wire does.
  const wireX = pieces.some(isLaid) ? scale.endX : Math.max(scale.startX, ...scale.places.map(({ toX }) => toX));
  return (
    <g>
      {pieces.length > 0 && <path d={`M${wireX} ${y}H${scale.endX}`} stroke="var(--ink)" strokeWidth="1.6" />}
      {drawing(false)}
      {chosen && place && <SelectedOutline piece={chosen} place={place} y={y} mmToPx={mmToPx} />}
      {drawing(true)}
    </g>
  );
}
