"use client";

import { useCallback, useState } from "react";

/**
 * The width of an element as it is laid out, px. Until the browser has measured it, `first`.
 * Give `ref` to the element.
 */
export function useMeasuredWidth(first: number): {
  ref: (element: Element | null) => (() => void) | undefined;
  width: number;
} {
  const [width, setWidth] = useState(first);
  const ref = useCallback((element: Element | null) => {
    if (!element || typeof ResizeObserver === "undefined") return undefined;
    const observer = new ResizeObserver(([entry]) => {
      if (entry && entry.contentRect.width > 0) setWidth(Math.round(entry.contentRect.width));
    });
    observer.observe(element);
    return () => observer.disconnect();
  }, []);
  return { ref, width };
}
