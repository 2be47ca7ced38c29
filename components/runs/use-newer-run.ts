"use client";

import { useRouter } from "next/navigation";
import { useEffect } from "react";
import { call } from "@/lib/http/call";
import type { Run } from "@/lib/runs/schema";

/**
 * Asks, once the page stands, whether the server has a newer version of the run than the page was made with: going back
 * shows a page as it was left. If so the page is made anew, and `openRun` of it comes with the next render.
 */
export function useNewerRun({ id, version }: Run): void {
  const router = useRouter();
  useEffect(() => {
    const stop = new AbortController();
    call<Run>(`/runs/${id}`, { signal: stop.signal }).then(
      (now) => now.version > version && router.refresh(),
      () => undefined,
    );
    return () => stop.abort();
    // Asked once for each page that was opened.
    // eslint-disable-next-line react-hooks/exhaustive-deps
  }, [id]);
}
