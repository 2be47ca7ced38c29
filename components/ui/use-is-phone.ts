"use client";

import { useSyncExternalStore } from "react";

/** The width below which the phone layouts stand; the same as the `phone` variant of the styles. */
const query = "(width <= 700px)";

function subscribe(listener: () => void): () => void {
  const list = window.matchMedia(query);
  list.addEventListener("change", listener);
  return () => list.removeEventListener("change", listener);
}

/**
 * Whether the phone layout is showing; null on the server and while the page wakes up, when both layouts are there and the
 * styles choose. For leaving out the costly one of two.
 */
export function useIsPhone(): boolean | null {
  return useSyncExternalStore(
    subscribe,
    () => window.matchMedia(query).matches,
    () => null,
  );
}
