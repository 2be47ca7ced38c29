"use client";

import { useEffect, useRef } from "react";
import { call } from "@/lib/http/call";
import { changeBetween, type RunDraft } from "@/lib/runs/edit";
import { hold } from "@/lib/runs/held";
import type { Run } from "@/lib/runs/schema";

/** What the server has of a run: its version, and the draft it was last sent. */
export interface OnServer {
  version: number;
  sent: RunDraft;
}

interface Leaving {
  runId: string;
  /** where changes are kept that the server does not have */
  key: string;
  draft: RunDraft;
  canSave: boolean;
  onServer: OnServer;
  /** the save on its way, with what the server has after it; null where it failed */
  underWay: Promise<OnServer | null> | null;
}

/**
 * Sends what waits when one leaves the run for another page of the product, rather than when it is opened next. What
 * cannot be sent stays kept in the browser.
 */
export function useSendingOnLeave(
  leaving: Omit<Leaving, "underWay">,
  underWay: { current: Leaving["underWay"] },
): void {
  const latest = useRef(leaving);
  useEffect(() => {
    latest.current = leaving;
  });
  useEffect(() => () => void sendRest(latest, underWay), [underWay]);
}

async function sendRest(
  latest: { current: Omit<Leaving, "underWay"> },
  underWay: { current: Leaving["underWay"] },
): Promise<void> {
  const { runId, key, draft, canSave, onServer } = latest.current;
  const before = underWay.current ? await underWay.current : onServer;
  if (!canSave || !before) return;
  const body = changeBetween(before.sent, draft);
  try {
    if (Object.keys(body).length > 0)
      await call<Run>(`/runs/${runId}`, { method: "PATCH", body, ifMatch: `"${before.version}"` });
    hold(key, null);
  } catch {
    return;
  }
}
