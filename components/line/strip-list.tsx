"use client";

import { useRef, type KeyboardEvent } from "react";
import type { LineScale } from "@/components/line/line-scale";
import { isLaid, type StripPiece } from "@/components/line/strip-piece";

export interface StripActions {
  selected: number | null;
  onSelect: (index: number | null) => void;
  /** moves a piece to another place in the order; without it pieces stay where they are */
  onMove?: (from: number, to: number) => void;
  /** opens the editor of the selected piece */
  onOpen?: (index: number) => void;
}

interface StripListProps extends StripActions {
  pieces: readonly StripPiece[];
  scale: LineScale;
  name: string;
  /** px of the band that can be pressed, across the line */
  band: { from: number; size: number };
  isDown?: boolean;
}

const leastTarget = 24;

/** Which way an arrow goes along the line; 0 for other keys. */
function step(key: string): number {
  if (key === "ArrowRight" || key === "ArrowDown") return 1;
  if (key === "ArrowLeft" || key === "ArrowUp") return -1;
  return 0;
}

/** The pieces as a list of buttons laid over the drawing: to press, to reach by arrow keys, to hear. */
export function StripList({
  pieces,
  scale,
  name,
  band,
  isDown = false,
  selected,
  onSelect,
  onMove,
  onOpen,
}: StripListProps) {
  const list = useRef<HTMLOListElement>(null);
  const focus = (index: number) => list.current?.querySelectorAll("button")[index]?.focus();

  function press(event: KeyboardEvent, index: number) {
    const by = step(event.key);
    const to = index + by;
    if (event.key === "Enter" && onOpen) {
      event.preventDefault();
      onSelect(index);
      onOpen(index);
    } else if (by !== 0 && to >= 0 && to < pieces.length) {
      event.preventDefault();
      if (event.altKey) onMove?.(index, to);
      if (!event.altKey || onMove) {
        onSelect(to);
        focus(to);
      }
    }
  }

  return (
    <ol ref={list} aria-label={name} className="absolute inset-0">
      {pieces.map((piece, index) => {
        const place = scale.places[index] ?? { fromX: 0, toX: 0 };
        const size = Math.max(leastTarget, place.toX - place.fromX);
        const at = (place.fromX + place.toX - size) / 2;
        const isOver = !isLaid(piece);
        return (
          <li key={piece.id}>
            <button
              type="button"
              aria-pressed={index === selected}
              aria-label={`${index + 1} of ${pieces.length}, ${piece.spoken}${piece.fault ? `, ${piece.fault}` : ""}`}
              tabIndex={index === (selected ?? 0) ? 0 : -1}
              onClick={() => onSelect(index)}
              onKeyDown={(event) => press(event, index)}
              className={`absolute rounded ${isOver ? "z-[2]" : "z-[1]"}`}
              style={
                isDown
                  ? { top: at, height: size, left: band.from, width: band.size }
                  : { left: at, width: size, top: band.from, height: band.size }
              }
            />
          </li>
        );
      })}
    </ol>
  );
}
