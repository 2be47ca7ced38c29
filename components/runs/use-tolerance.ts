"use client";

import { useEffect, useRef, useState } from "react";
import type { ToleranceRequest, ToleranceResult } from "@/lib/line/tolerance";
import type { ToleranceNews } from "@/lib/runs/tolerance-work";

export interface ToleranceAtWork {
  /** 0 to 1 while it draws, else null */
  progress: number | null;
  /** of the last request that was finished */
  result: ToleranceResult | null;
  /** why the last request cannot be worked out */
  trouble: string | null;
  /** Begins a request; one that is at work is given up. */
  start: (request: ToleranceRequest) => void;
  /** Gives up what is at work; the last result stays. */
  stop: () => void;
}

type Shown = Pick<ToleranceAtWork, "progress" | "result" | "trouble">;

/** What a piece of news changes. */
function after(shown: Shown, news: ToleranceNews): Shown {
  if ("progress" in news) return { ...shown, progress: news.progress };
  if ("result" in news) return { progress: null, result: news.result, trouble: null };
  return { ...shown, progress: null, trouble: news.refused };
}

const brokenOff = "The draws could not be finished in this browser.";

/** Tolerance worked out beside the page, with its progress; leaving the page ends it. */
export function useTolerance(): ToleranceAtWork {
  const [shown, setShown] = useState<Shown>({ progress: null, result: null, trouble: null });
  const worker = useRef<Worker | null>(null);
  const end = () => {
    worker.current?.terminate();
    worker.current = null;
  };
  useEffect(() => end, []);
  const hear = (from: Worker, news: ToleranceNews) => {
    if (worker.current !== from) return;
    if (!("progress" in news)) end();
    setShown((before) => after(before, news));
  };
  const start = (request: ToleranceRequest) => {
    end();
    const next = new Worker(new URL("./tolerance.worker.ts", import.meta.url), { type: "module" });
    worker.current = next;
    next.onmessage = ({ data }: MessageEvent<ToleranceNews>) => hear(next, data);
    next.onerror = () => hear(next, { refused: brokenOff });
    setShown((before) => ({ ...before, progress: 0, trouble: null }));
    next.postMessage(request);
  };
  const stop = () => {
    end();
    setShown((before) => ({ ...before, progress: null }));
  };
  return { ...shown, start, stop };
}
