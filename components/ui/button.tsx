import type { Route } from "next";
import Link from "next/link";
import { useId, type ComponentProps, type ReactNode } from "react";

export type ButtonKind = "main" | "plain" | "quiet";
export type ButtonSize = "normal" | "small" | "touch";

const kinds: Record<ButtonKind, string> = {
  main: "border-copper bg-copper text-on-copper hover:border-ink hover:bg-ink hover:text-paper",
  plain: "border-ink bg-transparent text-ink hover:bg-hemp active:bg-hemp",
  quiet: "border-transparent bg-transparent text-copper hover:underline underline-offset-3",
};

const sizes: Record<ButtonSize, string> = {
  normal: "h-7.5 text-control",
  small: "h-6.25 text-label",
  touch: "h-11 text-row",
};

const paddings: Record<ButtonSize, string> = { normal: "px-3.25", small: "px-2.25", touch: "px-4" };

const shape =
  "inline-flex shrink-0 items-center justify-center gap-1.75 rounded border-[1.25px] font-[560] whitespace-nowrap no-underline phone:min-h-11";

const refusedLook = "border-dashed border-rule bg-transparent text-ink-3 cursor-not-allowed";

/** The look of a button, for anything that must look like one. */
export function buttonClass(kind: ButtonKind = "plain", size: ButtonSize = "normal", isRefused = false): string {
  return [shape, sizes[size], kind === "quiet" ? "px-1" : paddings[size], isRefused ? refusedLook : kinds[kind]].join(
    " ",
  );
}

interface Look {
  kind?: ButtonKind;
  size?: ButtonSize;
}

export interface ButtonProps extends ComponentProps<"button">, Look {
  /** why it cannot be done now; the button stays in reach of the keyboard and says so */
  refused?: string | null | false;
}

/** A button. `type` is "button" unless said otherwise. */
export function Button({ kind, size, refused, className = "", type = "button", onClick, ...rest }: ButtonProps) {
  const reason = useId();
  if (!refused)
    return <button {...rest} type={type} onClick={onClick} className={`${buttonClass(kind, size)} ${className}`} />;
  return (
    <>
      <button
        {...rest}
        type="button"
        aria-disabled="true"
        aria-describedby={reason}
        title={refused}
        className={`${buttonClass(kind, size, true)} ${className}`}
      />
      <span id={reason} hidden>
        {refused}
      </span>
    </>
  );
}

interface ButtonLinkProps extends Look {
  href: Route;
  children: ReactNode;
  className?: string;
}

/** A link that looks like a button, for going somewhere rather than doing something. */
export function ButtonLink({ href, kind, size, className = "", children }: ButtonLinkProps) {
  return (
    <Link href={href} className={`${buttonClass(kind, size)} ${className}`}>
      {children}
    </Link>
  );
}
