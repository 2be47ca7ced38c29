/** What people type for the velocity of a cable: a fraction, a percentage, or its inverse. */
import { significantDigits, withoutTrailingZeros } from "@/lib/format/quantity";
import type { Read } from "@/lib/format/read-quantity";

const example = "0.85, 85 % or 1/1.18";

/** Bare figures above this are per cent; between 1 and this they are 1/VF, since no cable is ten times slower than light. */
const leastPercent = 10;

/**
 * Reads a velocity factor: "0.85", "85 %", "85" (per cent), "1/1.18" and "1.18" (the shortening factor, 1/VF).
 * @returns fraction of the speed of light, above 0, at most 1
 */
export function readVelocityFactor(text: string): Read<number> {
  const typed = text.trim();
  if (typed === "") return { ok: false, message: `Type a velocity factor, for example ${example}.` };
  const found = /^(1\s*\/)?\s*(\d+(?:[.,]\d*)?|[.,]\d+)\s*(%)?\s*c?$/i.exec(typed);
  const figure = Number(found?.[2]?.replace(",", "."));
  if (!found || Number.isNaN(figure))
    return { ok: false, message: `“${typed}” is not a velocity factor. Try ${example}.` };
  if (found[1]) return fraction(1 / figure, "");
  if (found[3]) return fraction(figure / 100, "");
  if (figure > leastPercent) return fraction(figure / 100, ", read as per cent");
  return figure > 1 ? fraction(1 / figure, ", read as 1/VF") : fraction(figure, "");
}

function fraction(value: number, how: string): Read<number> {
  if (!(value > 0 && value <= 1)) return { ok: false, message: "More than 0, at most 1: nothing outruns light." };
  const figure = withoutTrailingZeros(significantDigits(value, 4));
  return { ok: true, value: Number(value.toPrecision(15)), understood: `${figure}${how}` };
}
