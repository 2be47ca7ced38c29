"use client";

import { useRunEditor } from "@/components/runs/run-editor";
import { Button } from "@/components/ui/button";
import { NotSaved } from "@/components/ui/not-saved";
import { StateMark } from "@/components/ui/state-mark";
import { draftOf } from "@/lib/runs/edit";
import { changedFields } from "@/lib/runs/changed";

/** Where the work stands: saved, being saved, or not and why. */
export function SavingNote() {
  const { saved, saving, isChanged, retry, faults, cannotEditBecause } = useRunEditor();
  if (cannotEditBecause) return <span>{cannotEditBecause}</span>;
  if (Object.keys(faults).length > 0)
    return <StateMark state="warn">A field cannot be read; saving waits for it</StateMark>;
  if (saving.kind === "unsaved") return <NotSaved since={saving.since} message={saving.message} retry={retry} />;
  if (saving.kind === "conflict") return <StateMark state="warn">Someone else saved first</StateMark>;
  return (
    <span role="status">
      {saving.kind === "saving" || isChanged ? "Saving …" : `Saved, revision ${saved.version}, ${saved.changedByName}`}
    </span>
  );
}

/** Two people saved one run: both versions, and which one stands. Nothing is lost until somebody says so. */
export function Conflict() {
  const { saving, draft, settle } = useRunEditor();
  if (saving.kind !== "conflict") return null;
  const { theirs } = saving;
  const rows = changedFields(draftOf(theirs), draft);
  return (
    <section
      role="alertdialog"
      aria-label="Two versions of this run"
      className="mt-3 border-y-[1.5px] border-warn py-3"
    >
      <h2>{theirs.changedByName} saved this run while you were changing it</h2>
      <p className="mt-1 text-body text-ink-2">
        Your version is still here and nothing has been overwritten. Where they differ:
      </p>
      <table className="mt-2 w-full border-collapse text-body">
        <thead>
          <tr className="text-left text-label text-ink-2">
            <th scope="col" className="border-b border-rule py-1 pr-3 font-[560]">
              What
            </th>
            <th scope="col" className="border-b border-rule py-1 pr-3 font-[560]">
              {theirs.changedByName}, revision {theirs.version}
            </th>
            <th scope="col" className="border-b border-rule py-1 font-[560]">
              Yours
            </th>
          </tr>
        </thead>
        <tbody>
          {rows.map(({ what, before, after }) => (
            <tr key={what}>
              <th scope="row" className="border-b border-line py-1 pr-3 text-left font-normal">
                {what}
              </th>
              <td className="border-b border-line py-1 pr-3">{before}</td>
              <td className="border-b border-line py-1">{after}</td>
            </tr>
          ))}
        </tbody>
      </table>
      <div className="mt-3 flex flex-wrap gap-2">
        <Button kind="main" onClick={() => settle("mine")}>
          Keep mine, on top of theirs
        </Button>
        <Button onClick={() => settle("theirs")}>Take theirs; mine stays one undo away</Button>
      </div>
    </section>
  );
}
