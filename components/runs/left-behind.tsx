"use client";

import { useMemo } from "react";
import { useRunEditor } from "@/components/runs/run-editor";
import { pieceName } from "@/components/runs/strip-pieces";
import { StateNote } from "@/components/ui/state-mark";
import { isAtSource } from "@/lib/runs/match-place";
import { leftBehind, leftBehindSentence } from "@/lib/runs/match-sentences";
import type { MatchAsked } from "@/lib/runs/matching";

/** What a match before some of the run leaves on the line behind it, in one sentence. */
export function LeftBehind({ asked }: { asked: MatchAsked }) {
  const { draft, lines } = useRunEditor();
  const { elements } = draft.circuit;
  const place = asked.behind.length;
  const left = useMemo(() => figuresOf(asked), [asked]);
  if (!left) return null;
  const index = elements.length - place + (left.longest?.index ?? 0);
  const said = leftBehindSentence(left, asked.designHz, {
    isAtSource: isAtSource(elements, place),
    sourceName: draft.sourceName,
    cableName: pieceName(elements, index, lines),
  });
  if (!said) return null;
  return (
    <div className="mt-4 max-w-240" role="status">
      {said.isWarning ? (
        <StateNote state="warn">{said.text}</StateNote>
      ) : (
        <p className="text-label text-ink-2">{said.text}</p>
      )}
    </div>
  );
}

/** Null at the load, and where the run behind cannot be worked out: the list of matches says why. */
function figuresOf(asked: MatchAsked) {
  if (asked.behind.length === 0) return null;
  try {
    return leftBehind(asked);
  } catch (error) {
    if (!(error instanceof RangeError)) throw error;
    return null;
  }
}
