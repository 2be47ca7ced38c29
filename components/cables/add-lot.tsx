"use client";

import { useState, type FormEvent } from "react";
import { Button } from "@/components/ui/button";
import { Field } from "@/components/ui/field";
import { StateNote } from "@/components/ui/state-mark";
import type { Lot } from "@/lib/cables/lots/schema";
import { readQuantity, type Read } from "@/lib/format/read-quantity";
import { readVelocityFactor } from "@/lib/format/read-velocity-factor";
import { AwayError, call, ProblemError } from "@/lib/http/call";

interface FieldOf {
  name: string;
  label: string;
  hint?: string;
  /** key on the wire; texts go as they are */
  read?: (text: string) => Read<number>;
}

const fields: readonly FieldOf[] = [
  { name: "lot", label: "Lot" },
  { name: "reel", label: "Reel", hint: "where the figures are one reel's" },
  { name: "measuredAt", label: "Measured on", hint: "2026-03-01" },
  { name: "lengthM", label: "Length measured", hint: "20 m", read: (text) => readQuantity("length", text) },
  { name: "temperatureC", label: "Temperature", hint: "20 °C", read: (text) => readQuantity("temperature", text) },
  { name: "z0Ohm", label: "Impedance", hint: "50.2 Ω", read: (text) => readQuantity("resistance", text) },
  { name: "velocityFactor", label: "Velocity factor", hint: "0.843 or 84.3 %", read: readVelocityFactor },
  {
    name: "loopResistanceOhmPerM",
    label: "Loop resistance, dc",
    hint: "8.9 Ω/km",
    read: (text) => readQuantity("resistancePerLength", text),
  },
  { name: "method", label: "Instrument and method" },
];

type Texts = Record<string, string>;

/** What the fields say, or what is wrong with them. */
export function readLot(texts: Texts): { body: Record<string, unknown> } | { wrong: Texts } {
  const body: Record<string, unknown> = {};
  const wrong: Texts = {};
  for (const { name, read } of fields) {
    const text = texts[name]?.trim() ?? "";
    if (text === "") continue;
    const value = read?.(text);
    if (!value) body[name] = text;
    else if (value.ok) body[name] = value.value;
    else wrong[name] = value.message;
  }
  return Object.keys(wrong).length > 0 ? { wrong } : { body };
}

/** Fields for one measured lot; units as people type them. */
export function AddLot({ path, onAdded }: { path: string; onAdded: () => void }) {
  const [texts, setTexts] = useState<Texts>({});
  const [wrong, setWrong] = useState<Texts>({});
  const [trouble, setTrouble] = useState<string>();
  async function add(event: FormEvent) {
    event.preventDefault();
    const read = readLot(texts);
    setTrouble(undefined);
    setWrong("wrong" in read ? read.wrong : {});
    if ("wrong" in read) return;
    try {
      await call<Lot>(`${path}/lots`, { method: "POST", body: read.body });
      setTexts({});
      onAdded();
    } catch (error) {
      if (!(error instanceof ProblemError || error instanceof AwayError)) throw error;
      const errors = error instanceof ProblemError ? (error.problem.errors ?? []) : [];
      const known = errors.filter(({ path: name }) => fields.some((each) => each.name === name));
      setWrong(Object.fromEntries(known.map(({ path: name, message }) => [name, message])));
      if (known.length === 0) setTrouble(errors[0]?.message ?? error.message);
    }
  }
  return (
    <form onSubmit={add} className="mt-2 grid grid-cols-2 gap-2.5 phone:grid-cols-1">
      {fields.map(({ name, label, hint, read }) => (
        <Field
          key={name}
          label={label}
          hint={hint}
          isFigure={read !== undefined}
          value={texts[name] ?? ""}
          error={wrong[name]}
          onChange={(event) => setTexts({ ...texts, [name]: event.target.value })}
        />
      ))}
      {trouble && (
        <div role="alert" className="col-span-full">
          <StateNote state="fail">{trouble}</StateNote>
        </div>
      )}
      <Button type="submit" size="small" className="self-end justify-self-start">
        Add the lot
      </Button>
    </form>
  );
}
