"use client";

import type { KeyboardEvent, PointerEvent } from "react";
import { useCursor, type CursorAxis } from "@/components/plot/cursor";

interface Span {
  fromPx: number;
  toPx: number;
  /** px of the drawing to a value of the axis */
  toValue: (px: number) => number;
  toPxOf: (value: number) => number;
  /** the drawing's own width, px; pointers are measured on the screen */
  width: number;
  isDown?: boolean;
}

/** Handlers for a drawing that sets and follows the shared cursor: pointer, and arrow keys while it has focus. */
export function usePlotPointer(axis: CursorAxis, { fromPx, toPx, toValue, toPxOf, width, isDown = false }: Span) {
  const cursor = useCursor(axis);
  const clamp = (px: number) => Math.max(fromPx, Math.min(toPx, px));
  return {
    cursor: cursor.value,
    handlers: {
      onPointerMove(event: PointerEvent<SVGSVGElement>) {
        const frame = event.currentTarget.getBoundingClientRect();
        const perPx = frame.width > 0 ? width / frame.width : 1;
        const px = isDown ? (event.clientY - frame.top) * perPx : (event.clientX - frame.left) * perPx;
        cursor.set(px >= fromPx - 4 && px <= toPx + 4 ? toValue(clamp(px)) : null);
      },
      onPointerLeave: () => cursor.set(null),
      onBlur: () => cursor.set(null),
      onKeyDown(event: KeyboardEvent) {
        const by =
          event.key === "ArrowRight" || event.key === "]" ? 1 : event.key === "ArrowLeft" || event.key === "[" ? -1 : 0;
        if (event.key === "Escape") cursor.set(null);
        if (by === 0) return;
        event.preventDefault();
        const at = cursor.value === null ? (by > 0 ? fromPx : toPx) : toPxOf(cursor.value);
        cursor.set(toValue(clamp(at + by * (event.shiftKey ? 40 : 4))));
      },
    },
  };
}
