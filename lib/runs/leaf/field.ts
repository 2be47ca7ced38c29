/**
 * What one field of a leaf is: how it is labelled, what is typed in it, and how it reads from and writes to the thing
 * being edited. A leaf is a list of these; the screen draws them, and knows nothing of elements.
 */
import type { z } from "zod";
import type { QuantityBounds } from "@/lib/format/bounds";
import { impedanceText, optionalQuantityText, quantityText } from "@/lib/format/quantity-schema";
import { asTyped, impedanceAsTyped } from "@/lib/format/read-quantity";
import type { QuantityKind } from "@/lib/format/unit-spelling";

interface Common<T> {
  /** name within the leaf; with the element's path it is the path on the wire where that is one value */
  name: string;
  label: string;
  /** the text it starts with */
  text: (edited: T) => string;
  isShown?: (edited: T) => boolean;
}

export interface TypedField<T> extends Common<T> {
  input: "typed";
  kind: QuantityKind | "impedance" | "words";
  schema: z.ZodType<unknown, string>;
  unit: string;
  width: "narrow" | "normal" | "wide";
  /** T with the value that the schema made of the text */
  write: (edited: T, value: never) => T;
}

export interface ChosenField<T> extends Common<T> {
  input: "chosen";
  options: { value: string; label: string }[];
  write: (edited: T, value: string) => T;
}

export interface LineField<T> extends Common<T> {
  input: "line";
  write: (edited: T, value: { cableId: string }) => T;
}

export type LeafField<T> = TypedField<T> | ChosenField<T> | LineField<T>;

const usualUnits: Partial<Record<QuantityKind, string>> = {
  length: "m",
  frequency: "MHz",
  temperature: "°C",
  power: "W",
  resistance: "Ω",
  inductance: "nH",
  capacitance: "pF",
  loss: "dB",
};

interface Quantity<T, K extends keyof T> {
  key: K & string;
  label: string;
  kind: QuantityKind;
  bounds?: QuantityBounds;
  width?: TypedField<T>["width"];
  isShown?: (edited: T) => boolean;
}

const shown = (kind: QuantityKind, value: unknown) =>
  typeof value === "number" ? withoutUnit(kind, asTyped(kind, value)) : "";

/** "1.8" rather than "1.8 m" where the unit stands in the field anyway. */
function withoutUnit(kind: QuantityKind, text: string): string {
  const unit = usualUnits[kind];
  return unit !== undefined && text.endsWith(` ${unit}`) ? text.slice(0, -unit.length - 1) : text;
}

/** A quantity kept under one key of what is edited. */
export function quantity<T>({
  key,
  label,
  kind,
  bounds,
  width = "normal",
  isShown,
}: Quantity<T, keyof T>): TypedField<T> {
  return {
    input: "typed",
    name: key,
    label,
    kind,
    width,
    isShown,
    unit: usualUnits[kind] ?? "",
    schema: quantityText(kind, bounds),
    text: (edited) => shown(kind, edited[key as keyof T]),
    write: (edited, value) => ({ ...edited, [key]: value }),
  };
}

/** The same, but it may be empty: the key is then left out. */
export function optionalQuantity<T>(field: Quantity<T, keyof T>): TypedField<T> {
  return {
    ...quantity(field),
    schema: optionalQuantityText(field.kind, field.bounds),
    write: (edited, value) => {
      const { [field.key as keyof T]: _gone, ...rest } = edited;
      return (value === undefined ? rest : { ...edited, [field.key]: value }) as T;
    },
  };
}

export function impedanceField<T>(
  label: string,
  read: (edited: T) => { re: number; im: number },
  write: (edited: T, value: { re: number; im: number }) => T,
  isShown?: (edited: T) => boolean,
): TypedField<T> {
  return {
    input: "typed",
    name: "impedance",
    label,
    kind: "impedance",
    width: "wide",
    unit: "Ω",
    isShown,
    schema: impedanceText,
    text: (edited) => impedanceAsTyped(read(edited)),
    write: write as TypedField<T>["write"],
  };
}

export function choice<T, K extends keyof T & string>(
  key: K,
  label: string,
  options: [string, string][],
  other: Partial<Omit<ChosenField<T>, "options">> = {},
): ChosenField<T> {
  return {
    input: "chosen",
    name: key,
    label,
    options: options.map(([value, text]) => ({ value, label: text })),
    text: (edited) => String(edited[key] ?? options[0]?.[0] ?? ""),
    write: (edited, value) => ({ ...edited, [key]: value }),
    ...other,
  };
}
