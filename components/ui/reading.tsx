import type { ReactNode } from "react";
import { Figure } from "@/components/ui/figure";
import { StateGlyph, type MarkedState } from "@/components/ui/state-mark";

interface ReadingProps {
  label: string;
  digits: string;
  unit?: string;
  spoken?: string;
  state?: MarkedState;
  /** "at least 18.0, 156.0–162.1 MHz" */
  target?: ReactNode;
}

const words: Record<MarkedState, string> = { pass: "met", warn: "look at this", fail: "missed", none: "not given yet" };

/** One headline figure: label, value, unit, state, target. Stand several in a `Readings`. */
export function Reading({ label, digits, unit, spoken, state, target }: ReadingProps) {
  return (
    <div className="min-w-0 flex-1 border-l border-rule pl-3 phone:pl-2.5">
      <dt className="text-label text-ink-2">{label}</dt>
      <dd className="text-figure font-medium">
        <Figure digits={digits} unit={unit} spoken={spoken} className="[&_.unit]:text-label" />
      </dd>
      {(state || target) && (
        <dd className="flex items-start gap-1.25 text-note text-ink-2">
          {state && <StateGlyph state={state} />}
          {state && <span className="sr-only">{words[state]}: </span>}
          <span>{target}</span>
        </dd>
      )}
    </div>
  );
}

/** The row of headline figures at the head of a page. */
export function Readings({ children, className = "" }: { children: ReactNode; className?: string }) {
  return <dl className={`flex gap-3 ${className}`}>{children}</dl>;
}
