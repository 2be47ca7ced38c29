"use client";

import { useSyncExternalStore } from "react";

/** The widths at which the layout changes, as the stylesheet has them. */
export const media = { folded: "(width <= 1100px)", phone: "(width <= 700px)" } as const;

/** Whether the window is so narrow. On the server, and until the page has come to life, it is not: the stylesheet hides what is not meant. */
export function useMedia(which: keyof typeof media): boolean {
  return useSyncExternalStore(
    (listener) => {
      const query = window.matchMedia(media[which]);
      query.addEventListener("change", listener);
      return () => query.removeEventListener("change", listener);
    },
    () => window.matchMedia(media[which]).matches,
    () => false,
  );
}
