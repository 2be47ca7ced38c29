"use client";

import type { KeyboardEvent } from "react";
import type { Calculator } from "@/components/calculators/use-calculator";
import { Field } from "@/components/ui/field";
import { Select } from "@/components/ui/select";
import type { Inputs, Reader, TypedInput } from "@/lib/calculators/input";
import { nudge } from "@/lib/format/nudge";

interface Props<I extends Inputs> {
  of: Calculator<I>;
  name: keyof I & string;
}

const widths = { narrow: "w-20 phone:w-28", normal: "w-26 phone:w-36", wide: "w-40 phone:w-full" };

/** One field of a calculator, whatever it asks for. Nothing where it is not asked for just now. */
export function InputField<I extends Inputs>({ of, name }: Props<I>) {
  const input = of.inputs[name];
  if (!input || !of.shown.includes(name)) return null;
  const text = of.texts[name] ?? "";
  if (input.input === "typed")
    return (
      <TypedField
        input={input}
        reader={of.reader}
        text={text}
        error={of.problems[name]}
        set={(next) => of.set(name, next)}
      />
    );
  if (input.input === "cable") return null;
  return (
    <Select
      label={input.label}
      value={text}
      error={of.problems[name]}
      className="w-44 phone:w-full"
      onChange={(event) => of.set(name, event.target.value)}
    >
      {input.options.map((option) => (
        <option key={option.value} value={option.value}>
          {option.label}
        </option>
      ))}
    </Select>
  );
}

interface TypedProps {
  input: TypedInput<unknown>;
  reader: Reader | null;
  text: string;
  error?: string;
  set: (text: string) => void;
}

/** What a text was understood as, where that says more than the text itself. */
function understood(input: TypedInput<unknown>, text: string, reader: Reader): string | undefined {
  if (/^[\d.\s]*$/.test(text)) {
    const read = input.read(text, reader);
    return read.ok && read.understood.includes("read as") ? `= ${read.understood}` : undefined;
  }
  const read = input.read(text, reader);
  const bare = (words: string) => words.replace(/[\s\u00a0\u202f]/g, "").toLowerCase();
  if (!read.ok || !read.understood || read.value === 0) return undefined;
  return bare(read.understood) === bare(text) ? undefined : `= ${read.understood}`;
}

function TypedField({ input, reader, text, error, set }: TypedProps) {
  function step(event: KeyboardEvent<HTMLInputElement>) {
    const direction = { ArrowUp: 1, ArrowDown: -1 }[event.key];
    if (!direction) return;
    event.preventDefault();
    set(nudge(text, direction * (event.shiftKey ? 10 : event.altKey ? 0.1 : 1)));
  }
  return (
    <Field
      label={input.label}
      value={text}
      unit={/[^\d\s.,+\-\u2212ji]/.test(text) ? undefined : input.unit}
      isFigure
      maxLength={80}
      autoComplete="off"
      spellCheck={false}
      className={widths[input.width]}
      error={error}
      hint={reader ? understood(input, text, reader) : undefined}
      onKeyDown={step}
      onChange={(event) => set(event.target.value)}
    />
  );
}
