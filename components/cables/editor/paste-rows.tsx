"use client";

import { useId, useState } from "react";
import { useEntryForm } from "@/components/cables/editor/entry-form";
import { Select } from "@/components/ui/select";
import { StateNote } from "@/components/ui/state-mark";
import type { RowTexts } from "@/lib/cables/editor/texts";
import { type PastedTable, readPastedTable } from "@/lib/cables/paste-table";
import { frequencyUnits, type FrequencyUnit, lossUnits, type LossUnit } from "@/lib/cables/pasting/units";

const shown = (value: number) => String(Number(value.toPrecision(9)));

/** Rows as the table has them: MHz, and the unit they came in. */
function rowsOf({ rows, lossUnit }: PastedTable): { rows: RowTexts[]; unit: LossUnit } {
  const unit = lossUnit ?? "dB/100 m";
  return {
    unit,
    rows: rows.map(({ frequencyHz, lossDbPerM }) => ({
      ...{ frequency: shown(frequencyHz / 1e6), loss: shown(lossDbPerM / lossUnits[unit]), isLeftOut: false, note: "" },
    })),
  };
}

/** A place to paste a table into: read at once, and it says how; what cannot be told is asked. */
export function PasteRows() {
  const { form } = useEntryForm();
  const id = useId();
  const [text, setText] = useState("");
  const [told, setTold] = useState<{ frequencyUnit?: FrequencyUnit; lossUnit?: LossUnit }>({});
  const [asked, setAsked] = useState<readonly ("frequencyUnit" | "lossUnit")[]>([]);
  const answer = text.trim() === "" ? null : readPastedTable(text, told);

  function take(next: string, with_: typeof told) {
    setText(next);
    setTold(with_);
    const read = next.trim() === "" ? null : readPastedTable(next, with_);
    if (read && !read.ok && read.asks) setAsked((before) => [...new Set([...before, read.asks!])]);
    if (!read?.ok) return;
    const { rows, unit } = rowsOf(read.table);
    form.setValue("lossUnit", unit, { shouldDirty: true });
    form.setValue("rows", rows, { shouldDirty: true });
  }
  const choice = (unit: "frequencyUnit" | "lossUnit", label: string, units: readonly string[]) => (
    <Select
      label={label}
      controlSize="small"
      value={told[unit] ?? ""}
      onChange={(event) => take(text, { ...told, [unit]: event.target.value || undefined })}
    >
      <option value="">Not said</option>
      {units.map((each) => (
        <option key={each} value={each}>
          {each}
        </option>
      ))}
    </Select>
  );
  return (
    <div className="mt-2">
      <label htmlFor={id} className="text-note text-ink-2">
        Paste rows from a spreadsheet or a sheet; the first row may name the units
      </label>
      <textarea
        id={id}
        rows={2}
        value={text}
        spellCheck={false}
        onChange={(event) => take(event.target.value, {})}
        placeholder={"MHz\tdB/100 m"}
        className="figures block w-full rounded-t border border-b-[1.5px] border-rule border-b-ink bg-field px-2 py-1 text-label placeholder:text-ink-3 phone:text-section"
      />
      {asked.length > 0 && (
        <div className="mt-1.5 flex gap-3">
          {asked.includes("frequencyUnit") &&
            choice("frequencyUnit", "Unit of the frequency", Object.keys(frequencyUnits))}
          {asked.includes("lossUnit") && choice("lossUnit", "Unit of the loss", Object.keys(lossUnits))}
        </div>
      )}
      <div role="status" className="mt-1">
        {answer?.ok && <StateNote state="pass">{answer.table.readAs}</StateNote>}
        {answer && !answer.ok && <StateNote state="fail">{answer.message}</StateNote>}
      </div>
    </div>
  );
}
