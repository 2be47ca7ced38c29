"use client";

import { useRunEditor } from "@/components/runs/run-editor";
import type { Candidate } from "@/lib/line/match/match-request";
import { isKept, withMatch, withoutMatch } from "@/lib/runs/match-place";
import { storedElements } from "@/lib/runs/matching";

/**
 * Puts a match in the run, in place of one that stands there.
 * @param place - pieces between the match and the load
 */
export function useKeeping(candidates: Candidate[], place: number) {
  const { draft, edit, canEdit, cannotEditBecause } = useRunEditor();
  const { elements } = draft.circuit;
  const put = (next: typeof elements) => edit({ ...draft, circuit: { ...draft.circuit, elements: next } });
  const present = candidates
    .map((candidate) => storedElements(candidate.elements))
    .find((match) => isKept(elements, match, place));
  const without = present ? withoutMatch(elements, present, place) : elements;
  return {
    canEdit,
    cannotEditBecause,
    isKept: (candidate: Candidate) => isKept(elements, storedElements(candidate.elements), place),
    keep: (candidate: Candidate) => put(withMatch(without, storedElements(candidate.elements), place)),
    takeOut: () => put(without),
  };
}
