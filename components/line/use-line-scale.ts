"use client";

import { endRoomPx, scaleOfPieces, type StripPiece } from "@/components/line/strip-piece";
import type { LineScale } from "@/components/line/line-scale";
import { useMeasuredWidth } from "@/components/plot/measured-width";

/** The scale that a strip and everything under it share. Give `ref` to the element that holds them all. */
export function useLineScale(pieces: readonly StripPiece[]) {
  const { ref, width } = useMeasuredWidth(1384);
  const scale: LineScale = scaleOfPieces(
    pieces,
    endRoomPx.before,
    Math.max(endRoomPx.before + 120, width - endRoomPx.after),
  );
  return { ref, width, scale };
}
