"use client";

import { useState } from "react";
import type { Decision } from "@/components/review/use-decision";
import { Button } from "@/components/ui/button";
import { Confirm } from "@/components/ui/confirm";
import { KeyCap } from "@/components/ui/key-cap";
import { useKeys } from "@/components/ui/keys";
import { StateNote } from "@/components/ui/state-mark";
import { ProblemError } from "@/lib/http/call";

interface Props {
  revision: number;
  decision: Decision;
}

const area =
  "mt-0.5 block w-full rounded-t border border-b-[1.5px] border-rule border-b-ink bg-field px-2 py-1 text-body text-ink phone:text-section";

/** Approve or return, by button or by key; a refusal says why. */
export function Decide({ revision, decision }: Props) {
  const [isReturning, setReturning] = useState(false);
  const [notes, setNotes] = useState("");
  const { refusedApproval, refusedReturn, error } = decision;
  const askReturn = () => refusedReturn === null && setReturning(true);
  useKeys([
    { key: "a", does: "approve", run: decision.approve },
    { key: "r", does: "return with notes", run: askReturn },
  ]);
  const isStale = error instanceof ProblemError && error.problem.status === 412;
  return (
    <div className="flex flex-col gap-2">
      <div className="flex flex-wrap gap-2.5">
        <Button kind="main" refused={refusedApproval} onClick={decision.approve}>
          Approve revision {revision}{" "}
          <span className="phone:hidden">
            <KeyCap isOnFill>A</KeyCap>
          </span>
        </Button>
        <Button refused={refusedReturn} onClick={askReturn}>
          Return with notes{" "}
          <span className="phone:hidden">
            <KeyCap>R</KeyCap>
          </span>
        </Button>
      </div>
      {refusedApproval && <p className="text-label text-ink-2">{refusedApproval}</p>}
      {error && (
        <StateNote state="fail">
          {error.message}{" "}
          {isStale && (
            <button type="button" className="link" onClick={decision.reload}>
              Show it as it now stands
            </button>
          )}
        </StateNote>
      )}
      <p className="text-note text-ink-3">Runs keep their pinned revision until their owner moves them.</p>
      <Confirm
        isOpen={isReturning}
        title={`Return revision ${revision} to its author`}
        confirmLabel="Return it"
        cancelLabel="Not yet"
        refused={notes.trim() === "" && "Say what has to change first."}
        onCancel={() => setReturning(false)}
        onConfirm={() => {
          setReturning(false);
          decision.giveBack(notes.trim());
        }}
      >
        <label className="text-note text-ink-2">
          What has to change
          <textarea
            value={notes}
            maxLength={1000}
            rows={4}
            onChange={(event) => setNotes(event.target.value)}
            className={area}
          />
        </label>
      </Confirm>
    </div>
  );
}
