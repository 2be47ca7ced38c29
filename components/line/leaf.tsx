import type { ReactNode } from "react";

interface LeafProps {
  /** middle of the piece it belongs to, px from the leaf's left edge */
  notchX: number;
  children: ReactNode;
  name: string;
}

/** The editor of a piece: it opens under the strip and points at its piece. */
export function Leaf({ notchX, name, children }: LeafProps) {
  return (
    <section data-leaf aria-label={name} className="relative border-t-2 border-copper bg-copper-wash px-4 pt-2.5 pb-3">
      <svg
        width="22"
        height="12"
        aria-hidden="true"
        className="absolute -top-[11px] overflow-visible"
        style={{ left: notchX - 11 }}
      >
        <path d="M0 8.5L11 -1L22 8.5V12H0Z" fill="var(--copper-wash)" />
        <path d="M-2 10H0L11 0L22 10H24" fill="none" stroke="var(--copper)" strokeWidth="2" strokeLinejoin="round" />
      </svg>
      {children}
    </section>
  );
}
