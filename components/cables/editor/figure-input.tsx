"use client";

import { useWatch } from "react-hook-form";
import type { KeyboardEvent, ReactNode } from "react";
import { useEntryForm } from "@/components/cables/editor/entry-form";
import { Field } from "@/components/ui/field";
import { figureFields, type FigureName } from "@/lib/cables/editor/fields";
import { nudge } from "@/lib/format/nudge";

interface Props {
  name: FigureName;
  label?: ReactNode;
  isLabelHidden?: boolean;
  /** before the figure: "ε" */
  hint?: string;
  className?: string;
  placeholder?: string;
}

const hasUnit = (text: string) => /[a-zΩ°µ'"%]/i.test(text.replace(/e[+-]?\d/i, ""));

/** A figure of the entry, typed as people write it; the unit beside it counts where none is typed. */
export function FigureInput({ name, label, isLabelHidden, hint, className, placeholder }: Props) {
  const { form, edited } = useEntryForm();
  const path = `figures.${name}` as const;
  const text = useWatch({ control: form.control, name: path });
  const field = figureFields[name];
  const { onChange, onBlur, name: registered, ref } = form.register(path);
  function press(event: KeyboardEvent<HTMLInputElement>) {
    const direction = { ArrowUp: 1, ArrowDown: -1 }[event.key];
    if (!direction || text === "") return;
    event.preventDefault();
    const by = direction * (event.shiftKey ? 10 : event.altKey ? 0.1 : 1);
    form.setValue(path, nudge(text, by), { shouldDirty: true });
  }
  return (
    <Field
      label={label ?? field.label}
      isLabelHidden={isLabelHidden}
      unit={hasUnit(text) ? undefined : field.unit || undefined}
      isFigure
      autoComplete="off"
      error={edited.read.faults[path]}
      hint={edited.read.understood[name] ?? hint}
      onKeyDown={press}
      {...{ className, placeholder, onChange, onBlur, name: registered, ref }}
    />
  );
}
