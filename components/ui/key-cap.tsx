import type { ReactNode } from "react";

/** A key of the keyboard. */
export function KeyCap({ children }: { children: ReactNode }) {
  return (
    <kbd className="rounded border border-rule px-1.25 py-0.5 font-figures text-note leading-none font-medium text-ink-2">
      {children}
    </kbd>
  );
}
