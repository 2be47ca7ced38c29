"use client";

import { useState, type ChangeEvent, type KeyboardEvent } from "react";
import { nudge } from "@/lib/format/nudge";
import type { QuantityKind } from "@/lib/format/unit-spelling";

export interface TypedQuantity {
  kind: QuantityKind;
  /** SI; undefined where nothing is asked */
  value: number | undefined;
  /** how the value stands in the field while nobody types */
  text: (value: number) => string;
  onValue: (value: number | undefined) => void;
  /** an empty field means nothing is asked */
  isOptional?: boolean;
  /** taken where a figure is typed without one */
  usualUnit?: string;
  /** a sentence where the value cannot be */
  refuse?: (value: number) => string | undefined;
}

interface Typed {
  text: string;
  /** not read yet: the reader is still on its way */
  isUnread?: boolean;
  /** the field has been left meanwhile */
  isLeft?: boolean;
  error?: string;
  understood?: string;
}

// Reading what people type needs mathjs. It is fetched when somebody is about to type, not with the page.
const reader = () => import("@/lib/format/read-quantity");

/**
 * A quantity typed as people write it: what can be read takes effect while typing, what cannot stays with a sentence.
 * Give `input` to the field.
 */
export function useTypedQuantity(props: TypedQuantity) {
  const { kind, value, text, onValue, isOptional = false, usualUnit = "", refuse } = props;
  const [typed, setTyped] = useState<Typed | null>(null);
  const shown = typed?.text ?? (value === undefined ? "" : text(value));

  async function take(next: string) {
    setTyped({ text: next, isUnread: true });
    if (next.trim() === "" && isOptional) {
      setTyped({ text: next });
      return onValue(undefined);
    }
    const { readQuantity } = await reader();
    const isBare = /^[\s\d.,+\-\u2212]*$/.test(next);
    const read = readQuantity(kind, isBare && next.trim() ? `${next} ${usualUnit}` : next);
    const error = read.ok ? refuse?.(read.value) : read.message;
    const understood = read.ok && !isBare ? `= ${read.understood}` : undefined;
    // What was typed since then is not overwritten.
    setTyped((now) => {
      if (now?.text !== next) return now;
      return now.isLeft && !error ? null : { text: next, error, understood };
    });
    if (read.ok && !error) onValue(read.value);
  }
  function press(event: KeyboardEvent<HTMLInputElement>) {
    if (event.key === "Escape" && typed?.error) {
      event.stopPropagation();
      setTyped(null);
    }
    const direction = { ArrowUp: 1, ArrowDown: -1 }[event.key];
    if (!direction || shown === "") return;
    event.preventDefault();
    void take(nudge(shown, direction * (event.shiftKey ? 10 : event.altKey ? 0.1 : 1)));
  }
  return {
    error: typed?.error,
    understood: typed?.understood,
    input: {
      value: shown,
      autoComplete: "off",
      onFocus: () => void reader(),
      onChange: (event: ChangeEvent<HTMLInputElement>) => void take(event.target.value),
      onBlur: () => setTyped((now) => (now?.isUnread ? { ...now, isLeft: true } : now?.error ? now : null)),
      onKeyDown: press,
    },
  };
}
