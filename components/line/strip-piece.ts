/** What the strip draws: a run as pieces with words and sizes, made ready by the page. Knows no formula. */
import type { DrawnCable } from "@/components/line/cable-shape";
import { cableShape } from "@/components/line/cable-shape";
import { lineScale, type LineScale } from "@/components/line/line-scale";

export interface PieceFigure {
  digits: string;
  unit: string;
}

export interface StripPiece {
  /** stays with the piece when the run is edited */
  id: string;
  kind: "cable" | "joint" | "stub" | "part" | "pad" | "shunt" | "parallel" | "transformer";
  /** over a cable: its designation; under a joint or a stub: its name */
  label: string;
  /** after the label, small: length and delay of a cable, length and end of a stub */
  figures?: PieceFigure[];
  /** metres along the path of a cable or of cables in parallel; null where it is missing */
  lengthM?: number | null;
  /** what the piece is made of: cable, stub, parallel */
  cable?: DrawnCable;
  /** cables side by side, default 1 */
  count?: number;
  connection?: "shunt" | "series";
  /** far end of a stub, or what a shunt is */
  end?: "open" | "short" | "load";
  part?: "resistor" | "coil" | "capacitor";
  /** a few letters inside the drawing: "6.0 dB", "4 : 1" */
  inside?: string;
  /** what is wrong here, in two or three words */
  fault?: string;
  /** the piece in one sentence for a screen reader, units spelt out */
  spoken: string;
}

/** What stands at an end of the line. */
export interface StripEnd {
  kind: "generator" | "antenna" | "resistor" | "open" | "short";
  label: string;
  figures?: PieceFigure[];
}

const symbolPx: Record<StripPiece["kind"], number> = {
  cable: 0,
  parallel: 0,
  joint: 7,
  stub: 14,
  part: 58,
  pad: 62,
  shunt: 20,
  transformer: 44,
};

/** px a piece without length takes on the strip. */
export function symbolWidth(piece: StripPiece): number {
  return piece.kind === "part" && piece.connection === "shunt" ? 22 : symbolPx[piece.kind];
}

/** A piece that lies along the path and takes length. */
export function isLaid(piece: StripPiece): boolean {
  return piece.kind === "cable" || piece.kind === "parallel";
}

/** Room at the ends of the strip for source and load, px. */
export const endRoomPx = { before: 68, after: 82 };

/** The scale of a run across a width of `width` px, or down a height. */
export function scaleOfPieces(pieces: readonly StripPiece[], from: number, to: number): LineScale {
  return lineScale(
    pieces.map((piece) =>
      isLaid(piece) ? { lengthM: piece.lengthM ?? null, symbolPx: 0 } : { symbolPx: symbolWidth(piece) },
    ),
    from,
    to,
  );
}

const usualMmToPx = 2.7;
const thickestPx = 40;

/** One scale for all thicknesses of a strip, px per millimetre: the thickest cable fits. */
export function thicknessScale(pieces: readonly StripPiece[]): number {
  const outer = pieces.map((piece) =>
    piece.cable ? (cableShape(piece.cable)?.outerMm ?? piece.cable.outerDiameterMm ?? 0) : 0,
  );
  return Math.min(usualMmToPx, thickestPx / Math.max(1, ...outer));
}

/** What hangs under the line takes room there. */
export function hangs(piece: StripPiece): boolean {
  return piece.kind === "stub" || piece.kind === "shunt" || (piece.kind === "part" && piece.connection === "shunt");
}
