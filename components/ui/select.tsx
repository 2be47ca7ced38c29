import { useId, type ComponentProps } from "react";
import { FieldFrame, describedBy, fieldColours, fieldEdge, type Labelled } from "@/components/ui/field";

export interface SelectProps extends ComponentProps<"select">, Labelled {
  controlSize?: "normal" | "small";
}

/** The browser's own picker in the product's clothes; options as children. */
export function Select({
  label,
  hint,
  error,
  isLabelHidden,
  className,
  controlSize = "normal",
  id: given,
  children,
  ...select
}: SelectProps) {
  const made = useId();
  const id = given ?? made;
  const height = controlSize === "small" ? "h-6.25 text-label" : "h-7.25 text-body";
  return (
    <FieldFrame {...{ id, label, hint, error, isLabelHidden, className }}>
      <span className={`${fieldEdge} ${fieldColours(!!error)} ${height} relative phone:h-11 phone:text-section`}>
        <select
          {...select}
          id={id}
          aria-invalid={error ? true : undefined}
          aria-describedby={describedBy(id, hint, error)}
          className="h-full w-full min-w-0 appearance-none bg-transparent pr-6 pl-2 outline-none [&>option]:bg-field [&>option]:text-ink"
        >
          {children}
        </select>
        <svg width="8" height="6" aria-hidden="true" className="pointer-events-none absolute right-2.5">
          <path d="M0 0H8L4 6z" fill="var(--ink-2)" />
        </svg>
      </span>
    </FieldFrame>
  );
}
