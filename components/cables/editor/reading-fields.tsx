"use client";

import { useEntryForm } from "@/components/cables/editor/entry-form";
import { FigureInput } from "@/components/cables/editor/figure-input";
import { SourceFields } from "@/components/cables/editor/source-fields";
import { SweepField } from "@/components/cables/editor/sweep-field";
import { Field } from "@/components/ui/field";
import { Section } from "@/components/ui/section";
import { StateNote } from "@/components/ui/state-mark";

/** What a meter read of a sample of known length. */
export function ReadingFields() {
  const { form, edited } = useEntryForm();
  const way = edited.worked.ways.readings;
  return (
    <Section title="4 Meter readings" note="of a sample; two of capacitance, inductance and delay make a line">
      <div className="mt-2 grid grid-cols-4 gap-x-3 gap-y-2.5 phone:grid-cols-2">
        <FigureInput name="sample" />
        <FigureInput name="openC" />
        <FigureInput name="shortL" />
        <FigureInput name="shortR" />
        <FigureInput name="delay" />
        <FigureInput name="roundTrip" hint="halved" />
        <FigureInput name="meterHz" hint="1 kHz where not said" />
        <FigureInput name="sampleTemperature" placeholder="20" />
        <Field
          label="Instrument, serial number, calibration"
          autoComplete="off"
          maxLength={200}
          className="col-span-2"
          {...form.register("instrument")}
        />
      </div>
      {way?.refusal && (
        <StateNote state="fail" className="mt-2">
          {way.refusal}
        </StateNote>
      )}
      {way?.notes.map((note) => (
        <p key={note} className="mt-1 text-note text-ink-3">
          {note}
        </p>
      ))}
      <SweepField />
      <SourceFields way="readings" />
    </Section>
  );
}
