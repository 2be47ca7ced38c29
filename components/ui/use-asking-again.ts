"use client";

import { useEffect, useRef } from "react";

/** While the server is away it is asked again this often. */
const awayPause = 10_000;

/** Tries again every ten seconds, and as soon as the browser is online, for as long as the server is away. */
export function useAskingAgain(isAway: boolean, retry: () => void): void {
  const again = useRef(retry);
  useEffect(() => {
    again.current = retry;
  });
  useEffect(() => {
    if (!isAway) return;
    const ask = () => again.current();
    const timer = setInterval(ask, awayPause);
    window.addEventListener("online", ask);
    return () => {
      clearInterval(timer);
      window.removeEventListener("online", ask);
    };
  }, [isAway]);
}
