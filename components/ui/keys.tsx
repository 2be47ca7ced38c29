"use client";

import { createContext, useContext, useEffect, useRef, useState, useSyncExternalStore, type ReactNode } from "react";
import { Button } from "@/components/ui/button";
import { Checkbox } from "@/components/ui/checkbox";
import { KeyCap } from "@/components/ui/key-cap";

export interface KeyBinding {
  /** as `KeyboardEvent.key` has it; letters in lower case */
  key: string;
  /** what it does, for the list of keys */
  does: string;
  /** left out where the key is handled where the focus is, and only the list needs it */
  run?: () => void;
}

interface Keys {
  add: (bindings: readonly KeyBinding[]) => () => void;
}

const KeysContext = createContext<Keys | null>(null);
const offKey = "ropewalk-keys-off";
const changed = "keyschange";

const areOff = () => window.localStorage.getItem(offKey) === "yes";
function subscribe(listener: () => void): () => void {
  window.addEventListener(changed, listener);
  return () => window.removeEventListener(changed, listener);
}
function turn(isOff: boolean): void {
  window.localStorage.setItem(offKey, isOff ? "yes" : "no");
  window.dispatchEvent(new Event(changed));
}

/** Whether a key press belongs to a field, a list or a dialog rather than to the page. */
function isTaken(event: KeyboardEvent): boolean {
  const { target } = event;
  if (event.defaultPrevented || event.ctrlKey || event.metaKey || event.altKey || !(target instanceof HTMLElement))
    return true;
  // What had the focus in a dialog keeps it for a moment after the dialog has closed.
  const dialog = target.closest("dialog");
  return dialog?.open ?? target.matches("input, select, textarea, [contenteditable], [role=slider]");
}

/** The keys of the page: those that views inside add, and the list of them on “?”. */
export function KeysProvider({ children }: { children: ReactNode }) {
  const [groups, setGroups] = useState<readonly (readonly KeyBinding[])[]>([]);
  const [isListOpen, setListOpen] = useState(false);
  const isOff = useSyncExternalStore(subscribe, areOff, () => false);
  const [keys] = useState<Keys>(() => ({
    add: (bindings) => {
      setGroups((before) => [...before, bindings]);
      return () => setGroups((before) => before.filter((group) => group !== bindings));
    },
  }));
  const all = groups.flat();
  useEffect(() => {
    const press = (event: KeyboardEvent) => {
      if (isTaken(event)) return;
      if (event.key === "?") return setListOpen(true);
      const binding = all.findLast(
        ({ key, run }) => run && key === (event.key.length === 1 ? event.key.toLowerCase() : event.key),
      );
      if (!binding?.run || (isOff && event.key.length === 1)) return;
      event.preventDefault();
      binding.run();
    };
    window.addEventListener("keydown", press);
    return () => window.removeEventListener("keydown", press);
  }, [all, isOff]);
  return (
    <KeysContext value={keys}>
      {children}
      <KeyList isOpen={isListOpen} close={() => setListOpen(false)} bindings={all} isOff={isOff} />
    </KeysContext>
  );
}

/** Adds keys while the calling view stands. The last one added wins a key that two want. */
export function useKeys(bindings: readonly KeyBinding[]): void {
  const keys = useContext(KeysContext);
  const latest = useRef(bindings);
  useEffect(() => {
    latest.current = bindings;
  });
  const shape = bindings.map(({ key, does, run }) => `${key} ${does} ${run ? "" : "listed"}`).join("\n");
  useEffect(() => {
    if (!keys) return undefined;
    const stable = latest.current.map(({ key, does, run }, i) => ({
      key,
      does,
      ...(run && { run: () => latest.current[i]?.run?.() }),
    }));
    return keys.add(stable);
  }, [keys, shape]);
}

const names: Record<string, string> = {
  ArrowLeft: "←",
  ArrowRight: "→",
  ArrowUp: "↑",
  ArrowDown: "↓",
  Delete: "Del",
  Escape: "Esc",
};

interface KeyListProps {
  isOpen: boolean;
  close: () => void;
  bindings: readonly KeyBinding[];
  isOff: boolean;
}

function KeyList({ isOpen, close, bindings, isOff }: KeyListProps) {
  const dialog = useRef<HTMLDialogElement>(null);
  useEffect(() => {
    const element = dialog.current;
    if (isOpen && element && !element.open) element.showModal();
    if (!isOpen && element?.open) element.close();
  }, [isOpen]);
  return (
    <dialog
      ref={dialog}
      aria-label="Keys"
      onClose={close}
      // The browser closes a dialog on Esc a moment later; a key pressed right after would still belong to it.
      onKeyDown={({ key, currentTarget }) => key === "Escape" && currentTarget.close()}
      className="w-[min(30rem,calc(100vw-2rem))] rounded border border-ink bg-paper p-5"
    >
      <h2>Keys</h2>
      <p className="text-label text-ink-2">They work while no field has the focus.</p>
      <dl className="mt-3 grid grid-cols-[110px_1fr] gap-y-1.5 text-body">
        <dt>
          <KeyCap>?</KeyCap>
        </dt>
        <dd>show keys</dd>
        {bindings.map(({ key, does }) => (
          <div key={`${key} ${does}`} className="contents">
            <dt className="flex gap-1">
              {key.split(" ").map((part) => (
                <KeyCap key={part}>{names[part] ?? (part.length === 1 ? part.toUpperCase() : part)}</KeyCap>
              ))}
            </dt>
            <dd>{does}</dd>
          </div>
        ))}
      </dl>
      <div className="mt-4 flex items-center justify-between gap-4">
        <Checkbox checked={isOff} onChange={(event) => turn(event.target.checked)}>
          Single letters do nothing
        </Checkbox>
        <Button onClick={close}>Close</Button>
      </div>
    </dialog>
  );
}
