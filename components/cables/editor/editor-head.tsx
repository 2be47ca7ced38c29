"use client";

import type { Route } from "next";
import Link from "next/link";
import { useRouter } from "next/navigation";
import { useState } from "react";
import { useEntryForm } from "@/components/cables/editor/entry-form";
import { EntrySaveNote } from "@/components/cables/editor/save-note";
import { Button } from "@/components/ui/button";
import { Confirm } from "@/components/ui/confirm";
import { Field } from "@/components/ui/field";
import { StateNote } from "@/components/ui/state-mark";
import { createEntry, discardEntry, refusalWords, submitEntry } from "@/lib/cables/editor/send-entry";
import type { CableRevision } from "@/lib/cables/revisions/schema";

/** Why the entry cannot be sent as it is; false where it can. */
function useRefusal(): string | false {
  const { edited, saving } = useEntryForm();
  const { length } = Object.keys(edited.read.faults);
  if (length > 1) return `${length} fields cannot be read.`;
  if (length === 1) return edited.read.faults.designation ?? "One field cannot be read.";
  if (!edited.draft) return edited.worked.missing ?? "There is no model yet.";
  return saving.state.kind === "conflict" && "Somebody else changed this draft: say first which version stands.";
}

/** The entry on the server with all that has been typed: made where it is not there yet. */
function useStored(): () => Promise<CableRevision | null> {
  const { edited, saving } = useEntryForm();
  return async () => {
    if (saving.saved) return saving.flush();
    if (!edited.draft) return null;
    const made = await createEntry(edited.draft);
    saving.forget();
    return made;
  };
}

function useActions() {
  const { saving } = useEntryForm();
  const router = useRouter();
  const stored = useStored();
  const [trouble, setTrouble] = useState<string | null>(null);
  const [isBusy, setBusy] = useState(false);
  const [isLeaving, setLeaving] = useState(false);
  async function run(work: () => Promise<void>) {
    setTrouble(null);
    setBusy(true);
    try {
      await work();
    } catch (error) {
      setTrouble(refusalWords(error));
    } finally {
      setBusy(false);
    }
  }
  const entry = (id: string) => `/cables/${encodeURIComponent(id)}` as Route;
  return {
    ...{ trouble, isBusy, isLeaving, setLeaving },
    keep: () =>
      run(async () => {
        const made = await stored();
        if (made) router.replace(`${entry(made.id)}/edit` as Route);
      }),
    send: (note: string) =>
      run(async () => {
        const ready = await stored();
        if (!ready) throw new Error("It is not saved yet, so it was not sent. Look at what stands beside “Discard”.");
        const sent = await submitEntry(ready, note);
        router.push(entry(sent.id));
        router.refresh();
      }),
    discard: () =>
      run(async () => {
        setLeaving(false);
        if (saving.saved) await discardEntry(saving.saved.id);
        saving.forget();
        router.push("/cables");
        router.refresh();
      }),
  };
}

/** Title, where the work stands, and what can be done with it. */
export function EditorHead() {
  const { saving, edited, undo, redo } = useEntryForm();
  const { saved } = saving;
  const [isSending, setSending] = useState(false);
  const [note, setNote] = useState("");
  const refusal = useRefusal();
  const { trouble, isBusy, isLeaving, setLeaving, keep, send, discard } = useActions();
  const name = edited.read.designation || "New cable";
  const wasSent = saved?.submittedAt != null && "It was sent for review before: its history stays.";
  return (
    <>
      <div className="flex flex-wrap items-end justify-between gap-x-6 gap-y-3">
        <div className="min-w-0">
          <p className="text-label text-ink-2 phone:hidden">
            <Link href="/cables" prefetch={false} className="hover:text-copper">
              Catalogue
            </Link>
            {saved && (
              <>
                {" / "}
                <Link
                  href={`/cables/${encodeURIComponent(saved.id)}` as Route}
                  prefetch={false}
                  className="hover:text-copper"
                >
                  {saved.designation}
                </Link>
              </>
            )}
          </p>
          <h1 className="break-words">
            {name}
            {saved ? `, draft of revision ${saved.revision}` : edited.read.designation && ", a new entry"}
          </h1>
        </div>
        <div className="flex flex-wrap items-center gap-2.5 text-label text-ink-2">
          <EntrySaveNote />
          <Button onClick={undo ?? undefined} refused={!undo && "Nothing to undo."}>
            Undo
          </Button>
          <Button onClick={redo ?? undefined} refused={!redo && "Nothing to do again."}>
            Redo
          </Button>
          <Button onClick={() => setLeaving(true)} refused={wasSent}>
            Discard
          </Button>
          {!saved && (
            <Button onClick={() => void keep()} refused={refusal || (isBusy && "It is being saved.")}>
              Save as a draft
            </Button>
          )}
          <Button kind="main" onClick={() => setSending(true)} refused={refusal || (isBusy && "It is being sent.")}>
            Send for review
          </Button>
        </div>
      </div>
      {trouble && (
        <div role="alert" className="mt-2">
          <StateNote state="fail">{trouble}</StateNote>
        </div>
      )}
      <Confirm
        isOpen={isSending}
        title={`Send ${name} for review?`}
        confirmLabel="Send it"
        cancelLabel="Not yet"
        onConfirm={() => {
          setSending(false);
          void send(note);
        }}
        onCancel={() => setSending(false)}
      >
        <p>Somebody else looks at it; until it is returned it does not change.</p>
        <SendChecks />
        <Field
          label="What the reviewer should know"
          value={note}
          maxLength={1000}
          onChange={(event) => setNote(event.target.value)}
        />
      </Confirm>
      <Confirm
        isOpen={isLeaving}
        title="Discard what was typed?"
        confirmLabel="Discard it"
        onConfirm={() => void discard()}
        onCancel={() => setLeaving(false)}
      >
        {saved
          ? saved.isCurrent
            ? "The draft is taken out of the catalogue. This cannot be undone."
            : "The draft of this revision is gone; the approved entry stays. This cannot be undone."
          : "It is in this browser only, and will be gone."}
      </Confirm>
    </>
  );
}

/** What a reviewer will find. */
function SendChecks() {
  const { edited } = useEntryForm();
  const bad = edited.checks.filter(({ verdict }) => verdict === "contradiction").length;
  const look = edited.checks.filter(({ verdict }) => verdict === "look").length;
  if (bad > 0)
    return (
      <StateNote state="fail">
        It contradicts itself in {bad === 1 ? "one place" : `${bad} places`}: it cannot be approved as it is.
      </StateNote>
    );
  if (look > 0)
    return (
      <StateNote state="warn">
        {look === 1 ? "One thing needs" : `${look} things need`} an answer from the reviewer.
      </StateNote>
    );
  return null;
}
