"use client";

import { useCallback, useEffect, useRef, useState } from "react";
import { rowsInSight, type InSight } from "@/components/cables/row-window";
import { useMedia } from "@/components/ui/use-media";

const rowPx = { desk: 52, phone: 84 };

/** Height of a row of the catalogue, px: the same for all, whatever stands in it. */
export function useRowHeight(): number {
  return useMedia("phone") ? rowPx.phone : rowPx.desk;
}

/** How many rows before the last one the next page is asked for. */
const ahead = 30;

/**
 * The rows of a list in sight of the page's own scrolling. Give `ref` to the element that holds the rows.
 * @param count - how many rows there are so far
 * @param onEnd - asks for more: the last of them are near
 */
export function useRowWindow(
  rowHeight: number,
  count: number,
  onEnd: () => void,
): { ref: (element: Element | null) => void; inSight: InSight } {
  const [inSight, setInSight] = useState<InSight>({ from: 0, to: 25 });
  const list = useRef<Element | null>(null);
  const look = useCallback(() => {
    if (!list.current) return;
    const top = -list.current.getBoundingClientRect().top;
    const next = rowsInSight(top, window.innerHeight, rowHeight);
    setInSight((before) => (before.from === next.from && before.to === next.to ? before : next));
  }, [rowHeight]);
  useEffect(() => {
    look();
    window.addEventListener("scroll", look, { passive: true });
    window.addEventListener("resize", look);
    return () => {
      window.removeEventListener("scroll", look);
      window.removeEventListener("resize", look);
    };
  }, [look]);
  const end = useRef(onEnd);
  useEffect(() => {
    end.current = onEnd;
  });
  const isNearEnd = inSight.to >= count - ahead;
  useEffect(() => {
    if (isNearEnd) end.current();
  }, [isNearEnd, count]);
  const ref = useCallback(
    (element: Element | null) => {
      list.current = element;
      look();
    },
    [look],
  );
  return { ref, inSight };
}
