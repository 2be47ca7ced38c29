"use client";

import { useId, useState, type DragEvent } from "react";
import { buttonClass } from "@/components/ui/button";

interface FileDropProps {
  /** "Drop a CSV or JSON file here" */
  label: string;
  /** a few words under it */
  hint?: string;
  /** extensions and media types, as the browser's own picker takes them */
  accept: string;
  onFile: (file: File) => void;
}

/** A place to drop a file at, with the browser's own picker for everybody else. */
export function FileDrop({ label, hint, accept, onFile }: FileDropProps) {
  const id = useId();
  const [isOver, setOver] = useState(false);
  function drop(event: DragEvent) {
    event.preventDefault();
    setOver(false);
    const [file] = event.dataTransfer.files;
    if (file) onFile(file);
  }
  return (
    <div
      onDragOver={(event) => {
        event.preventDefault();
        setOver(true);
      }}
      onDragLeave={() => setOver(false)}
      onDrop={drop}
      className={`flex flex-wrap items-center gap-x-4 gap-y-2 rounded border-[1.5px] border-dashed p-4 ${isOver ? "border-copper bg-copper-wash" : "border-rule"}`}
    >
      <input
        id={id}
        type="file"
        accept={accept}
        className="peer sr-only"
        aria-describedby={hint ? `${id}-hint` : undefined}
        onChange={(event) => {
          const file = event.target.files?.[0];
          if (file) onFile(file);
          event.target.value = ""; // so that the same file can be chosen again
        }}
      />
      <label
        htmlFor={id}
        className={`${buttonClass()} cursor-pointer peer-focus-visible:outline-2 peer-focus-visible:outline-offset-2 peer-focus-visible:outline-sea`}
      >
        Choose a file
      </label>
      <div>
        <p>{label}</p>
        {hint && (
          <p id={`${id}-hint`} className="text-note text-ink-3">
            {hint}
          </p>
        )}
      </div>
    </div>
  );
}
