"use client";

import { useCallback, useEffect, useRef, useState } from "react";

interface Draft<T> {
  value: T;
  /** what has been handed on and may come back late, as text */
  sent: readonly string[];
}

const asText = (value: unknown) => JSON.stringify(value) ?? "";
const mostSent = 20;

/**
 * A value while it is being changed: shown at once, handed on when it has rested. What comes back from what was handed on
 * does not disturb the hand that is still moving; a value from elsewhere takes its place.
 * @param value - as it stands, plain data
 * @param commit - takes the new value
 * @param restMs - how long it has to rest
 */
export function useDraft<T>(value: T, commit: (value: T) => void, restMs = 120) {
  const [draft, setDraft] = useState<Draft<T> | null>(null);
  const [seen, setSeen] = useState(asText(value));
  const latest = useRef({ commit, timer: undefined as ReturnType<typeof setTimeout> | undefined });
  useEffect(() => {
    latest.current.commit = commit;
  });
  useEffect(() => {
    const kept = latest.current;
    return () => clearTimeout(kept.timer);
  }, []);

  const now = asText(value);
  if (now !== seen) {
    setSeen(now);
    const isOurs = draft?.sent.includes(now) && now !== asText(draft.value);
    if (draft && !isOurs) setDraft(null);
  }

  const hand = useCallback((next: T) => {
    clearTimeout(latest.current.timer);
    latest.current.timer = undefined;
    setDraft((before) => before && { ...before, sent: [...before.sent, asText(next)].slice(-mostSent) });
    latest.current.commit(next);
  }, []);
  const change = useCallback(
    (next: T) => {
      setDraft((before) => ({ value: next, sent: before?.sent ?? [] }));
      clearTimeout(latest.current.timer);
      latest.current.timer = setTimeout(() => hand(next), restMs);
    },
    [hand, restMs],
  );
  /** Hands on now what has not rested yet. */
  const settle = () => {
    if (draft && latest.current.timer !== undefined) hand(draft.value);
  };
  return { shown: draft ? draft.value : value, change, settle };
}
