/** Typed text -> SI number as zod schemas, for forms: the refusal of `readQuantity` becomes the field's message. */
import { z } from "zod";
import { brokenBound, type QuantityBounds } from "@/lib/format/bounds";
import { readImpedance, readQuantity } from "@/lib/format/read-quantity";
import type { QuantityKind } from "@/lib/format/unit-spelling";

/** A quantity that must be there. */
export function quantityText(kind: QuantityKind, bounds: QuantityBounds = {}) {
  return z.string().transform((text, context) => {
    const read = readQuantity(kind, text);
    const message = read.ok ? brokenBound(read.value, bounds) : read.message;
    if (message === null && read.ok) return read.value;
    context.addIssue({ code: "custom", message: message ?? "" });
    return z.NEVER;
  });
}

/** A quantity that may be left empty: undefined then, never 0. */
export function optionalQuantityText(kind: QuantityKind, bounds: QuantityBounds = {}) {
  const given = quantityText(kind, bounds);
  return z.string().transform((text, context) => {
    if (text.trim() === "") return undefined;
    const read = given.safeParse(text);
    if (read.success) return read.data;
    context.addIssue({ code: "custom", message: read.error.issues[0]?.message ?? "" });
    return z.NEVER;
  });
}

/** An impedance, Ω. A passive one has no negative resistance. */
export const impedanceText = z.string().transform((text, context) => {
  const read = readImpedance(text);
  if (read.ok && read.value.re >= 0) return read.value;
  context.addIssue({ code: "custom", message: read.ok ? "The resistance cannot be negative." : read.message });
  return z.NEVER;
});
