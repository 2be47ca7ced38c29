/** The E24 values between 1 and 10. Source: IEC 60063, preferred number series for resistors and capacitors. */
export const e24 = [
  1, 1.1, 1.2, 1.3, 1.5, 1.6, 1.8, 2, 2.2, 2.4, 2.7, 3, 3.3, 3.6, 3.9, 4.3, 4.7, 5.1, 5.6, 6.2, 6.8, 7.5, 8.2, 9.1,
] as const;

/**
 * The E24 values on either side of a value; one where the value is itself in the series, to 1 part in 10⁹.
 * @param value - in any unit, above 0
 * @returns ascending
 * @throws RangeError when the value is not above 0 or not finite
 */
export function e24Around(value: number): number[] {
  if (!(value > 0 && value < Infinity)) throw new RangeError(`e24Around: the value must be above 0, got ${value}`);
  const decade = Math.floor(Math.log10(value));
  // A neighbouring decade on each side, so that 9.5 finds 10 and a rounded logarithm does no harm.
  const values = [decade - 1, decade, decade + 1].flatMap((power) => e24.map((step) => inDecade(step, power)));
  const same = values.find((standard) => Math.abs(standard / value - 1) < 1e-9);
  if (same !== undefined) return [same];
  const above = values.findIndex((standard) => standard > value);
  return values.slice(Math.max(0, above - 1), above + 1);
}

/** step · 10^power without the last-digit noise of the product: 36e-8 is written as such. */
function inDecade(step: number, power: number): number {
  return Number(`${step}e${power}`);
}
