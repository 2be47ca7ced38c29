"use client";

import { LeafForm } from "@/components/runs/leaf-form";
import type { LeafField } from "@/lib/runs/leaf/field";

interface Props<T> {
  fields: LeafField<T>[];
  edited: T;
  write: (next: T, tag: string) => void;
  isInline?: boolean;
}

/** Fields of the run itself, in a row beside what they govern. */
export function ConditionForm<T>(props: Props<T>) {
  return (
    <div className={`flex flex-wrap ${props.isInline ? "items-center gap-1.5" : "items-start gap-3"}`}>
      <LeafForm {...props} path="conditions" />
    </div>
  );
}
