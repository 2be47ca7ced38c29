"use client";

import { useEffect, useId, useRef, type ReactNode } from "react";
import { Button } from "@/components/ui/button";

interface ConfirmProps {
  isOpen: boolean;
  /** the question, in one sentence */
  title: string;
  /** what follows from it */
  children?: ReactNode;
  /** the verb: "Remove the piece" */
  confirmLabel: string;
  cancelLabel?: string;
  /** why it cannot be confirmed yet */
  refused?: string | false;
  onConfirm: () => void;
  onCancel: () => void;
}

/** Asks before what cannot be undone. The browser's own dialog keeps the focus and closes by Esc. */
export function Confirm({
  isOpen,
  title,
  children,
  confirmLabel,
  cancelLabel = "Keep it",
  refused,
  onConfirm,
  onCancel,
}: ConfirmProps) {
  const dialog = useRef<HTMLDialogElement>(null);
  const heading = useId();
  useEffect(() => {
    const element = dialog.current;
    if (!element) return;
    if (isOpen && !element.open) element.showModal();
    if (!isOpen && element.open) element.close();
  }, [isOpen]);
  return (
    <dialog
      ref={dialog}
      aria-labelledby={heading}
      // Esc closes the dialog by itself; the page has to know.
      onClose={() => isOpen && onCancel()}
      className="w-[min(28rem,calc(100vw-2rem))] rounded border border-ink bg-paper p-5"
    >
      <h2 id={heading}>{title}</h2>
      {children && <div className="mt-2 text-body text-ink-2">{children}</div>}
      <div className="mt-5 flex flex-wrap justify-end gap-2.5">
        <Button onClick={onCancel} autoFocus>
          {cancelLabel}
        </Button>
        <Button kind="main" refused={refused} onClick={onConfirm}>
          {confirmLabel}
        </Button>
      </div>
    </dialog>
  );
}
