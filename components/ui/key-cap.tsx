import type { ReactNode } from "react";

interface Props {
  /** in the colour of what it stands on: a button that is filled */
  isOnFill?: boolean;
  children: ReactNode;
}

/** A key of the keyboard. */
export function KeyCap({ isOnFill = false, children }: Props) {
  const colour = isOnFill ? "border-current" : "border-rule text-ink-2";
  return (
    <kbd className={`rounded border px-1.25 py-0.5 font-figures text-note leading-none font-medium ${colour}`}>
      {children}
    </kbd>
  );
}
