"use client";

import { useState } from "react";
import { CablePicker } from "@/components/runs/cable-picker";
import { BandConditions, FrequencyCondition } from "@/components/runs/conditions";
import type { Matching } from "@/components/runs/use-matches";
import { Field } from "@/components/ui/field";
import { asTyped, readQuantity } from "@/lib/format/read-quantity";
import type { QuantityKind } from "@/lib/format/unit-spelling";

interface NumberFieldProps {
  label: string;
  kind: QuantityKind;
  unit?: string;
  value: number | undefined;
  /** an empty field is undefined; without this it is refused */
  canBeEmpty?: boolean;
  set: (value: number | undefined) => void;
}

function NumberField({ label, kind, unit, value, canBeEmpty = false, set }: NumberFieldProps) {
  const [text, setText] = useState(value === undefined ? "" : asTyped(kind, value).replace(/ .*$/, ""));
  const [error, setError] = useState<string>();
  function take(next: string) {
    setText(next);
    if (next.trim() === "" && canBeEmpty) return (setError(undefined), set(undefined));
    const read = readQuantity(kind, next);
    setError(read.ok ? (read.value > 0 ? undefined : "More than 0.") : read.message);
    if (read.ok && read.value > 0) set(read.value);
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

/** What the matches are worked out for. */
export function MatchConditions({ matching }: { matching: Matching }) {
  const { choices, choose, stubLine } = matching;
  return (
    <div className="mt-4 flex flex-wrap items-start gap-3">
      <NumberField
        label="Match to"
        kind="resistance"
        unit="Ω"
        value={choices.targetOhm}
        set={(targetOhm) => targetOhm && choose({ targetOhm })}
      />
      <NumberField
        label="Return loss asked"
        kind="loss"
        unit="dB"
        value={choices.returnLossDb}
        set={(returnLossDb) => returnLossDb && choose({ returnLossDb })}
      />
      <CablePicker
        label="Cut stubs from"
        cableId={stubLine?.cableId ?? ""}
        choose={(stubCableId) => choose({ stubCableId })}
        isAlwaysOpen
      />
      <NumberField
        label="Q of coils"
        kind="number"
        value={choices.coilQ}
        canBeEmpty
        set={(coilQ) => choose({ coilQ })}
      />
      <NumberField
        label="Q of capacitors"
        kind="number"
        value={choices.capacitorQ}
        canBeEmpty
        set={(capacitorQ) => choose({ capacitorQ })}
      />
      <FrequencyCondition />
      <BandConditions />
    </div>
  );
}
