"use client";

import { useEntryForm } from "@/components/cables/editor/entry-form";
import { Field } from "@/components/ui/field";
import { Select } from "@/components/ui/select";
import { sourceParts, type SourceWay } from "@/lib/cables/editor/texts";

const kindWords = {
  "": "Not named",
  standard: "Standard",
  dataSheet: "Data sheet",
  construction: "Construction, measured",
  measurement: "Measurement",
  estimate: "Estimate",
} as const;

const partWords: Record<(typeof sourceParts)[number], string> = {
  title: "Title",
  issue: "Issue or date",
  page: "Page",
  checkedBy: "Checked by",
  instrument: "Instrument",
  calibration: "Calibration",
};

/** Where the figures of one way come from. */
export function SourceFields({ way }: { way: SourceWay }) {
  const { form } = useEntryForm();
  return (
    <details className="mt-3">
      <summary className="link text-label">Where these figures come from</summary>
      <div className="mt-2 grid grid-cols-[repeat(auto-fill,minmax(8rem,1fr))] gap-x-3 gap-y-2.5 phone:grid-cols-2">
        <Select label="Kind of source" {...form.register(`sources.${way}.kind`)}>
          {Object.entries(kindWords).map(([kind, words]) => (
            <option key={kind} value={kind}>
              {words}
            </option>
          ))}
        </Select>
        {sourceParts.map((part) => (
          <Field
            key={part}
            label={partWords[part]}
            autoComplete="off"
            maxLength={120}
            {...form.register(`sources.${way}.${part}`)}
          />
        ))}
      </div>
    </details>
  );
}
