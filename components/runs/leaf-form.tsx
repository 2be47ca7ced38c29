"use client";

import { useEffect, useRef, type KeyboardEvent } from "react";
import { useForm, useWatch, type Control, type UseFormRegister, type UseFormSetValue } from "react-hook-form";
import { CablePicker } from "@/components/runs/cable-picker";
import { useRunEditor } from "@/components/runs/run-editor";
import { Field } from "@/components/ui/field";
import { Select } from "@/components/ui/select";
import { nudge } from "@/lib/format/nudge";
import { readImpedance, readQuantity } from "@/lib/format/read-quantity";
import type { LeafField, TypedField } from "@/lib/runs/leaf/field";

type Texts = Record<string, string>;

const widths = { narrow: "w-18 phone:w-24", normal: "w-24 phone:w-32", wide: "w-34 phone:w-40" };

interface LeafFormProps<T> {
  fields: LeafField<T>[];
  edited: T;
  /** path on the wire of what is edited, "elements.2" */
  path: string;
  write: (next: T, tag: string) => void;
  /** small fields in the middle of a heading: labels are for screen readers only */
  isInline?: boolean;
}

/** The fields of one piece. What can be read takes effect while typing; what cannot stays, with its sentence. */
export function LeafForm<T>({ fields, edited, path, write, isInline = false }: LeafFormProps<T>) {
  const { faults, canEdit } = useRunEditor();
  const texts = Object.fromEntries(fields.map((f) => [f.name, faults[`${path}.${f.name}`]?.text ?? f.text(edited)]));
  const { register, control, reset, setValue } = useForm<Texts>({ defaultValues: texts });
  const written = useRef<T>(edited);

  // An undo or someone else's version changes the piece behind the fields: they follow. What was typed here does not.
  useEffect(() => {
    if (written.current === edited) return;
    written.current = edited;
    reset(texts);
    // eslint-disable-next-line react-hooks/exhaustive-deps
  }, [edited]);

  const put = (next: T, name: string) => {
    written.current = next;
    write(next, `${path}.${name}`);
  };
  return (
    <>
      {fields
        .filter((field) => field.isShown?.(edited) ?? true)
        .map((field) => {
          if (field.input === "line")
            return (
              <CablePicker
                key={field.name}
                whenNone="own model"
                cableId={field.text(edited)}
                choose={(cableId) => put(field.write(edited, { cableId }), field.name)}
              />
            );
          if (field.input === "chosen")
            return (
              <Select
                key={field.name}
                label={field.label}
                value={field.text(edited)}
                disabled={!canEdit}
                onChange={(event) => put(field.write(edited, event.target.value), field.name)}
              >
                {field.options.map(({ value, label }) => (
                  <option key={value} value={value}>
                    {label}
                  </option>
                ))}
              </Select>
            );
          return (
            <Typed
              key={field.name}
              {...{ field, path, register, control, setValue, isInline }}
              write={(value) => put(field.write(edited, value), field.name)}
            />
          );
        })}
    </>
  );
}

interface TypedProps<T> {
  field: TypedField<T>;
  path: string;
  register: UseFormRegister<Texts>;
  control: Control<Texts>;
  setValue: UseFormSetValue<Texts>;
  isInline: boolean;
  write: (value: never) => void;
}

/** What a text with its own unit was understood as; a bare figure needs no such note. */
function understood(kind: TypedField<unknown>["kind"], text: string): string | undefined {
  if (kind === "words" || text.trim() === "" || (kind !== "impedance" && /^[\d.\s]*$/.test(text))) return undefined;
  const read = kind === "impedance" ? readImpedance(text) : readQuantity(kind, text);
  const said = read.ok ? read.understood.replace("\u00a0", " ") : undefined;
  return said === undefined || said === text.trim() ? undefined : `= ${said}`;
}

function Typed<T>({ field, path, register, control, setValue, isInline, write }: TypedProps<T>) {
  const { faults, setFault, canEdit } = useRunEditor();
  const at = `${path}.${field.name}`;
  const text = useWatch({ control, name: field.name }) ?? "";

  function take(next: string) {
    const read = field.schema.safeParse(next);
    setFault(
      at,
      read.success ? null : { text: next, message: read.error.issues[0]?.message ?? "This cannot be read." },
    );
    if (read.success) write(read.data as never);
  }
  function step(event: KeyboardEvent<HTMLInputElement>) {
    const direction = { ArrowUp: 1, ArrowDown: -1 }[event.key];
    if (!direction || field.kind === "words") return;
    event.preventDefault();
    const next = nudge(text, direction * (event.shiftKey ? 10 : event.altKey ? 0.1 : 1));
    setValue(field.name, next);
    take(next);
  }
  return (
    <Field
      label={field.label}
      isLabelHidden={isInline}
      controlSize={isInline ? "small" : "normal"}
      unit={/[a-zA-ZΩ°µ]/.test(text.replace(/j/g, "")) ? undefined : field.unit}
      isFigure
      disabled={!canEdit}
      className={widths[field.width]}
      error={faults[at]?.message}
      hint={understood(field.kind, text)}
      autoComplete="off"
      onKeyDown={step}
      {...register(field.name, { onChange: (event: { target: { value: string } }) => take(event.target.value) })}
    />
  );
}
