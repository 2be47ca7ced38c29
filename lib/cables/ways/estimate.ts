/** A figure with how far it may be off, and what becomes of that in what is worked out from it. Pure. */

export interface Estimate {
  value: number;
  /** either way, same unit; about 95 % of cases lie within (k = 2); 0 where nothing is said */
  spread: number;
}

export const exactly = (value: number): Estimate => ({ value, spread: 0 });

/** An estimate whose spread is a share of its value. */
export const within = (value: number, share: number): Estimate => ({ value, spread: Math.abs(value) * share });

/**
 * What a function makes of estimates that are independent of each other: each is moved by its spread both ways, half of
 * what that changes is its part, and the parts are added as squares. Where a moved value has no answer, one side counts.
 * @param f - the function; NaN where it has no answer
 * @param from - its arguments
 * Source: JCGM 100:2008 (GUM), 5.1.2 and the note to 5.1.3, sensitivities found by moving each input.
 */
export function propagated(f: (...values: number[]) => number, from: readonly Estimate[]): Estimate {
  const values = from.map(({ value }) => value);
  const middle = f(...values);
  let squares = 0;
  from.forEach(({ value, spread }, i) => {
    if (!(spread > 0)) return;
    const [low, high] = [f(...values.with(i, value - spread)), f(...values.with(i, value + spread))];
    const part = (Number.isFinite(high) ? high - middle : 0) - (Number.isFinite(low) ? low - middle : 0);
    const sides = Number(Number.isFinite(high)) + Number(Number.isFinite(low));
    squares += sides > 0 ? (part / sides) ** 2 : 0;
  });
  return { value: middle, spread: Math.sqrt(squares) };
}

/** Spread over value; Infinity for a value of 0 that has a spread. */
export function share({ value, spread }: Estimate): number {
  return spread === 0 ? 0 : spread / Math.abs(value);
}
