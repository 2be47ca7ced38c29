"use client";

import { useCursor } from "@/components/plot/cursor";
import { nearestLine } from "@/components/runs/leaf-panel";
import { useRunEditor } from "@/components/runs/run-editor";
import { useKeys } from "@/components/ui/keys";
import { totalLength } from "@/lib/runs/circuit";
import { insertAt, newElement, removeAt, split } from "@/lib/runs/edit";

/** Everything on the line without a mouse: from piece to piece, open and close, add, split, remove. */
export function useLineKeys(): void {
  const { draft, lines, edit, selected, select, canEdit } = useRunEditor();
  const { elements } = draft.circuit;
  const cursor = useCursor("distance");
  const total = totalLength(draft.circuit);
  const index = typeof selected === "number" ? selected : null;
  const put = (next: typeof elements) => edit({ ...draft, circuit: { ...draft.circuit, elements: next } });

  /** Source, the pieces, load: the order of the line. */
  function step(by: 1 | -1) {
    const stops = ["source", ...elements.keys(), "load"] as const;
    const at = selected === null ? (by === 1 ? -1 : stops.length) : stops.indexOf(selected);
    select(stops[Math.min(stops.length - 1, Math.max(0, at + by))] ?? null);
  }
  function addAfter() {
    const at = index === null ? (selected === "source" ? 0 : elements.length) : index + 1;
    const line = nearestLine(elements, at, [...lines.keys()][0]);
    if (!line || !canEdit) return;
    put(insertAt(elements, at, [newElement("cable", line, 50)]));
    select(at);
  }
  function remove() {
    if (index === null || !canEdit) return;
    put(removeAt(elements, index));
    // The hands stay where they were: on the piece before.
    select(elements.length > 1 ? Math.max(0, index - 1) : null);
  }
  /** A hundredth of the line; every plot under it reads out at the cursor. */
  function moveCursor(by: 1 | -1) {
    if (!(total > 0)) return;
    cursor.set(Math.min(total, Math.max(0, (cursor.value ?? 0) + (by * total) / 100)));
  }
  useKeys([
    { key: "ArrowLeft", does: "previous piece", run: () => step(-1) },
    { key: "ArrowRight", does: "next piece", run: () => step(1) },
    {
      key: "Enter",
      does: "go into the fields of the piece",
      run: () => document.querySelector<HTMLElement>("[data-leaf] input")?.focus(),
    },
    { key: "Escape", does: "close its editor", run: () => select(null) },
    { key: "a", does: "add a cable after", run: addAfter },
    { key: "s", does: "split the cable", run: () => index !== null && canEdit && put(split(elements, index)) },
    { key: "Delete", does: "remove the piece", run: remove },
    { key: "[", does: "move the cursor along the line, toward the source", run: () => moveCursor(-1) },
    { key: "]", does: "and toward the load", run: () => moveCursor(1) },
    { key: "ArrowUp ArrowDown", does: "step a figure in its field; Shift ×10, Alt ÷10" },
  ]);
}
