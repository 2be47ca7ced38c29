"use client";

import { useFieldArray, useWatch, type Control, type UseFormRegister } from "react-hook-form";
import { quantityWords } from "@/components/limits/limit-words";
import { coefficientNames, newPiece, type TypedLimit } from "@/components/limits/typed-limit";
import { Button } from "@/components/ui/button";
import { Field } from "@/components/ui/field";
import { Select } from "@/components/ui/select";

interface Props {
  register: UseFormRegister<TypedLimit>;
  control: Control<TypedLimit>;
}

const terms: Record<(typeof coefficientNames)[number], string> = {
  ...{ k0: "k0", k1: "k1 · √f", k2: "k2 · f", k3: "k3 / √f", kLog: "k · log₁₀ f" },
};

/** The line itself: a formula by range, points, or one value. */
export function CurveFields({ register, control }: Props) {
  const [form, quantity] = useWatch({ control, name: ["form", "quantity"] });
  const { unit } = quantityWords[quantity];
  return (
    <div className="flex flex-col items-start gap-3">
      <Select label="Given as" className="w-56" {...register("form")}>
        <option value="formula">a formula, f in MHz</option>
        <option value="points">points, joined over log f</option>
        <option value="constant">one value at every frequency</option>
      </Select>
      {form === "formula" && <Pieces register={register} control={control} unit={unit} />}
      {form === "points" && <Points register={register} unit={unit} />}
      {form === "constant" && <Field label="Limit" unit={unit} isFigure className="w-36" {...register("value")} />}
    </div>
  );
}

function Pieces({ register, control, unit }: Props & { unit: string }) {
  const { fields, append, remove } = useFieldArray({ control, name: "pieces" });
  return (
    <>
      {fields.map(({ id }, i) => (
        <fieldset key={id} className="flex flex-wrap items-end gap-2.5">
          <legend className="text-note text-ink-2">Range {i + 1}</legend>
          <Field label="From" unit="MHz" isFigure className="w-28" {...register(`pieces.${i}.from`)} />
          <Field label="To" unit="MHz" isFigure className="w-28" {...register(`pieces.${i}.to`)} />
          {coefficientNames.map((name) => (
            <Field
              key={name}
              label={`${terms[name]}, ${unit}`}
              isFigure
              className="w-24"
              {...register(`pieces.${i}.${name}`)}
            />
          ))}
          {fields.length > 1 && (
            <Button size="small" aria-label={`Remove range ${i + 1}`} onClick={() => remove(i)}>
              Remove
            </Button>
          )}
        </fieldset>
      ))}
      <Button
        size="small"
        onClick={() => append(newPiece)}
        refused={fields.length >= 20 && "A formula has at most 20 ranges."}
      >
        Add a range
      </Button>
    </>
  );
}

function Points({ register, unit }: Pick<Props, "register"> & { unit: string }) {
  return (
    <label className="w-72 text-note text-ink-2 phone:w-full">
      A point a line: MHz, then {unit}
      <textarea
        {...register("points")}
        rows={6}
        maxLength={20_000}
        className="figures mt-0.5 block w-full rounded-t border border-b-[1.5px] border-rule border-b-ink bg-field px-2 py-1 text-body text-ink phone:text-section"
      />
    </label>
  );
}
