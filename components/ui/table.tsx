import type { ComponentProps } from "react";

/** A ruled table: a rule under the head, thin rules between rows, figures at the right. */
export function Table({ className = "", ...rest }: ComponentProps<"table">) {
  return <table {...rest} className={`w-full border-collapse text-label ${className}`} />;
}

interface CellLook {
  /** figures and their heads stand at the right */
  isRight?: boolean;
}

export function HeadCell({ isRight = false, className = "", scope = "col", ...rest }: ComponentProps<"th"> & CellLook) {
  const { "aria-label": name, children, ...cell } = rest;
  return (
    <th
      {...cell}
      scope={scope}
      className={`border-b border-rule py-1 align-bottom text-label font-[560] whitespace-nowrap text-ink-2 ${isRight ? "pl-2 text-right" : "pr-2 text-left"} ${className}`}
    >
      {children}
      {name && <span className="sr-only">{name}</span>}
    </th>
  );
}

export function Cell({ isRight = false, className = "", ...rest }: ComponentProps<"td"> & CellLook) {
  return (
    <td
      {...rest}
      className={`border-b border-line py-1.25 align-baseline ${isRight ? "pl-2 text-right" : "pr-2 text-left"} ${className}`}
    />
  );
}

/** The head of a row. */
export function RowHead({ className = "", ...rest }: ComponentProps<"th">) {
  return (
    <th
      {...rest}
      scope="row"
      className={`border-b border-line py-1.25 pr-2 text-left align-baseline font-normal wrap-anywhere ${className}`}
    />
  );
}
