import type { ComponentProps, ReactNode } from "react";

interface CheckboxProps extends Omit<ComponentProps<"input">, "type"> {
  children: ReactNode;
}

/** A box to tick with its words; the whole line can be pressed. */
export function Checkbox({ children, className = "", ...input }: CheckboxProps) {
  return (
    <label className={`flex min-h-6 items-center gap-2 text-label phone:min-h-11 ${className}`}>
      <span className="relative flex size-3.5 shrink-0">
        <input
          {...input}
          type="checkbox"
          className="peer size-3.5 appearance-none rounded border-[1.4px] border-rule bg-field checked:border-copper checked:bg-copper"
        />
        <svg
          viewBox="0 0 14 14"
          aria-hidden="true"
          className="pointer-events-none absolute inset-0 hidden peer-checked:block"
        >
          <path d="M3 7l3 3 5-6" fill="none" stroke="var(--on-copper)" strokeWidth="1.8" />
        </svg>
      </span>
      {children}
    </label>
  );
}
