"use client";

import { useState } from "react";
import { Field } from "@/components/ui/field";
import { asTyped, readQuantity } from "@/lib/format/read-quantity";
import type { QuantityKind } from "@/lib/format/unit-spelling";

interface NumberFieldProps {
  label: string;
  kind: QuantityKind;
  /** stands beside the field; without it the unit stands in the text */
  unit?: string;
  value: number | undefined;
  /** an empty field is undefined; without this it is refused */
  canBeEmpty?: boolean;
  /** the largest value taken, and the sentence for what is larger */
  most?: { value: number; message: string };
  set: (value: number | undefined) => void;
}

/** A positive quantity that is not part of the run: typed as people write it, taken as soon as it can be read. */
export function NumberField({ label, kind, unit, value, canBeEmpty = false, most, set }: NumberFieldProps) {
  const [text, setText] = useState(() => textOf(kind, value, unit));
  const [error, setError] = useState<string>();
  function take(next: string) {
    setText(next);
    if (next.trim() === "" && canBeEmpty) return (setError(undefined), set(undefined));
    const read = readQuantity(kind, next);
    if (!read.ok) return setError(read.message);
    if (!(read.value > 0)) return setError("More than 0.");
    if (most && read.value > most.value) return setError(most.message);
    setError(undefined);
    set(read.value);
  }
  return (
    <Field
      label={label}
      unit={unit}
      isFigure
      value={text}
      error={error}
      className="w-24 phone:w-32"
      onChange={(event) => take(event.target.value)}
    />
  );
}

function textOf(kind: QuantityKind, value: number | undefined, unit: string | undefined): string {
  if (value === undefined) return "";
  const text = asTyped(kind, value);
  return unit === undefined ? text : text.replace(/ .*$/, "");
}
