/** Where the words over and under the strip stand: near their piece, never over one another, left out where there is no room. */
import type { LineScale } from "@/components/line/line-scale";
import { hangs, symbolWidth, type PieceFigure, type StripPiece } from "@/components/line/strip-piece";

export interface PlacedLabel {
  index: number;
  /** left edge, px */
  x: number;
  width: number;
}

interface Wish extends PlacedLabel {
  /** the more, the sooner it gives way */
  rank: number;
}

/** Estimated widths: Commissioner at 13 px semibold, Spline Sans Mono and Commissioner at 11 px. */
export function nameWidth(text: string): number {
  return text.length * 7.1;
}

export function figuresWidth(figures: readonly PieceFigure[] = []): number {
  return figures.reduce((sum, { digits, unit }) => sum + digits.length * 6.5 + unit.length * 6.4 + 10, 0);
}

/** Moves wishes apart between two edges, dropping the last in rank until the rest fit. Order along the line is kept. */
export function spread(wishes: readonly Wish[], fromX: number, toX: number, gapPx = 14): PlacedLabel[] {
  const kept = [...wishes].sort((a, b) => a.x - b.x);
  const room = toX - fromX;
  const taken = () => kept.reduce((sum, wish) => sum + wish.width + gapPx, -gapPx);
  while (kept.length > 0 && taken() > room) {
    const worst = kept.reduce((w, wish) => (wish.rank > w.rank ? wish : w));
    kept.splice(kept.indexOf(worst), 1);
  }
  const placed = kept.map(({ index, x, width }) => ({ index, x: Math.max(fromX, x), width }));
  placed.forEach((label, i) => {
    const before = placed[i - 1];
    if (before) label.x = Math.max(label.x, before.x + before.width + gapPx);
  });
  let limit = toX;
  for (const label of placed.toReversed()) {
    label.x = Math.min(label.x, limit - label.width);
    limit = label.x - gapPx;
  }
  return placed;
}

/** Labels over the line: every cable that finds room; the longest and the selected first. */
export function labelsAbove(
  pieces: readonly StripPiece[],
  scale: LineScale,
  selected: number | null,
  fromX: number,
  toX: number,
  sectionPx: (piece: StripPiece) => number,
): PlacedLabel[] {
  const wishes = pieces.flatMap((piece, index) => {
    const place = scale.places[index];
    if (!place || !piece.cable || hangs(piece)) return [];
    const width = sectionPx(piece) + 7 + Math.max(nameWidth(piece.label), figuresWidth(piece.figures));
    const rank = index === selected ? -Infinity : -(place.toX - place.fromX);
    return [{ index, x: place.fromX + 1, width, rank }];
  });
  return spread(wishes, fromX, toX);
}

/** Labels under the line: joints, parts and pads in the upper row, what hangs in the lower one; those in the way are left out. */
export function labelsBelow(
  pieces: readonly StripPiece[],
  scale: LineScale,
  selected: number | null,
  fromX: number,
  toX: number,
): PlacedLabel[] {
  const order = pieces
    .map((piece, index) => ({ piece, index }))
    .filter(({ piece }) => piece.fault || !piece.cable || hangs(piece))
    .sort(
      (a, b) =>
        Number(b.index === selected) - Number(a.index === selected) ||
        Number(!!b.piece.fault) - Number(!!a.piece.fault),
    );
  const rows: Record<"upper" | "lower", { from: number; to: number }[]> = { upper: [], lower: [] };
  pieces.forEach((piece, index) => {
    const place = scale.places[index];
    if (place && hangs(piece)) rows.upper.push({ from: place.fromX, to: place.fromX + symbolWidth(piece) });
  });
  return order.flatMap(({ piece, index }) => {
    const place = scale.places[index];
    const text = piece.fault ?? piece.label;
    if (!place || !text) return [];
    const width = Math.max(text.length * 6, figuresWidth(piece.fault ? [] : piece.figures));
    const x = Math.max(fromX, Math.min(toX - width, (place.fromX + place.toX - width) / 2));
    const row = rows[hangs(piece) ? "lower" : "upper"];
    if (row.some(({ from, to }) => x < to + 8 && x + width > from - 8)) return [];
    row.push({ from: x, to: x + width });
    return [{ index, x, width }];
  });
}
