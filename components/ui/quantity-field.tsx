"use client";

import { Field, type FieldProps } from "@/components/ui/field";
import { useTypedQuantity, type TypedQuantity } from "@/components/ui/typed-quantity";

type Look = Pick<
  FieldProps,
  "label" | "hint" | "unit" | "className" | "isLabelHidden" | "controlSize" | "placeholder" | "disabled" | "trailing"
>;

/** A field for a quantity typed as people write it, with what was understood under it. */
export function QuantityField({ label, hint, unit, ...props }: TypedQuantity & Look) {
  const { className, isLabelHidden, controlSize, placeholder, disabled, trailing, ...quantity } = props;
  const { input, error, understood } = useTypedQuantity(quantity);
  return (
    <Field
      {...{ label, unit, className, isLabelHidden, controlSize, placeholder, disabled, trailing }}
      {...input}
      isFigure
      hint={understood ?? hint}
      error={error}
    />
  );
}
