import type { ReactNode } from "react";

interface SectionProps {
  title: ReactNode;
  /** a few words after or under the title */
  note?: ReactNode;
  /** stands at the right end of the title's line */
  aside?: ReactNode;
  /** "strong" has the ink rule of a section, "light" a thin one, "none" no rule */
  rule?: "strong" | "light" | "none";
  /** the note under the title instead of after it */
  isNoteBelow?: boolean;
  level?: 2 | 3;
  id?: string;
  className?: string;
  children?: ReactNode;
}

const rules = {
  strong: "border-t-[1.5px] border-ink pt-1.75",
  light: "border-t border-rule pt-1.75",
  none: "",
};

/** A part of a page, separated by a rule as in a ledger. */
export function Section({
  title,
  note,
  aside,
  rule = "strong",
  isNoteBelow = false,
  level = 2,
  id,
  className = "",
  children,
}: SectionProps) {
  const Heading = level === 2 ? "h2" : "h3";
  return (
    <section id={id} className={`${rules[rule]} ${className}`}>
      <div className="flex flex-wrap items-baseline justify-between gap-x-4">
        <div className="flex flex-wrap items-baseline gap-x-3">
          <Heading>{title}</Heading>
          {note && !isNoteBelow && <p className="text-label text-ink-2">{note}</p>}
        </div>
        {aside}
      </div>
      {note && isNoteBelow && <p className="text-label text-ink-2">{note}</p>}
      {children}
    </section>
  );
}
