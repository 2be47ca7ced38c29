"use client";

import { createContext, useContext, useState, type ReactNode } from "react";
import type { CableLine } from "@/lib/cables/line";
import { draftOf, edited, faultsAfter, history, redone, undone, type Faults, type RunDraft } from "@/lib/runs/edit";
import { heldKey } from "@/lib/runs/held";
import type { Run } from "@/lib/runs/schema";
import { useNewerRun } from "@/components/runs/use-newer-run";
import { useSaving, type Saving } from "@/components/runs/use-saving";

/** What is selected on the strip: an element by its place, or an end. */
export type Selected = number | "source" | "load" | null;

export interface RunEditor {
  /** as last saved, with number, state, owner, version */
  saved: Run;
  draft: RunDraft;
  canEdit: boolean;
  /** who may own this run, and what this person may do beside editing it */
  people: RunPeople;
  /** the run as the server has it after a change that is not an edit: a new owner */
  replaceSaved: (run: Run) => void;
  /** why not, in a sentence */
  cannotEditBecause: string | null;
  /** @param tag - edits with the same tag in a row are one undo step */
  edit: (next: RunDraft, tag?: string | null) => void;
  undo: (() => void) | null;
  redo: (() => void) | null;
  selected: Selected;
  select: (selected: Selected) => void;
  /** fields that hold something which cannot be read, by path, with the sentence beside them */
  faults: Faults;
  setFault: (path: string, fault: Faults[string] | null) => void;
  lines: ReadonlyMap<string, CableLine>;
  addLine: (line: CableLine) => void;
  saving: Saving;
  isChanged: boolean;
  retry: () => void;
  settle: (keep: "mine" | "theirs") => void;
}

export interface RunPeople {
  /** who is looking */
  personId: string;
  owners: { personId: string; name: string }[];
  canHandOver: boolean;
  canComment: boolean;
}

const Context = createContext<RunEditor | null>(null);

export function useRunEditor(): RunEditor {
  const editor = useContext(Context);
  if (!editor) throw new Error("useRunEditor: not inside a RunEditorProvider");
  return editor;
}

interface Props {
  run: Run;
  lines: CableLine[];
  /** why this person may not change this run, null when they may */
  cannotEditBecause: string | null;
  people: RunPeople;
  children: ReactNode;
}

/** One run being worked on. It outlives the views, so a change not yet saved survives going from one to the next. */
export function RunEditorProvider({ run, lines: given, cannotEditBecause, people, children }: Props) {
  const canEdit = cannotEditBecause === null;
  const [steps, setSteps] = useState(() => history(draftOf(run)));
  const [selected, select] = useState<Selected>(null);
  const [faults, setFaults] = useState<Faults>({});
  const [lines, setLines] = useState(() => new Map(given.map((line) => [line.cableId, line])));
  const draft = steps.present;
  const isReadable = Object.keys(faults).length === 0;
  const { saved, saving, isChanged, retry, settle, replaceSaved } = useSaving({
    opened: run,
    draft,
    canSave: canEdit && isReadable,
    key: heldKey(people.personId, run.id),
    take: (next) => setSteps((before) => edited(before, next, null)),
    restart: (next) => {
      setSteps(history(next));
      setLines((known) => new Map([...known, ...given.map((line): [string, CableLine] => [line.cableId, line])]));
    },
  });

  useNewerRun(run);

  const setFault = (path: string, fault: Faults[string] | null) =>
    setFaults((before) => {
      if (fault === null && !(path in before)) return before;
      const { [path]: _gone, ...rest } = before;
      return fault === null ? rest : { ...rest, [path]: fault };
    });
  const edit = (next: RunDraft, tag: string | null = null) => {
    if (!canEdit) return;
    setFaults((before) => faultsAfter(before, draft.circuit.elements, next.circuit.elements));
    setSteps((before) => edited(before, next, tag));
  };
  const go = (step: typeof undone) => () => {
    setFaults({});
    setSteps(step);
  };

  return (
    <Context
      value={{
        saved,
        draft,
        canEdit,
        people,
        replaceSaved,
        cannotEditBecause,
        edit,
        undo: steps.past.length > 0 ? go(undone) : null,
        redo: steps.future.length > 0 ? go(redone) : null,
        selected,
        select,
        faults,
        setFault,
        lines,
        addLine: (line) => setLines((before) => new Map(before).set(line.cableId, line)),
        saving,
        isChanged,
        retry,
        settle,
      }}
    >
      {children}
    </Context>
  );
}
