/** Steps the figure in a text up or down in its second digit: 36 m → 37 m, 1.8 → 1.9, 0.269 → 0.279. */
import { decimalsFor } from "@/lib/format/quantity";

/**
 * @param text - what stands in a field; only its first number changes, the unit stays
 * @param steps - how many, negative for down
 */
export function nudge(text: string, steps: number): string {
  const found = /[-\u2212]?\d+(?:[.,]\d+)?/.exec(text);
  if (!found) return text;
  const value = Number(found[0].replace("\u2212", "-").replace(",", "."));
  const step = value === 0 ? 1 : 10 ** (Math.floor(Math.log10(Math.abs(value))) - 1);
  const by = step * steps;
  const decimals = Math.max(found[0].split(/[.,]/)[1]?.length ?? 0, decimalsFor(Math.abs(by), 1));
  const next = (value + by).toFixed(decimals);
  return text.slice(0, found.index) + next + text.slice(found.index + found[0].length);
}
