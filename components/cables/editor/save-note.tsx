"use client";

import { useEntryForm } from "@/components/cables/editor/entry-form";
import { Button } from "@/components/ui/button";
import { NotSaved } from "@/components/ui/not-saved";
import { StateMark } from "@/components/ui/state-mark";
import { Cell, HeadCell, RowHead } from "@/components/ui/table";
import { startTexts } from "@/lib/cables/editor/start-texts";
import { differences } from "@/lib/cables/editor/versions";

/** Where the work stands: saved, kept in the browser, being saved, or not and why. */
export function EntrySaveNote() {
  const { saving, edited } = useEntryForm();
  const { state, retry } = saving;
  const hasFaults = Object.keys(edited.read.faults).length > 0;
  if (state.kind === "trouble") return <NotSaved since={state.since} message={state.message} retry={retry} />;
  if (state.kind === "conflict") return <StateMark state="warn">Somebody else saved first</StateMark>;
  if (!saving.saved) return <span role="status">Kept in this browser</span>;
  if (state.kind === "waiting" && (hasFaults || !edited.draft))
    return (
      <span role="status">
        <StateMark state="warn">Kept in this browser; saving waits for a field</StateMark>
      </span>
    );
  return <span role="status">{state.kind === "saved" ? "Saved" : "Saving …"}</span>;
}

/** Two librarians changed one draft: both versions, and which one stands. Nothing is lost until somebody says so. */
export function EntryConflict() {
  const { saving, form } = useEntryForm();
  const { state, settle } = saving;
  if (state.kind !== "conflict") return null;
  const rows = differences(startTexts(state.theirs), form.getValues());
  return (
    <section
      role="alertdialog"
      aria-label="Two versions of this draft"
      className="mt-3 border-y-[1.5px] border-warn py-3"
    >
      <h2>Somebody else saved this draft while you were changing it</h2>
      <p className="mt-1 text-body text-ink-2">
        Your version is still here and nothing has been overwritten. Where they differ:
      </p>
      <div className="overflow-x-auto" tabIndex={0} role="group" aria-label="Where the versions differ">
        <table className="mt-2 w-full border-collapse text-body">
          <thead>
            <tr>
              <HeadCell>What</HeadCell>
              <HeadCell>Theirs, saved</HeadCell>
              <HeadCell>Yours</HeadCell>
            </tr>
          </thead>
          <tbody>
            {rows.map(({ what, theirs, mine }) => (
              <tr key={what}>
                <RowHead>{what}</RowHead>
                <Cell>{theirs}</Cell>
                <Cell>{mine}</Cell>
              </tr>
            ))}
          </tbody>
        </table>
      </div>
      <div className="mt-3 flex flex-wrap gap-2">
        <Button kind="main" onClick={() => settle("mine")}>
          Keep mine, on top of theirs
        </Button>
        <Button onClick={() => settle("theirs")}>Take theirs; mine stays one undo away</Button>
      </div>
    </section>
  );
}
