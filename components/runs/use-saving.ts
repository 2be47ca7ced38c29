"use client";

import { useEffect, useRef, useState } from "react";
import { useSendingOnLeave, type OnServer } from "@/components/runs/use-sending-on-leave";
import { useAskingAgain } from "@/components/ui/use-asking-again";
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
  /** puts another draft on the screen, as an edit that can be undone */
  take: (draft: RunDraft) => void;
  /** puts a newer run in place of the one that was opened, with nothing to undo */
  restart: (draft: RunDraft) => void;
}

/**
 * Saves a draft a moment after its last edit, one request at a time, each against the version it was made from, so that
 * two people never overwrite each other unseen. What is not saved is kept in the browser and sent later.
 */
export function useSaving({ opened, draft, canSave, key, take, restart }: Given): UseSaving {
  const [saved, setSaved] = useState(opened);
  // What the server last took, as it was sent: how the server spells it back never counts as a change.
  const [sent, setSent] = useState(() => draftOf(opened));
  const [saving, setSaving] = useState<Saving>({ kind: "saved" });
  const [attempt, setAttempt] = useState(0);
  const underWay = useRef<Promise<OnServer | null> | null>(null);
  const change = changeBetween(sent, draft);
  const isChanged = Object.keys(change).length > 0;
  const isStuck = saving.kind === "conflict" || (saving.kind === "unsaved" && saving.draft === draft && attempt === 0);
  const isWaiting = canSave && isChanged && !isStuck;

  useEffect(() => {
    if (!isWaiting || underWay.current) return;
    const timer = setTimeout(
      () => {
        underWay.current = save();
      },
      attempt > 0 ? 0 : pause,
    );
    return () => clearTimeout(timer);

    async function save(): Promise<OnServer | null> {
      setSaving({ kind: "saving" });
      try {
        const now = await saveChange(saved, change, draft);
        setSaved(now);
        setSent(draft);
        setSaving({ kind: "saved" });
        return { version: now.version, sent: draft };
      } catch (error) {
        setSaving(trouble(error, draft));
        return null;
      } finally {
        underWay.current = null;
        setAttempt(0);
      }
    }
    // The draft and what it is compared with are the two things a save depends on.
    // eslint-disable-next-line react-hooks/exhaustive-deps
  }, [draft, sent, isWaiting, attempt]);

  if (opened.version > saved.version && !isChanged && saving.kind === "saved") {
    // The page was made anew with what others, or another tab, have saved since.
    const newer = draftOf(opened);
    setSaved(opened);
    setSent(newer);
    restart(newer);
  }
  useKept({ opened, key, take, onConflict: () => setSaving({ kind: "conflict", theirs: opened }) });
  useSendingOnLeave(
    { runId: saved.id, key, draft, canSave: isWaiting, onServer: { version: saved.version, sent } },
    underWay,
  );
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

function useAskingBeforeLeaving(isChanged: boolean) {
  useEffect(() => {
    if (!isChanged) return;
    const ask = (event: BeforeUnloadEvent) => event.preventDefault();
    window.addEventListener("beforeunload", ask);
    return () => window.removeEventListener("beforeunload", ask);
  }, [isChanged]);
}

/** Sends a change. Where the answer to an earlier try was lost, the server may have it already: that is as good. */
async function saveChange(saved: Run, body: Partial<RunDraft>, draft: RunDraft): Promise<Run> {
  try {
    return await call<Run>(`/runs/${saved.id}`, { method: "PATCH", body, ifMatch: `"${saved.version}"` });
  } catch (error) {
    const current = error instanceof ProblemError ? (error.problem.current as Run | undefined) : undefined;
    if (current && Object.keys(changeBetween(draftOf(current), draft)).length === 0) return current;
    throw error;
  }
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
