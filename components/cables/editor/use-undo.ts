"use client";

import { useEffect, useRef, useState } from "react";
import type { UseFormReturn } from "react-hook-form";
import { redone, stepped, steps, undone } from "@/lib/cables/editor/undo";
import type { EntryTexts } from "@/lib/cables/editor/texts";

const copyOf = (texts: EntryTexts) => structuredClone(texts);

/** Lists change by whole rows: two rows added are two steps. A field being typed is one. */
const tagOf = (name: string) => (name === "rows" ? null : name);

/** Every change of the form can be undone; Ctrl Z outside a field, the browser's own inside one. */
export function useUndo(form: UseFormReturn<EntryTexts>, start: EntryTexts) {
  const [now, setNow] = useState(() => steps(copyOf(start)));
  useEffect(
    () =>
      form.subscribe({
        formState: { values: true },
        callback: ({ values, name }) => {
          // What is put on the screen whole has no name, and is no change of anybody’s.
          if (name === undefined) return;
          setNow((before) => stepped(before, copyOf(values), tagOf(name)));
        },
      }),
    [form],
  );
  function show(texts: EntryTexts) {
    // The fields stay the ones that are on the screen: rendering does not register them anew.
    form.reset(copyOf(texts), { keepDefaultValues: true, keepFieldsRef: true });
  }
  const go = (to: typeof undone) => () => {
    const next = to(now);
    show(next.present);
    // Last: each field has just said that it changed, which was nobody's step.
    setNow(next);
  };
  const undo = now.past.length > 0 ? go(undone) : null;
  const redo = now.future.length > 0 ? go(redone) : null;
  const latest = useRef({ undo, redo });
  useEffect(() => {
    latest.current = { undo, redo };
  });
  useEffect(() => {
    const press = (event: KeyboardEvent) => {
      if (!(event.ctrlKey || event.metaKey) || event.key.toLowerCase() !== "z") return;
      if (event.target instanceof HTMLElement && event.target.matches("input, textarea")) return;
      const step = event.shiftKey ? latest.current.redo : latest.current.undo;
      if (!step) return;
      event.preventDefault();
      step();
    };
    window.addEventListener("keydown", press);
    return () => window.removeEventListener("keydown", press);
  }, []);
  /** Puts other texts on the screen, as a change that can be undone. */
  const take = (texts: EntryTexts) => {
    show(texts);
    setNow(stepped(now, copyOf(texts), null));
  };
  return { undo, redo, take };
}
