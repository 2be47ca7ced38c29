"use client";

import { useRef, type KeyboardEvent } from "react";
import type { LineScale, Place } from "@/components/line/line-scale";
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

interface PieceButtonProps extends Pick<StripListProps, "band" | "isDown"> {
  piece: StripPiece;
  place: Place;
  name: string;
  isSelected: boolean;
  isInTabOrder: boolean;
  onPress: () => void;
  onKeyDown: (event: KeyboardEvent) => void;
}

function PieceButton({
  piece,
  place,
  name,
  band,
  isDown,
  isSelected,
  isInTabOrder,
  onPress,
  onKeyDown,
}: PieceButtonProps) {
  const size = Math.max(leastTarget, place.toX - place.fromX);
  const at = (place.fromX + place.toX - size) / 2;
  const along = isDown ? { top: at, height: size } : { left: at, width: size };
  const across = isDown ? { left: band.from, width: band.size } : { top: band.from, height: band.size };
  return (
    <button
      type="button"
      aria-pressed={isSelected}
      aria-label={name}
      tabIndex={isInTabOrder ? 0 : -1}
      onClick={onPress}
      onKeyDown={onKeyDown}
      className={`absolute rounded ${isLaid(piece) ? "z-[1]" : "z-[2]"}`}
      style={{ ...along, ...across }}
    />
  );
}

/** Which piece a key leads to from piece `index`; null for keys that lead nowhere. */
function keyTarget(key: string, index: number, count: number): number | null {
  const to = index + step(key);
  return to !== index && to >= 0 && to < count ? to : null;
}

/** The pieces as a list of buttons laid over the drawing: to press, to reach by arrow keys, to hear. */
export function StripList({ pieces, scale, name, band, isDown, selected, onSelect, onMove, onOpen }: StripListProps) {
  const list = useRef<HTMLOListElement>(null);
  function go(to: number) {
    onSelect(to);
    list.current?.querySelectorAll("button")[to]?.focus();
  }
  function press(event: KeyboardEvent, index: number) {
    const to = keyTarget(event.key, index, pieces.length);
    const opens = event.key === "Enter" && onOpen !== undefined;
    if (to === null && !opens) return;
    event.preventDefault();
    if (opens) onSelect(index);
    if (opens) onOpen(index);
    if (to !== null && event.altKey) onMove?.(index, to);
    if (to !== null && (onMove || !event.altKey)) go(to);
  }
  return (
    <ol ref={list} aria-label={name} className="absolute inset-0">
      {pieces.map((piece, index) => (
        <li key={piece.id}>
          <PieceButton
            {...{ piece, band, isDown }}
            place={scale.places[index] ?? { fromX: 0, toX: 0, isBroken: false }}
            name={`${index + 1} of ${pieces.length}, ${piece.spoken}${piece.fault ? `, ${piece.fault}` : ""}`}
            isSelected={index === selected}
            isInTabOrder={index === (selected ?? 0)}
            onPress={() => onSelect(index)}
            onKeyDown={(event) => press(event, index)}
          />
        </li>
      ))}
    </ol>
  );
}
