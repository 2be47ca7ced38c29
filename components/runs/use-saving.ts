"use client";

import { useEffect, useRef, useState } from "react";
import { AwayError, call, ProblemError } from "@/lib/http/call";
import { changeBetween, draftOf, type RunDraft } from "@/lib/runs/edit";
import { hold, readHeld } from "@/lib/runs/held";
import type { Run } from "@/lib/runs/schema";

export type Saving =
  | { kind: "saved" }
  | { kind: "saving" }
  /** not saved; what to say about it */
  | { kind: "unsaved"; message: string; since: Date; draft: RunDraft; isAway: boolean }
  /** someone else saved first: both versions */
  | { kind: "conflict"; theirs: Run };

const pause = 700;
/** while the server is away it is asked again this often */
const awayPause = 10_000;

interface UseSaving {
  saved: Run;
  saving: Saving;
  /** there is something not yet sent */
  isChanged: boolean;
  /** save now, for example after trouble */
  retry: () => void;
  /** the server's run after a change that is not of the draft */
  replaceSaved: (run: Run) => void;
  /** end a conflict: mine over theirs, or theirs in place of mine */
  settle: (keep: "mine" | "theirs") => void;
}

interface Given {
  /** the run as the page opened it */
  opened: Run;
  /** what is on the screen */
  draft: RunDraft;
  /** false for readers, and while a field holds something that cannot be read */
  canSave: boolean;
  /** where changes are kept that the server does not have */
  key: string;
  /** puts another draft on the screen */
  take: (draft: RunDraft) => void;
}

/**
 * Saves a draft a moment after its last edit, one request at a time, each against the version it was made from, so that
 * two people never overwrite each other unseen. What is not saved is kept in the browser and sent later.
 */
export function useSaving({ opened, draft, canSave, key, take }: Given): UseSaving {
  const [saved, setSaved] = useState(opened);
  // What the server last took, as it was sent: how the server spells it back never counts as a change.
  const [sent, setSent] = useState(() => draftOf(opened));
  const [saving, setSaving] = useState<Saving>({ kind: "saved" });
  const [attempt, setAttempt] = useState(0);
  const isUnderWay = useRef(false);
  const change = changeBetween(sent, draft);
  const isChanged = Object.keys(change).length > 0;
  const isStuck = saving.kind === "conflict" || (saving.kind === "unsaved" && saving.draft === draft && attempt === 0);
  const isWaiting = canSave && isChanged && !isStuck;

  useEffect(() => {
    if (!isWaiting || isUnderWay.current) return;
    const timer = setTimeout(() => void save(), attempt > 0 ? 0 : pause);
    return () => clearTimeout(timer);

    async function save() {
      isUnderWay.current = true;
      setSaving({ kind: "saving" });
      try {
        const ifMatch = `"${saved.version}"`;
        setSaved(await call<Run>(`/runs/${saved.id}`, { method: "PATCH", body: change, ifMatch }));
        setSent(draft);
        setSaving({ kind: "saved" });
      } catch (error) {
        setSaving(trouble(error, draft));
      } finally {
        isUnderWay.current = false;
        setAttempt(0);
      }
    }
    // The draft and what it is compared with are the two things a save depends on.
    // eslint-disable-next-line react-hooks/exhaustive-deps
  }, [draft, sent, isWaiting, attempt]);

  useKept({ opened, key, take, onConflict: () => setSaving({ kind: "conflict", theirs: opened }) });
  useEffect(() => {
    if (canSave) hold(key, isChanged ? { draft, base: sent, version: saved.version } : null);
  }, [canSave, key, isChanged, draft, sent, saved.version]);
  useAskingAgain(saving.kind === "unsaved" && saving.isAway, () => setAttempt((n) => n + 1));
  useAskingBeforeLeaving(isChanged);

  function settle(keep: "mine" | "theirs") {
    if (saving.kind !== "conflict") return;
    const theirs = draftOf(saving.theirs);
    setSaved(saving.theirs);
    setSent(theirs);
    // Mine over theirs is what I changed and nothing else: what they changed elsewhere stays.
    take(keep === "mine" ? { ...theirs, ...change } : theirs);
    setSaving({ kind: "saved" });
  }
  return { saved, saving, isChanged, retry: () => setAttempt((n) => n + 1), settle, replaceSaved: setSaved };
}

/** Puts a change back on the screen that was kept when the page last closed; if the run has moved on, both versions are shown. */
function useKept({
  opened,
  key,
  take,
  onConflict,
}: Pick<Given, "opened" | "key" | "take"> & { onConflict: () => void }) {
  const isLookedAt = useRef(false);
  useEffect(() => {
    if (isLookedAt.current) return;
    isLookedAt.current = true;
    const held = readHeld(key);
    if (!held) return;
    const mine = { ...draftOf(opened), ...changeBetween(held.base, held.draft) };
    if (Object.keys(changeBetween(draftOf(opened), mine)).length === 0) return;
    take(mine);
    if (held.version !== opened.version) onConflict();
  });
}

function useAskingAgain(isAway: boolean, retry: () => void) {
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

function useAskingBeforeLeaving(isChanged: boolean) {
  useEffect(() => {
    if (!isChanged) return;
    const ask = (event: BeforeUnloadEvent) => event.preventDefault();
    window.addEventListener("beforeunload", ask);
    return () => window.removeEventListener("beforeunload", ask);
  }, [isChanged]);
}

function trouble(error: unknown, draft: RunDraft): Saving {
  const since = new Date();
  if (error instanceof ProblemError && error.problem.status === 412 && error.problem.current)
    return { kind: "conflict", theirs: error.problem.current as Run };
  if (error instanceof ProblemError) {
    const message = error.problem.errors?.[0]?.message ?? error.problem.detail;
    return { kind: "unsaved", message, since, draft, isAway: false };
  }
  const message = "Ropewalk cannot be reached. Your change is kept in this browser and sent when it can be.";
  if (error instanceof AwayError) return { kind: "unsaved", message, since, draft, isAway: true };
  throw error;
}
