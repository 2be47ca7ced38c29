"use client";

import { createContext, useContext, useMemo, useState, type ReactNode } from "react";

/** What a cursor runs along: distance along the line in metres, or frequency in hertz. */
export type CursorAxis = "distance" | "frequency";

interface Cursor {
  value: number | null;
  set: (value: number | null) => void;
}

const still: Cursor = { value: null, set: () => undefined };
const CursorContext = createContext<Record<CursorAxis, Cursor>>({ distance: still, frequency: still });

/** Everything inside shares one cursor per axis: what one plot points at, all of them read out. */
export function CursorProvider({ children }: { children: ReactNode }) {
  const [distance, setDistance] = useState<number | null>(null);
  const [frequency, setFrequency] = useState<number | null>(null);
  const cursors = useMemo(
    () => ({ distance: { value: distance, set: setDistance }, frequency: { value: frequency, set: setFrequency } }),
    [distance, frequency],
  );
  return <CursorContext value={cursors}>{children}</CursorContext>;
}

/** The shared cursor of an axis; stays empty outside a provider. */
export function useCursor(axis: CursorAxis): Cursor {
  return useContext(CursorContext)[axis];
}
