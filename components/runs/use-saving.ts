"use client";

import { useEffect, useRef, useState } from "react";
import { AwayError, call, ProblemError } from "@/lib/http/call";
import { changeBetween, draftOf, type RunDraft } from "@/lib/runs/edit";
import type { Run } from "@/lib/runs/schema";

export type Saving =
  | { kind: "saved" }
  | { kind: "saving" }
  /** not saved; what to say about it */
  | { kind: "unsaved"; message: string; since: Date }
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

/**
 * Saves a draft a moment after its last edit, one request at a time, each against the version it was made from, so that
 * two people never overwrite each other unseen.
 * @param opened - the run as the page opened it
 * @param draft - what is on the screen
 * @param canSave - false for readers, and while a field holds something that cannot be read
 * @param take - puts another version on the screen
 */
export function useSaving(opened: Run, draft: RunDraft, canSave: boolean, take: (run: Run) => void): UseSaving {
  const [saved, setSaved] = useState(opened);
  // What the server last took, as it was sent: how the server spells it back never counts as a change.
  const [sent, setSent] = useState(() => draftOf(opened));
  const [saving, setSaving] = useState<Saving>({ kind: "saved" });
  const [attempt, setAttempt] = useState(0);
  const isUnderWay = useRef(false);
  const change = changeBetween(sent, draft);
  const isChanged = Object.keys(change).length > 0;
  const isWaiting = canSave && isChanged && saving.kind !== "conflict" && (saving.kind !== "unsaved" || attempt > 0);

  useEffect(() => {
    if (!isWaiting || isUnderWay.current) return;
    const timer = setTimeout(() => void save(), attempt > 0 ? 0 : pause);
    return () => clearTimeout(timer);

    async function save() {
      isUnderWay.current = true;
      setSaving({ kind: "saving" });
      try {
        const run = await call<Run>(`/runs/${saved.id}`, {
          method: "PATCH",
          body: change,
          ifMatch: `"${saved.version}"`,
        });
        setSaved(run);
        setSent(draft);
        setSaving({ kind: "saved" });
      } catch (error) {
        setSaving(trouble(error));
      } finally {
        isUnderWay.current = false;
        setAttempt(0);
      }
    }
    // The draft and what it is compared with are the two things a save depends on.
    // eslint-disable-next-line react-hooks/exhaustive-deps
  }, [draft, sent, isWaiting, attempt]);

  useEffect(() => {
    if (!isChanged) return;
    const ask = (event: BeforeUnloadEvent) => event.preventDefault();
    window.addEventListener("beforeunload", ask);
    return () => window.removeEventListener("beforeunload", ask);
  }, [isChanged]);

  function settle(keep: "mine" | "theirs") {
    if (saving.kind !== "conflict") return;
    setSaved(saving.theirs);
    setSent(draftOf(saving.theirs));
    if (keep === "theirs") take(saving.theirs);
    setSaving({ kind: "saved" });
  }

  return { saved, saving, isChanged, retry: () => setAttempt((n) => n + 1), settle, replaceSaved: setSaved };
}

function trouble(error: unknown): Saving {
  const since = new Date();
  if (error instanceof ProblemError && error.problem.status === 412 && error.problem.current)
    return { kind: "conflict", theirs: error.problem.current as Run };
  if (error instanceof ProblemError) {
    const first = error.problem.errors?.[0]?.message;
    return { kind: "unsaved", message: first ?? error.problem.detail, since };
  }
  if (error instanceof AwayError)
    return { kind: "unsaved", message: "Ropewalk cannot be reached. Your change is kept here.", since };
  throw error;
}
