"use client";

import { FigureInput } from "@/components/cables/editor/figure-input";
import { SourceFields } from "@/components/cables/editor/source-fields";
import { Section } from "@/components/ui/section";

/** What a sheet states of a metre. */
export function NominalFields() {
  return (
    <Section title="2 Nominal figures" note="at 20 °C; any two of the first three make the rest">
      <div className="mt-2 grid grid-cols-6 gap-x-3 gap-y-2.5 phone:grid-cols-2">
        <FigureInput name="z0" />
        <FigureInput name="z0Tolerance" label="±" />
        <FigureInput name="velocity" hint="0.83, 83 % or 1/1.2" />
        <FigureInput name="velocityTolerance" label="±" />
        <FigureInput name="c" />
        <FigureInput name="cTolerance" label="±" />
        <FigureInput name="l" />
        <FigureInput name="loop" hint="there and back" className="col-span-2 phone:col-span-1" />
        <FigureInput name="core" hint="inner, or one wire" className="col-span-2 phone:col-span-1" />
        <FigureInput name="nominalTangent" />
      </div>
      <SourceFields way="nominal" />
    </Section>
  );
}
