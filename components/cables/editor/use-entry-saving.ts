"use client";

import { useEffect, useRef, useState } from "react";
import { useAskingAgain } from "@/components/ui/use-asking-again";
import { changeBetween, type Edited } from "@/lib/cables/editor/entry-draft";
import { holdEntry, readHeldEntry } from "@/lib/cables/editor/held-entry";
import { currentOf, draftOf, refusalWords, saveEntry } from "@/lib/cables/editor/send-entry";
import { startTexts } from "@/lib/cables/editor/start-texts";
import type { EntryTexts } from "@/lib/cables/editor/texts";
import { laidOver } from "@/lib/cables/editor/versions";
import type { CableRevision } from "@/lib/cables/revisions/schema";
import { AwayError } from "@/lib/http/call";

export type SaveState =
  /** nothing typed that is not kept where it belongs; `isBrowserOnly` where the server has no entry yet */
  | { kind: "saved"; isBrowserOnly: boolean }
  | { kind: "waiting" }
  | { kind: "saving" }
  | { kind: "trouble"; message: string; since: Date; isAway: boolean; texts: EntryTexts }
  /** somebody else changed the draft: both versions */
  | { kind: "conflict"; theirs: CableRevision };

export interface EntrySaving {
  /** as the server has it; null for an entry that is not there yet */
  saved: CableRevision | null;
  state: SaveState;
  retry: () => void;
  settle: (keep: "mine" | "theirs") => void;
  /** what the fields were made from */
  base: EntryTexts;
  /** sends what waits; the revision as it then stands, or null where that failed */
  flush: () => Promise<CableRevision | null>;
  forget: () => void;
}

interface Given {
  opened: CableRevision | null;
  start: EntryTexts;
  texts: EntryTexts;
  /** of exactly these texts */
  edited: Edited;
  isBehind: boolean;
  key: string;
  take: (texts: EntryTexts) => void;
}

const restMs = 900;
const isSame = (a: EntryTexts, b: EntryTexts) => JSON.stringify(a) === JSON.stringify(b);

/**
 * Saves the draft a moment after the last key, one request at a time, each against the version it was made from. What the
 * server does not have, an entry that is not complete enough to be sent included, is kept in the browser.
 */
export function useEntrySaving({ opened, start, texts, edited, isBehind, key, take }: Given): EntrySaving {
  const [saved, setSaved] = useState(opened);
  const [base, setBase] = useState(start);
  const [state, setState] = useState<SaveState>({ kind: "saved", isBrowserOnly: opened === null });
  const [attempt, setAttempt] = useState(0);
  const underWay = useRef<Promise<CableRevision | null> | null>(null);
  const isChanged = !isSame(base, texts);
  const { draft, read } = edited;
  const isReadable = Object.keys(read.faults).length === 0 && draft !== null && !isBehind;
  const isStuck =
    state.kind === "conflict" || (state.kind === "trouble" && isSame(state.texts, texts) && attempt === 0);
  const isWaiting = saved !== null && isChanged && isReadable && !isStuck;

  async function save(): Promise<CableRevision | null> {
    if (!saved || !draft) return saved;
    const sent = texts;
    setState({ kind: "saving" });
    try {
      const change = changeBetween(draftOf(saved), draft);
      const now = Object.keys(change).length > 0 ? await saveEntry(saved, change, draft) : saved;
      setSaved(now);
      setBase(sent);
      setState({ kind: "saved", isBrowserOnly: false });
      return now;
    } catch (error) {
      const theirs = currentOf(error);
      const isAway = error instanceof AwayError;
      const message = isAway
        ? "Ropewalk cannot be reached. What you typed is kept in this browser and sent when it can be."
        : refusalWords(error);
      setState(
        theirs ? { kind: "conflict", theirs } : { kind: "trouble", message, since: new Date(), isAway, texts: sent },
      );
      return null;
    } finally {
      underWay.current = null;
      setAttempt(0);
    }
  }
  const latest = useRef(save);
  useEffect(() => {
    latest.current = save;
  });
  useEffect(() => {
    if (!isWaiting || underWay.current) return;
    const timer = setTimeout(() => (underWay.current = latest.current()), attempt > 0 ? 0 : restMs);
    return () => clearTimeout(timer);
  }, [texts, base, isWaiting, attempt]);

  useEffect(() => {
    holdEntry(key, isChanged ? { texts, base, version: saved?.version ?? 0 } : null);
  }, [key, isChanged, texts, base, saved?.version]);
  useHeldBefore({ opened, start, key, take, onConflict: (theirs) => setState({ kind: "conflict", theirs }), setBase });
  useAskingAgain(state.kind === "trouble" && state.isAway, () => setAttempt((n) => n + 1));

  function settle(keep: "mine" | "theirs") {
    if (state.kind !== "conflict") return;
    const { theirs } = state;
    const theirTexts = startTexts(theirs);
    setSaved(theirs);
    setBase(theirTexts);
    setState({ kind: "saved", isBrowserOnly: false });
    take(keep === "mine" ? laidOver(base, texts, theirTexts) : theirTexts);
  }
  return {
    saved,
    state: state.kind === "saved" && isChanged && saved !== null ? { kind: "waiting" } : state,
    retry: () => setAttempt((n) => n + 1),
    ...{ settle, base },
    flush: async () => {
      if (underWay.current) await underWay.current;
      return isChanged ? latest.current() : saved;
    },
    forget: () => holdEntry(key, null),
  };
}

interface Before extends Pick<Given, "opened" | "start" | "key" | "take"> {
  setBase: (base: EntryTexts) => void;
  onConflict: (theirs: CableRevision) => void;
}

/** Puts back what was typed when the page last closed; where the draft has moved on since, both versions are shown. */
function useHeldBefore({ opened, start, key, take, setBase, onConflict }: Before) {
  const isLookedAt = useRef(false);
  // Before what is on the screen is kept in its place.
  const [held] = useState(() => (typeof window === "undefined" ? null : readHeldEntry(key)));
  useEffect(() => {
    if (isLookedAt.current) return;
    isLookedAt.current = true;
    if (!held || isSame(held.texts, start)) return;
    take(held.texts);
    if (!opened || held.version === opened.version) return;
    setBase(held.base);
    onConflict(opened);
  });
}
