"use client";

import { useFieldArray, useWatch } from "react-hook-form";
import { useEntryForm } from "@/components/cables/editor/entry-form";
import { FigureInput } from "@/components/cables/editor/figure-input";
import { FitPlot } from "@/components/cables/editor/fit-plot";
import { LossRow } from "@/components/cables/editor/loss-row";
import { PasteRows } from "@/components/cables/editor/paste-rows";
import { SourceFields } from "@/components/cables/editor/source-fields";
import { Button } from "@/components/ui/button";
import { Section } from "@/components/ui/section";
import { Select } from "@/components/ui/select";
import { HeadCell } from "@/components/ui/table";
import { emptyRow } from "@/lib/cables/editor/texts";
import { lossUnits } from "@/lib/cables/pasting/units";

/** The loss table, with what the model says of each row. */
export function LossFields() {
  const { form } = useEntryForm();
  const { fields, append, remove } = useFieldArray({ control: form.control, name: "rows" });
  const unit = useWatch({ control: form.control, name: "lossUnit" });
  return (
    <div className="grid grid-cols-[minmax(320px,5fr)_minmax(0,6fr)] gap-x-8 gap-y-4 folded:grid-cols-1">
      <Section title="3 Loss table" note="paste rows, or type" className="min-w-0">
        <PasteRows />
        <div className="mt-1 grid grid-cols-3 gap-3">
          <Select label="Unit" controlSize="small" {...form.register("lossUnit")}>
            {Object.keys(lossUnits).map((each) => (
              <option key={each} value={each}>
                {each}
              </option>
            ))}
          </Select>
          <Select label="Kind" controlSize="small" {...form.register("tableKind")}>
            <option value="nominal">Nominal</option>
            <option value="typical">Typical</option>
            <option value="maximum">Maximum</option>
            <option value="measured">Measured</option>
          </Select>
          <FigureInput name="tableTemperature" label="Temperature" />
        </div>
        <div className="mt-2 overflow-x-auto" tabIndex={0} role="group" aria-label="Rows of the loss table">
          <table className="w-full border-collapse text-label">
            <thead>
              <tr>
                <HeadCell>MHz</HeadCell>
                <HeadCell>{unit}</HeadCell>
                <HeadCell isRight>model</HeadCell>
                <HeadCell isRight>%</HeadCell>
                <HeadCell isRight aria-label="Leave out or remove" />
              </tr>
            </thead>
            <tbody>
              {fields.map((field, i) => (
                <LossRow key={field.id} index={i} remove={() => remove(i)} />
              ))}
            </tbody>
          </table>
        </div>
        <Button
          size="small"
          className="mt-2"
          onClick={() => append({ ...emptyRow }, { focusName: `rows.${fields.length}.frequency` })}
        >
          Add a row
        </Button>
        <SourceFields way="lossTable" />
      </Section>
      <FitPlot />
    </div>
  );
}
