"use client";

import { useWatch } from "react-hook-form";
import { useEntryForm } from "@/components/cables/editor/entry-form";
import { Checkbox } from "@/components/ui/checkbox";
import { Field } from "@/components/ui/field";
import { Cell } from "@/components/ui/table";
import { lossDbPer100m } from "@/lib/cables/model";
import { lossUnits } from "@/lib/cables/pasting/units";
import { modelAt } from "@/lib/cables/warm-model";
import { digits, frequency, inWords, significantDigits } from "@/lib/format/quantity";

/** Per cent that need no second look. */
const fine = 3;

/** What the model loses at a row, in the unit of the table, and by how much the row is from it. */
function useAgainstModel(index: number): { model: string; percent: number | null; isOdd: boolean } {
  const { edited, form } = useEntryForm();
  const { worked, read, checks } = edited;
  const row = read.inputs.lossTable?.rows[read.table.places[index] ?? -1];
  const warm = worked.model && modelAt(worked.model, read.inputs.lossTable?.temperatureC ?? 20);
  if (!row || !warm) return { model: "–", percent: null, isOdd: false };
  const perM = lossDbPer100m(warm.model, row.frequencyHz) / 100;
  const percent = 100 * (1 - perM / row.lossDbPerM);
  const named = `the row at ${inWords(frequency(row.frequencyHz))}`;
  const isNamed = checks.some(({ culprit, verdict }) => verdict !== "fine" && culprit === named);
  return {
    model: significantDigits(perM / lossUnits[form.getValues("lossUnit")], 4),
    percent,
    isOdd: isNamed || Math.abs(percent) > 2 * fine,
  };
}

/** One row, typed, beside what the model says. */
export function LossRow({ index, remove }: { index: number; remove: () => void }) {
  const { form, edited } = useEntryForm();
  const isLeftOut = useWatch({ control: form.control, name: `rows.${index}.isLeftOut` });
  const { model, percent, isOdd } = useAgainstModel(index);
  const field = (name: "frequency" | "loss", label: string) => (
    <Field
      label={label}
      isLabelHidden
      isFigure
      controlSize="small"
      autoComplete="off"
      error={edited.read.faults[`rows.${index}.${name}`]}
      {...form.register(`rows.${index}.${name}`)}
    />
  );
  return (
    <>
      <tr className={isLeftOut ? "text-ink-3" : ""}>
        <Cell className="w-22 border-b-0">{field("frequency", `Frequency of row ${index + 1}`)}</Cell>
        <Cell className="w-22 border-b-0">{field("loss", `Loss of row ${index + 1}`)}</Cell>
        <Cell isRight className="figures border-b-0">
          {model}
        </Cell>
        <Cell isRight className={`figures border-b-0 ${isOdd ? "font-[650] text-warn" : ""}`}>
          {percent === null ? "–" : `${percent >= 0.05 ? "+" : ""}${digits(percent, 1)}`}
        </Cell>
        <Cell isRight className="border-b-0 whitespace-nowrap">
          <button
            type="button"
            onClick={remove}
            aria-label={`Remove row ${index + 1}`}
            className="link min-h-6 phone:min-h-11"
          >
            Remove
          </button>
        </Cell>
      </tr>
      <tr className={isOdd || isLeftOut ? "" : "hidden"}>
        <Cell className="pt-0" colSpan={5}>
          <span className="flex flex-wrap items-center gap-x-3">
            <Checkbox {...form.register(`rows.${index}.isLeftOut`)}>leave out of the fit</Checkbox>
            <Field
              label={`Why row ${index + 1} is kept or left out`}
              isLabelHidden
              controlSize="small"
              placeholder="or keep it and say why"
              autoComplete="off"
              maxLength={300}
              className="min-w-40 flex-1"
              {...form.register(`rows.${index}.note`)}
            />
          </span>
        </Cell>
      </tr>
    </>
  );
}
