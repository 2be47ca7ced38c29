/** Limits of a quantity that is typed, and the sentence for each that is passed. */
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

const figure = (value: number) => String(value).replace("-", "\u2212");

/** What a value breaks of its bounds; null where it keeps them. */
export function brokenBound(
  value: number,
  { isPositive, isNotNegative, least, most, isWhole }: QuantityBounds,
): string | null {
  if (isPositive && !(value > 0)) return "More than 0.";
  if (isNotNegative && !(value >= 0)) return "0 or more.";
  if (isWhole && !Number.isInteger(value)) return "A whole number.";
  if (least !== undefined && value < least) return `At least ${figure(least)}.`;
  if (most !== undefined && value > most) return `At most ${figure(most)}.`;
  return null;
}
