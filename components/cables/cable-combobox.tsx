"use client";

import { useEffect, useId, useRef, useState } from "react";
import { CableFinder } from "@/components/cables/cable-finder";
import { fieldColours, fieldEdge } from "@/components/ui/field";

interface Props {
  label: string;
  /** the chosen cable as the field shows it; null where none is */
  chosen: string | null;
  cableId: string;
  /** may refuse by throwing; the sentence is shown under the field */
  choose: (cableId: string) => Promise<void> | void;
  isDisabled?: boolean;
  /** a choice besides the catalogue, first in the list */
  besides?: { label: string; choose: () => void };
  className?: string;
}

/** A cable's name in a field; opened, a search of the catalogue with each cable drawn end-on. */
export function CableCombobox({ label, chosen, cableId, choose, isDisabled, besides, className = "" }: Props) {
  const [isOpen, setOpen] = useState(false);
  const [trouble, setTrouble] = useState<string | null>(null);
  const id = useId();
  const button = useRef<HTMLButtonElement>(null);
  const box = usePressOutside(isOpen, () => setOpen(false));

  function close() {
    setOpen(false);
    button.current?.focus();
  }
  async function take(next: string) {
    try {
      await choose(next);
      setTrouble(null);
      close();
    } catch (error) {
      setTrouble((error as Error).message);
    }
  }
  return (
    <div
      ref={box}
      className={`relative flex flex-col gap-0.5 ${className}`}
      onKeyDown={(event) => event.key === "Escape" && isOpen && (event.stopPropagation(), close())}
    >
      <span id={id} className="text-note text-ink-2">
        {label}
      </span>
      <button
        ref={button}
        type="button"
        aria-labelledby={id}
        aria-describedby={`${id}-value`}
        aria-expanded={isOpen}
        disabled={isDisabled}
        onClick={() => (setTrouble(null), setOpen(!isOpen))}
        className={`${fieldEdge} ${fieldColours(false)} h-7.25 justify-between px-2 text-body phone:h-11 phone:text-section`}
      >
        <span id={`${id}-value`} className="truncate">
          {chosen ?? "Choose a cable"}
        </span>
        <svg width="8" height="6" aria-hidden="true" className="shrink-0">
          <path d="M0 0H8L4 6z" fill="var(--ink-2)" />
        </svg>
      </button>
      {trouble && (
        <p role="alert" className="text-note text-fail">
          {trouble}
        </p>
      )}
      {isOpen && (
        <CableFinder
          current={cableId}
          take={take}
          besides={besides && { ...besides, choose: () => (besides.choose(), close()) }}
        />
      )}
    </div>
  );
}

/** Calls when something outside an element is pressed. Give the answer to the element as its ref. */
function usePressOutside(isWatching: boolean, onPress: () => void) {
  const box = useRef<HTMLDivElement>(null);
  const latest = useRef(onPress);
  useEffect(() => {
    latest.current = onPress;
  });
  useEffect(() => {
    if (!isWatching) return;
    const press = (event: PointerEvent) => !box.current?.contains(event.target as Node) && latest.current();
    document.addEventListener("pointerdown", press);
    return () => document.removeEventListener("pointerdown", press);
  }, [isWatching]);
  return box;
}
