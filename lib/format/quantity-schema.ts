/** Typed text -> SI number as zod schemas, for forms: the refusal of `readQuantity` becomes the field's message. */
import { z } from "zod";
import { readImpedance, readQuantity } from "@/lib/format/read-quantity";
import type { QuantityKind } from "@/lib/format/unit-spelling";

export interface QuantityBounds {
  /** refuse 0 and below */
  isPositive?: boolean;
  /** refuse below 0 */
  isNotNegative?: boolean;
  least?: number;
  most?: number;
  /** refuse fractions */
  isWhole?: boolean;
}

function broken(value: number, { isPositive, isNotNegative, least, most, isWhole }: QuantityBounds): string | null {
  if (isPositive && !(value > 0)) return "More than 0.";
  if (isNotNegative && !(value >= 0)) return "0 or more.";
  if (isWhole && !Number.isInteger(value)) return "A whole number.";
  if (least !== undefined && value < least) return `At least ${least}.`;
  if (most !== undefined && value > most) return `At most ${most}.`;
  return null;
}

/** A quantity that must be there. */
export function quantityText(kind: QuantityKind, bounds: QuantityBounds = {}) {
  return z.string().transform((text, context) => {
    const read = readQuantity(kind, text);
    const message = read.ok ? broken(read.value, bounds) : read.message;
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
