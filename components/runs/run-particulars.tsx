"use client";

import { useMutation } from "@tanstack/react-query";
import { useState } from "react";
import { Comments } from "@/components/runs/comments";
import { useRunEditor } from "@/components/runs/run-editor";
import { Button } from "@/components/ui/button";
import { Field } from "@/components/ui/field";
import { Section } from "@/components/ui/section";
import { Select } from "@/components/ui/select";
import { StateNote } from "@/components/ui/state-mark";
import { call } from "@/lib/http/call";
import type { Run } from "@/lib/runs/schema";

/** Where the run belongs, whose it is, and what is said about it. */
export function RunParticulars() {
  const { draft, edit, saved, canEdit, people } = useRunEditor();
  return (
    <div className="mt-8 grid grid-cols-[minmax(0,1fr)_448px] gap-x-10 gap-y-6 folded:grid-cols-1">
      <Comments runId={saved.id} canComment={people.canComment} />
      <Section title="Where it belongs" className="mt-6">
        <div className="mt-2 flex flex-wrap gap-3">
          {(["site", "folder"] as const).map((key) => (
            <Field
              key={key}
              label={key === "site" ? "Site" : "Folder"}
              value={draft[key]}
              maxLength={120}
              disabled={!canEdit}
              className="min-w-40 flex-1"
              onChange={(event) => edit({ ...draft, [key]: event.target.value }, key)}
            />
          ))}
        </div>
        <p className="mt-3 text-body">
          Sheet <b>{saved.number}</b>, {saved.state}
          {saved.condition && `: ${saved.condition}`}. Owned by <b>{saved.ownerName}</b>.
        </p>
        {people.canHandOver && <HandOver />}
      </Section>
    </div>
  );
}

function HandOver() {
  const { saved, people, replaceSaved, isChanged } = useRunEditor();
  const [ownerId, setOwnerId] = useState("");
  const give = useMutation({
    mutationFn: () =>
      call<Run>(`/runs/${saved.id}/owner`, { method: "POST", body: { ownerId }, ifMatch: `"${saved.version}"` }),
    onSuccess: (run) => (replaceSaved(run), setOwnerId("")),
  });
  const refused =
    ownerId === ""
      ? "Choose who it goes to."
      : isChanged
        ? "Your last change is still being saved."
        : give.isPending && "It is on its way.";
  return (
    <div className="mt-3 flex flex-wrap items-end gap-3">
      <Select
        label="Hand over to"
        value={ownerId}
        onChange={(event) => setOwnerId(event.target.value)}
        className="w-52"
      >
        <option value="">Choose a person</option>
        {people.owners
          .filter(({ personId }) => personId !== saved.ownerId)
          .map(({ personId, name }) => (
            <option key={personId} value={personId}>
              {name}
            </option>
          ))}
      </Select>
      <Button onClick={() => give.mutate()} refused={refused}>
        Hand over
      </Button>
      {give.error && <StateNote state="fail">{give.error.message}</StateNote>}
    </div>
  );
}
