/**
 * Quarter-wave transformers of N sections between two resistances by exact synthesis of their insertion loss. Everything
 * is over the first resistance. With u = e^{−2jθ}, θ the electrical length of each section, reflection and transmission
 * are polynomials of u: |Γ|² = |f|²/(|f|² + 1) with f = √(insertion loss − 1), and the sections are peeled off one by one.
 * Source: P. I. Richards, Resistor-transmission-line circuits, Proc. IRE 36 (1948) 217; H. J. Riblet, General synthesis
 * of quarter-wave impedance transformers, IRE Trans. MTT-5 (1957) 36; peeled by the recursion of I. Schur, J. reine
 * angew. Math. 147 (1917) 205.
 */
import { add, complex, divide, exp, multiply, scale, sqrt, subtract, abs2, type Complex } from "@/lib/line/complex";

export interface StepTransformer {
  /** of each section, over the first resistance, from its side on; length N */
  sectionsOverFirst: number[];
  /** band over design frequency in which the reflection stays within its limit, 0 to 2 */
  fractionalBandwidth: number;
}

/** Sections that a synthesis is made for: more lose their digits, and nobody joins them. */
export const mostSections = 10;

/**
 * Maximally flat (binomial) transformer: |Γ|²/(1 − |Γ|²) = (R − 1)²/(4R)·cos^{2N} θ.
 * @param sections - N, 1 to 10
 * @param ratio - second resistance over the first, above 0
 * @param maxReflection - |Γ| up to which the bandwidth counts, above 0 and under 1
 * @throws RangeError when an argument is out of range
 * Source: see above; the form of the insertion loss, R. E. Collin, Proc. IRE 43 (1955) 179.
 */
export function binomialTransformer(sections: number, ratio: number, maxReflection: number): StepTransformer {
  requireSteps("binomialTransformer", sections, ratio, maxReflection);
  const size = stepSize(ratio);
  // |f|² = size²·x^{2N} with x = cos θ, and |f|² = −1 at x² = size^{−2/N}·e^{jπ(2m+1)/N}
  const spread = Math.abs(size) ** (-2 / sections);
  const squares = Array.from({ length: sections }, (_, m) =>
    scale(exp(complex(0, (Math.PI * (2 * m + 1)) / sections)), spread),
  );
  let flat = [size];
  for (let n = 0; n < sections; n++) flat = product(flat, [0.5, 0.5]);
  const edge = (ripple(maxReflection) / Math.abs(size)) ** (1 / sections);
  return {
    sectionsOverFirst: size === 0 ? flat.slice(1).map(() => 1) : peeled(flat, squares),
    fractionalBandwidth: edge < 1 ? 2 - (4 / Math.PI) * Math.acos(edge) : 2,
  };
}

/**
 * Equal-ripple transformer: |Γ|²/(1 − |Γ|²) = k²·T_N²(cos θ/cos θm), k² = Γm²/(1 − Γm²), with the widest band that N
 * sections have for that ripple.
 * @param maxReflection - Γm, above 0 and below the reflection of the step itself
 * @throws RangeError when an argument is out of range, also where the step alone reflects no more than the ripple
 * Source: see above; equal ripple is optimum, S. B. Cohn, IRE Trans. MTT-3 (1955) 16, and Riblet 1957.
 */
export function equalRippleTransformer(sections: number, ratio: number, maxReflection: number): StepTransformer {
  requireSteps("equalRippleTransformer", sections, ratio, maxReflection);
  const size = stepSize(ratio);
  const k = ripple(maxReflection);
  if (!(k < Math.abs(size)))
    throw new RangeError(
      `equalRippleTransformer: a step of ${ratio} reflects no more than the ripple ${maxReflection}`,
    );
  const secant = Math.cosh(Math.acosh(Math.abs(size) / k) / sections);
  const flat = chebyshev(sections, secant).map((each) => Math.sign(size) * k * each);
  // T_N(y) = ±j/k at y = cos(φ), φ = ((2m + 1)·π/2 + j·asinh(1/k))/N
  const squares = Array.from({ length: sections }, (_, m) => {
    const [angle, depth] = [((2 * m + 1) * Math.PI) / (2 * sections), Math.asinh(1 / k) / sections];
    const y = complex(Math.cos(angle) * Math.cosh(depth), -Math.sin(angle) * Math.sinh(depth));
    return scale(multiply(y, y), 1 / (secant * secant));
  });
  return {
    sectionsOverFirst: peeled(flat, squares),
    fractionalBandwidth: 2 - (4 / Math.PI) * Math.acos(1 / secant),
  };
}

/** (R − 1)/(2√R): √(|Γ|²/(1 − |Γ|²)) of the step, with its sign. */
const stepSize = (ratio: number) => (ratio - 1) / (2 * Math.sqrt(ratio));
/** Γm/√(1 − Γm²) */
const ripple = (maxReflection: number) => maxReflection / Math.sqrt(1 - maxReflection * maxReflection);

function requireSteps(where: string, sections: number, ratio: number, maxReflection: number): void {
  if (!(sections >= 1 && sections <= mostSections && Number.isInteger(sections)))
    throw new RangeError(`${where}: sections must be a whole number of 1 to ${mostSections}, got ${sections}`);
  if (!(ratio > 0 && ratio < Infinity)) throw new RangeError(`${where}: the ratio must be positive, got ${ratio}`);
  if (!(maxReflection > 0 && maxReflection < 1))
    throw new RangeError(`${where}: the reflection must be between 0 and 1, got ${maxReflection}`);
}

function product(a: readonly number[], b: readonly number[]): number[] {
  const result = Array.from({ length: a.length + b.length - 1 }, () => 0);
  a.forEach((x, i) => b.forEach((y, j) => (result[i + j]! += x * y)));
  return result;
}

/** u^{N/2}·T_N(secant·(u^{1/2} + u^{−1/2})/2), ascending powers of u, by the recurrence of T_N. */
function chebyshev(order: number, secant: number): number[] {
  let [before, here] = [[1], [secant / 2, secant / 2]];
  for (let n = 1; n < order; n++) {
    const next = product(here, [secant, secant]);
    before.forEach((each, i) => (next[i + 1]! -= each));
    [before, here] = [here, next];
  }
  return here;
}

/**
 * The sections of a transformer from its reflection's numerator and the places where the insertion loss vanishes.
 * @param numerator - f, ascending powers of u, length N + 1
 * @param squares - cos²θ of the N zeros of 1 + |f|²
 */
function peeled(numerator: readonly number[], squares: readonly Complex[]): number[] {
  let f = [...numerator];
  let g = denominator(f, squares);
  let impedance = 1;
  return squares.map(() => {
    const step = f[0]! / g[0]!;
    impedance *= (1 + step) / (1 - step);
    const over = f.map((each, n) => each - step * g[n]!);
    const under = g.map((each, n) => each - step * f[n]!);
    // The step gone, the reflection starts one section later, and both polynomials are one degree less.
    f = over.slice(1);
    g = under.slice(0, -1);
    return impedance;
  });
}

/** g with |g|² = 1 + |f|² on |u| = 1 and every root outside of it, ascending powers of u. */
function denominator(f: readonly number[], squares: readonly Complex[]): number[] {
  let g: Complex[] = [complex(1)];
  for (const square of squares) {
    // u + 1/u = 4·cos²θ − 2, of whose two roots the smaller is 1/u of the pole
    const half = subtract(scale(square, 2), complex(1));
    const root = sqrt(subtract(multiply(half, half), complex(1)));
    const [one, other] = [add(half, root), subtract(half, root)];
    const inverse = abs2(one) > abs2(other) ? divide(complex(1), one) : divide(complex(1), other);
    const shifted = [complex(0), ...g.map((each) => multiply(each, inverse))];
    g = shifted.map((each, n) => subtract(g[n] ?? complex(0), each));
  }
  const sum = (list: readonly number[]) => list.reduce((total, each) => total + each, 0);
  const real = g.map(({ re }) => re);
  const scaleTo = Math.sqrt(1 + sum(f) ** 2) / sum(real);
  return real.map((each) => each * scaleTo);
}
