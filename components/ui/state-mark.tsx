import type { ReactNode } from "react";

export type MarkedState = "pass" | "warn" | "fail" | "none";

const colours: Record<MarkedState, string> = {
  pass: "text-pass",
  warn: "text-warn",
  fail: "text-fail",
  none: "text-ink-3",
};

const words: Record<MarkedState, string> = {
  pass: "met",
  warn: "look at this",
  fail: "missed",
  none: "not given yet",
};

function Shape({ state }: { state: MarkedState }) {
  switch (state) {
    case "pass":
      return (
        <>
          <circle cx="6.5" cy="6.5" r="6" fill="currentColor" />
          <path d="M3.6 6.7l2 2 3.7-4.2" fill="none" stroke="var(--paper)" strokeWidth="1.6" />
        </>
      );
    case "warn":
      return (
        <>
          <path d="M6.5 .6L12.9 12.4H.1z" fill="currentColor" />
          <path d="M6.5 4.4v4M6.5 9.6v1.4" stroke="var(--paper)" strokeWidth="1.5" />
        </>
      );
    case "fail":
      return (
        <>
          <rect x=".6" y=".6" width="11.8" height="11.8" fill="currentColor" />
          <path d="M3.8 3.8l5.4 5.4M9.2 3.8L3.8 9.2" stroke="var(--paper)" strokeWidth="1.6" />
        </>
      );
    case "none":
      return (
        <circle cx="6.5" cy="6.5" r="5.4" fill="none" stroke="currentColor" strokeWidth="1.2" strokeDasharray="2 2" />
      );
  }
}

/** The outline alone: disc, triangle, square, dashed ring. Something beside it must say the word. */
export function StateGlyph({ state, size = 13 }: { state: MarkedState; size?: number }) {
  return (
    <svg
      width={size}
      height={size}
      viewBox="0 0 13 13"
      aria-hidden="true"
      className={`shrink-0 overflow-visible ${colours[state]}`}
    >
      <Shape state={state} />
    </svg>
  );
}

interface StateMarkProps {
  state: MarkedState;
  /** the word; without it the state's own word is there for screen readers only */
  children?: ReactNode;
  className?: string;
}

/** A state: its outline and its word, never its colour alone. */
export function StateMark({ state, children, className = "" }: StateMarkProps) {
  return (
    <span
      className={`inline-flex items-center gap-1.25 text-[0.78125rem] font-[560] whitespace-nowrap ${colours[state]} ${className}`}
    >
      <StateGlyph state={state} />
      {children ?? <span className="sr-only">{words[state]}</span>}
    </span>
  );
}

/** A sentence with a state at its head; it wraps. */
export function StateNote({ state, children, className = "" }: StateMarkProps) {
  return (
    <p className={`flex items-start gap-2 text-label ${className}`}>
      <span className="mt-0.5">
        <StateGlyph state={state} />
      </span>
      <span className="sr-only">{words[state]}: </span>
      <span>{children}</span>
    </p>
  );
}
