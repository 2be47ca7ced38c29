"use client";

import { CableCombobox } from "@/components/cables/cable-combobox";
import { InputField } from "@/components/calculators/input-field";
import type { Calculator } from "@/components/calculators/use-calculator";
import type { Inputs } from "@/lib/calculators/input";
import type { lineInputs } from "@/lib/calculators/line-inputs";
import { typedCable } from "@/lib/cables/line";

/** The cable: from the catalogue, or its five figures typed. */
export function LineFields<I extends Inputs & typeof lineInputs>({ of }: { of: Calculator<I> }) {
  const cableId = of.texts.cable ?? typedCable;
  const isTyped = cableId === typedCable;
  return (
    <>
      <CableCombobox
        label={of.inputs.cable.label}
        chosen={isTyped ? "Typed" : (of.entries.get(cableId)?.designation ?? null)}
        cableId={cableId}
        choose={of.chooseCable}
        besides={
          isTyped ? undefined : { label: "Type the figures of a cable", choose: () => of.set("cable", typedCable) }
        }
        className="w-44 phone:w-full"
      />
      <InputField of={of} name="z0" />
      <InputField of={of} name="vf" />
      <InputField of={of} name="r0" />
      <InputField of={of} name="corner" />
      <InputField of={of} name="tan" />
    </>
  );
}
