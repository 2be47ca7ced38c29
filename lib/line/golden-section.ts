/** The highest point found, and where. */
export interface Crest {
  value: number;
  at: number;
}

const golden = (Math.sqrt(5) - 1) / 2;

/**
 * The crest of a curve between two places that have one between them, by golden section.
 * @param value - the curve; one crest between `from` and `to`
 * @param steps - each leaves 0.618 of the interval: 25 leave 6·10⁻⁶ of it, 50 leave 3·10⁻¹¹
 * @returns the better of the last two places looked at
 * Source: J. Kiefer, Sequential minimax search for a maximum, Proc. Amer. Math. Soc. 4 (1953) 502.
 */
export function goldenSection(value: (at: number) => number, from: number, to: number, steps: number): Crest {
  let [low, high] = [from, to];
  let left = high - golden * (high - low);
  let right = low + golden * (high - low);
  let [atLeft, atRight] = [value(left), value(right)];
  for (let n = 0; n < steps; n++) {
    if (atLeft > atRight) {
      [high, right, atRight] = [right, left, atLeft];
      left = high - golden * (high - low);
      atLeft = value(left);
    } else {
      [low, left, atLeft] = [left, right, atRight];
      right = low + golden * (high - low);
      atRight = value(right);
    }
  }
  return atLeft > atRight ? { value: atLeft, at: left } : { value: atRight, at: right };
}
