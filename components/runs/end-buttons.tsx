"use client";

import { useRunEditor } from "@/components/runs/run-editor";

interface Box {
  left?: number;
  top?: number;
  width?: number;
  height?: number;
}

interface Props {
  source: Box;
  load: Box;
}

/** The two ends of the line, to be selected where they are drawn. */
export function EndButtons(props: Props) {
  const { draft, selected, select } = useRunEditor();
  return (["source", "load"] as const).map((end) => {
    const { left = 0, top = 0, width = "100%", height = "100%" } = props[end];
    return (
      <button
        key={end}
        type="button"
        aria-pressed={selected === end}
        aria-label={end === "source" ? `Source: ${draft.sourceName}` : `Load: ${draft.loadName}`}
        onClick={() => select(selected === end ? null : end)}
        className={`absolute z-[1] rounded hover:bg-copper-wash/40 ${selected === end ? "bg-copper-wash/60" : ""}`}
        style={{ left, top, width, height }}
      />
    );
  });
}
