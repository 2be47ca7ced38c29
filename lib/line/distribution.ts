/** How a quantity is spread between its limits. */

/** All symmetrical about the middle of the limits, and none beyond them. */
export const distributions = ["uniform", "triangular", "truncatedNormal"] as const;
export type Distribution = (typeof distributions)[number];

/** The limits of a truncated normal lie this many standard deviations from its middle: a stated coverage of k = 2. */
const coverage = 2;

/**
 * Where in its limits a quantity lies, from an even random number: the inverse of the cumulative distribution. One
 * number makes one draw, so wider limits move a draw outward and change nothing else.
 * @param u - 0 to 1
 * @returns −1 at the lower limit, 0 in the middle, 1 at the upper
 * Source: JCGM 101:2008, 6.4 (rectangular, triangular); normal, cut off at both limits and scaled to 1.
 */
export const place: Record<Distribution, (u: number) => number> = {
  uniform: (u) => 2 * u - 1,
  triangular: (u) => (u < 0.5 ? Math.sqrt(2 * u) - 1 : 1 - Math.sqrt(2 * (1 - u))),
  truncatedNormal: (u) => normalDeviate((2 * u - 1) * normalArea(coverage)) / coverage,
};

/**
 * Share of a standard normal between 0 and z: φ(z)·(z + z³/3 + z⁵/(3·5) + …).
 * @param z - of either sign; the series is meant for |z| up to a few
 * Source: G. Marsaglia, Evaluating the normal distribution, J. Stat. Softw. 11 (2004) 4.
 */
export function normalArea(z: number): number {
  let term = z;
  let sum = z;
  for (let n = 3; Math.abs(term) > 1e-17 * Math.abs(sum); n += 2) {
    term *= (z * z) / n;
    sum += term;
  }
  return (sum * Math.exp((-z * z) / 2)) / Math.sqrt(2 * Math.PI);
}

/** The inverse of `normalArea` for |area| up to that of the coverage, by Halley's steps, which triple the digits. */
function normalDeviate(area: number): number {
  let z = area * Math.sqrt(2 * Math.PI);
  for (let step = 0; step < 8; step++) {
    const miss = ((normalArea(z) - area) * Math.sqrt(2 * Math.PI)) / Math.exp((-z * z) / 2);
    z -= miss / (1 + (miss * z) / 2);
    if (Math.abs(miss) < 1e-14) break;
  }
  return z;
}
