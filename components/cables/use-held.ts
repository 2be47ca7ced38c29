"use client";

import { useQueries } from "@tanstack/react-query";
import { useState } from "react";
import type { ChangeAsked } from "@/components/cables/use-catalogue-address";
import { mostHeld } from "@/lib/cables/address";
import type { Cable } from "@/lib/cables/schema";
import { call } from "@/lib/http/call";

/** A cable that is held up: on its way, there, or not to be had. */
export interface HeldCable {
  id: string;
  cable: Cable | undefined;
  /** why it cannot be shown */
  trouble: string | undefined;
}

/** The cables held up to compare. Their ids stand in the address; a fifth waits until one has been put back. */
export function useHeld(ids: readonly string[], change: ChangeAsked) {
  const [waiting, setWaiting] = useState<{ id: string; designation: string } | null>(null);
  const answers = useQueries({
    queries: ids.map((id) => ({
      queryKey: ["cable", id],
      queryFn: ({ signal }: { signal: AbortSignal }) => call<Cable>(`/cables/${encodeURIComponent(id)}`, { signal }),
    })),
  });
  const held: HeldCable[] = ids.map((id, i) => ({
    id,
    cable: answers[i]?.data,
    trouble: answers[i]?.error?.message,
  }));
  return {
    held,
    waiting,
    putBack: (id: string) => change((now) => ({ held: now.held.filter((other) => other !== id) })),
    toggle: (item: { id: string; designation: string }) =>
      change(({ held: now }) => {
        if (now.includes(item.id)) return { held: now.filter((id) => id !== item.id) };
        if (now.length < mostHeld) return { held: [...now, item.id] };
        setWaiting(item);
        return {};
      }),
    /** Hangs the waiting cable in the place of another, or lets it go. */
    exchange: (id: string | null) => {
      if (waiting && id !== null)
        change((now) => ({ held: now.held.map((other) => (other === id ? waiting.id : other)) }));
      setWaiting(null);
    },
  };
}
