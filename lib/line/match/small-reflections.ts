/**
 * The textbook's approximation of multi-section transformers: each step reflects little, so that reflections add, and
 * impedances follow from logarithms. Kept beside the exact synthesis because tables and older drawings hold its values.
 */

/** Binomial coefficients C(n, 0) … C(n, n). */
function binomials(n: number): number[] {
  const row = [1];
  for (let k = 1; k <= n; k++) row.push((row[k - 1]! * (n - k + 1)) / k);
  return row;
}

/** Impedances from the reflections of their steps: each multiplies by e^{2·reflection}. */
function impedances(reflections: readonly number[]): number[] {
  let total = 0;
  return reflections.slice(0, -1).map((each) => Math.exp((total += 2 * each)));
}

/**
 * Binomial transformer by small reflections: steps of 2^{−N}·C(N, n)·ln R.
 * @param sections - N, a whole number above 0
 * @param ratio - second resistance over the first, above 0
 * @returns section impedances over the first resistance
 * Source: D. M. Pozar, Microwave Engineering, 2nd ed. 1998, eq. 5.53.
 */
export function binomialBySmallReflections(sections: number, ratio: number): number[] {
  return impedances(binomials(sections).map((each) => (each * Math.log(ratio)) / 2 ** (sections + 1)));
}

export interface SmallReflections {
  sectionsOverFirst: number[];
  /** Γ of each step from the first resistance on, length N + 1 */
  junctionReflections: number[];
  fractionalBandwidth: number;
}

/**
 * Equal-ripple transformer by small reflections: |ln R|/2 = Γm·T_N(1/cos θm).
 * @param maxReflection - Γm, above 0 and under |ln R|/2
 * @throws RangeError when the ripple is not below the step
 * Source: D. M. Pozar, Microwave Engineering, 2nd ed. 1998, section 5.7 and eq. 5.61; Fourier coefficients of
 * Γm·T_N(cos θ/cos θm), which is Σ Γn·e^{−2jnθ} up to its phase.
 */
export function equalRippleBySmallReflections(
  sections: number,
  ratio: number,
  maxReflection: number,
): SmallReflections {
  const step = Math.abs(Math.log(ratio)) / 2;
  if (!(maxReflection > 0 && maxReflection < step))
    throw new RangeError(
      `equalRippleBySmallReflections: the ripple must be above 0 and below ${step}, got ${maxReflection}`,
    );
  const secant = Math.cosh(Math.acosh(step / maxReflection) / sections);
  const samples = 2 * (sections + 1);
  const wave = Array.from({ length: samples }, (_, j) =>
    chebyshev(sections, secant * Math.cos((Math.PI * j) / samples)),
  );
  const junctionReflections = Array.from({ length: sections + 1 }, (_, n) => {
    // The wave holds cos((N − 2n)θ); over a half turn in equal steps these are orthogonal.
    const sum = wave.reduce((total, w, j) => total + w * Math.cos(((sections - 2 * n) * Math.PI * j) / samples), 0);
    return (Math.sign(Math.log(ratio)) * maxReflection * sum) / samples;
  });
  return {
    sectionsOverFirst: impedances(junctionReflections),
    junctionReflections,
    fractionalBandwidth: 2 - (4 / Math.PI) * Math.acos(1 / secant),
  };
}

function chebyshev(order: number, x: number): number {
  let [before, here] = [1, x];
  for (let n = 1; n < order; n++) [before, here] = [here, 2 * x * here - before];
  return here;
}
