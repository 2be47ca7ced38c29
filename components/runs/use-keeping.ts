"use client";

import { useRunEditor } from "@/components/runs/run-editor";
import type { Candidate } from "@/lib/line/match/match-request";
import { isKept, storedElements, withMatch, withoutMatch } from "@/lib/runs/matching";

/** Puts a match in the run, in place of one that is there. */
export function useKeeping(candidates: Candidate[]) {
  const { draft, edit, canEdit, cannotEditBecause } = useRunEditor();
  const { elements } = draft.circuit;
  const put = (next: typeof elements) => edit({ ...draft, circuit: { ...draft.circuit, elements: next } });
  const present = candidates
    .map((candidate) => storedElements(candidate.elements))
    .find((match) => isKept(elements, match));
  const without = present ? withoutMatch(elements, present) : elements;
  return {
    canEdit,
    cannotEditBecause,
    isKept: (candidate: Candidate) => isKept(elements, storedElements(candidate.elements)),
    keep: (candidate: Candidate) => put(withMatch(without, storedElements(candidate.elements))),
    takeOut: () => put(without),
  };
}
