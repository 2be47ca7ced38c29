"use client";

import { useFormState } from "react-hook-form";
import { useEntryForm } from "@/components/cables/editor/entry-form";
import { FigureInput } from "@/components/cables/editor/figure-input";
import { Field } from "@/components/ui/field";
import { Section } from "@/components/ui/section";
import { Select } from "@/components/ui/select";
import { familyWords } from "@/components/cables/words";

/** What the cable is called and what it may be used for. */
export function Particulars() {
  const { form, edited, saving } = useEntryForm();
  const { faults } = edited.read;
  const { isDirty, touchedFields } = useFormState({ control: form.control });
  // Nothing is wrong with a form nobody has begun.
  const isBegun = isDirty || touchedFields.designation;
  // What an approved entry is called stays: runs and sheets name it.
  const isNamed = saving.saved !== null && !saving.saved.isCurrent;
  return (
    <Section title="The cable">
      <div className="mt-2 grid grid-cols-4 gap-x-3 gap-y-2.5 phone:grid-cols-1">
        <Field
          label="Designation"
          autoComplete="off"
          readOnly={isNamed}
          hint={isNamed ? "Stays: runs and sheets name it." : undefined}
          error={isBegun ? faults.designation : undefined}
          {...form.register("designation")}
        />
        <Field
          label="Also called"
          autoComplete="off"
          readOnly={isNamed}
          error={faults.aliases}
          hint="separated by commas"
          {...form.register("aliases")}
        />
        <Field label="What it is" autoComplete="off" error={faults.name} {...form.register("name")} />
        <Select label="Family" {...form.register("family")}>
          {Object.entries(familyWords).map(([family, words]) => (
            <option key={family} value={family}>
              {words}
            </option>
          ))}
        </Select>
      </div>
      <details className="mt-2.5">
        <summary className="link text-label">Limits of use</summary>
        <div className="mt-2 grid grid-cols-5 gap-x-3 gap-y-2.5 phone:grid-cols-2">
          <FigureInput name="maxFrequency" />
          <FigureInput name="maxVoltage" />
          <FigureInput name="minBend" />
          <FigureInput name="minTemperature" />
          <FigureInput name="maxTemperature" />
        </div>
      </details>
    </Section>
  );
}
