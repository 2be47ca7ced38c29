import { useId, type ComponentProps, type ReactNode } from "react";
import { StateGlyph } from "@/components/ui/state-mark";

export interface Labelled {
  label: ReactNode;
  /** a few words under the field */
  hint?: ReactNode;
  /** what is wrong and what to do; marks the field */
  error?: string;
  /** keeps the label for screen readers only */
  isLabelHidden?: boolean;
  /** the label at 12 px instead of 11 */
  isLabelLarge?: boolean;
  /** of the whole: label, field, hint */
  className?: string;
}

export interface FieldProps extends ComponentProps<"input">, Labelled {
  unit?: ReactNode;
  /** figures are mono */
  isFigure?: boolean;
  /** stands inside the field at its right end: a button, a key cap */
  trailing?: ReactNode;
  controlSize?: "normal" | "small" | "large";
}

export const fieldEdge =
  "flex items-center gap-1.5 rounded-t border border-b-[1.5px] bg-field has-focus-visible:border-copper has-focus-visible:outline-2 has-focus-visible:outline-copper-wash";

export function fieldColours(isWrong: boolean): string {
  return isWrong ? "border-fail" : "border-rule border-b-ink";
}

const heights = {
  normal: "h-7.25 text-body phone:h-11 phone:text-section",
  small: "h-6.25 text-label phone:h-11 phone:text-section",
  large: "h-10 text-row phone:h-11 phone:text-section",
};

interface FrameProps extends Labelled {
  id: string;
  children: ReactNode;
}

/** Label above, hint and refusal below: the frame that every kind of field stands in. */
export function FieldFrame({
  id,
  label,
  hint,
  error,
  isLabelHidden,
  isLabelLarge,
  className = "",
  children,
}: FrameProps) {
  return (
    <div className={`flex flex-col gap-0.5 ${className}`}>
      <label
        htmlFor={id}
        className={isLabelHidden ? "sr-only" : `text-ink-2 ${isLabelLarge ? "text-label" : "text-note"}`}
      >
        {label}
      </label>
      {children}
      {error && (
        <p id={`${id}-error`} className="flex items-start gap-1.25 text-note text-fail">
          <StateGlyph state="fail" />
          {error}
        </p>
      )}
      {hint && !error && (
        <p id={`${id}-hint`} className="text-note text-ink-3">
          {hint}
        </p>
      )}
    </div>
  );
}

/** Which note describes the field just now. */
export function describedBy(id: string, hint: ReactNode, error?: string): string | undefined {
  return error ? `${id}-error` : hint ? `${id}-hint` : undefined;
}

/** A one-line field. Spread React Hook Form's `register` over it. */
export function Field(props: FieldProps) {
  const {
    label,
    hint,
    error,
    isLabelHidden,
    className,
    unit,
    isFigure = false,
    trailing,
    controlSize = "normal",
    id: given,
    ...input
  } = props;
  const made = useId();
  const id = given ?? made;
  return (
    <FieldFrame {...{ id, label, hint, error, isLabelHidden, className, isLabelLarge: controlSize === "large" }}>
      <span className={`${fieldEdge} ${fieldColours(!!error)} ${heights[controlSize]} px-2`}>
        <input
          {...input}
          id={id}
          aria-invalid={error ? true : undefined}
          aria-describedby={describedBy(id, hint, error)}
          className={`w-full min-w-0 bg-transparent outline-none placeholder:text-ink-3 ${isFigure ? "figures" : ""}`}
        />
        {unit && <span className="unit shrink-0">{unit}</span>}
        {trailing}
      </span>
    </FieldFrame>
  );
}
