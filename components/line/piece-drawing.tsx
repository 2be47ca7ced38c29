import { CableLengthwise, thickness } from "@/components/line/cable-lengthwise";
import type { DrawnCable } from "@/components/line/cable-shape";
import type { Place } from "@/components/line/line-scale";
import { material } from "@/components/line/materials";
import { isLaid, type StripPiece } from "@/components/line/strip-piece";
import { Box, BreakMark, Joint, Plate, SeriesPart, ShuntPart, Tee, Transformer } from "@/components/line/symbols";

interface PieceProps {
  piece: StripPiece;
  place: Place;
  /** of the line's axis */
  y: number;
  mmToPx: number;
  /** half the thickness of the cables beside it, px; a hole of that size is cut for what hangs between them */
  besideHalf?: number;
}

const unknownCable: DrawnCable = { construction: null, build: null, outerDiameterMm: null };
/** px that a stub hangs down; not to scale, its length is written beside it */
export const stubDropPx = 34;

function Group({ piece, place, y, mmToPx }: PieceProps) {
  const cable = piece.cable ?? unknownCable;
  const drawn = Math.min(3, Math.max(2, piece.count ?? 2));
  const thick = Math.min(16, thickness(cable, mmToPx));
  const half = (drawn * (thick + 3)) / 2 + 2;
  const fit = (mmToPx * thick) / thickness(cable, mmToPx);
  return (
    <g>
      {Array.from({ length: drawn }, (_, i) => (
        <CableLengthwise
          key={i}
          {...cable}
          fromX={place.fromX + 4}
          toX={place.toX - 4}
          y={y + (i - (drawn - 1) / 2) * (thick + 3)}
          mmToPx={fit}
        />
      ))}
      <Plate x={place.fromX + 4} y={y} half={half} />
      <Plate x={place.toX - 4} y={y} half={half} />
    </g>
  );
}

function Stub({ piece, place, y, mmToPx }: PieceProps) {
  const x = (place.fromX + place.toX) / 2;
  const fit = Math.min(mmToPx, 2);
  return (
    <g>
      <g transform={`rotate(90 ${x} ${y})`}>
        <CableLengthwise {...(piece.cable ?? unknownCable)} fromX={x + 8} toX={x + stubDropPx} y={y} mmToPx={fit} />
      </g>
      {piece.end === "short" && <path d={`M${x - 10} ${y + stubDropPx}h20`} stroke="var(--ink)" strokeWidth="3" />}
      {piece.end === "load" && (
        <rect
          x={x - 5}
          y={y + stubDropPx}
          width="10"
          height="12"
          fill="var(--paper)"
          stroke="var(--ink)"
          strokeWidth="1.5"
        />
      )}
      <Tee x={x} y={y} isSeries={piece.connection === "series"} />
    </g>
  );
}

function Fault({ place, y, half }: { place: Place; y: number; half: number }) {
  const width = Math.max(8, place.toX - place.fromX);
  const at = { x: place.fromX, y: y - half, width, height: 2 * half };
  return (
    <g>
      <rect {...at} fill="var(--paper)" />
      <rect {...at} fill={material.hatchFail} stroke="var(--fail)" strokeWidth="1.6" />
    </g>
  );
}

/** Cable or cables between two places; with a break mark where they are drawn longer than to scale. */
function Laid({ piece, place, y, mmToPx }: PieceProps) {
  const cable = piece.cable ?? unknownCable;
  const isGroup = piece.kind === "parallel" || (piece.count ?? 1) > 1;
  return (
    <g>
      {isGroup ? (
        <Group piece={piece} place={place} y={y} mmToPx={mmToPx} />
      ) : (
        <CableLengthwise {...cable} fromX={place.fromX} toX={place.toX} y={y} mmToPx={mmToPx} />
      )}
      {place.isBroken && <BreakMark x={(place.fromX + place.toX) / 2} y={y} half={thickness(cable, mmToPx) / 2} />}
    </g>
  );
}

/** One piece on the line. */
export function PieceDrawing(props: PieceProps) {
  const { piece, place, y, mmToPx, besideHalf = 8 } = props;
  const x = (place.fromX + place.toX) / 2;
  const width = place.toX - place.fromX;
  if (piece.fault && piece.kind !== "joint" && piece.kind !== "stub")
    return <Fault place={place} y={y} half={piece.cable ? Math.max(10, thickness(piece.cable, mmToPx) / 2) : 13} />;
  switch (piece.kind) {
    case "cable":
    case "parallel":
      return <Laid {...props} />;
    case "joint":
      return <Joint x={x} y={y} half={Math.max(17, besideHalf + 4)} />;
    case "stub":
      return <Stub piece={piece} place={place} y={y} mmToPx={mmToPx} />;
    case "part":
      if (piece.connection === "shunt")
        return <ShuntPart x={x} y={y} part={piece.part ?? "capacitor"} half={besideHalf} />;
      return <SeriesPart x={x} y={y} part={piece.part ?? "coil"} reach={width / 2} />;
    case "shunt":
      return <ShuntPart x={x} y={y} part="resistor" half={besideHalf} />;
    case "pad":
      return <Box x={x} y={y} inside={piece.inside ?? ""} width={width} />;
    case "transformer":
      return <Transformer x={x} y={y} />;
  }
}

/** The outline of the selected piece. */
export function SelectedOutline({ piece, place, y, mmToPx }: PieceProps) {
  const half = Math.max(10, (piece.cable && isLaid(piece) ? thickness(piece.cable, mmToPx) / 2 : 14) + 5);
  const pad = isLaid(piece) ? 0 : 3;
  return (
    <rect
      x={place.fromX - pad}
      y={y - half}
      width={place.toX - place.fromX + 2 * pad}
      height={2 * half}
      fill="none"
      stroke="var(--copper)"
      strokeWidth="2"
    />
  );
}
