import { abs, add, conjugate, divide, ONE, scale, subtract, type Complex } from "@/lib/line/complex";

/**
 * Power-wave reflection coefficient of a load seen by a source, (Z − Zs*) / (Z + Zs).
 * For a real reference it is the ordinary reflection coefficient.
 * @param load - impedance, ohm; Infinity in re for an open end
 * @param source - impedance, ohm; real part positive
 * @returns dimensionless; 0 for a conjugate match, magnitude 1 for a lossless load
 * @throws RangeError when Re(source) is not positive
 * Source: K. Kurokawa, Power waves and the scattering matrix, IEEE Trans. MTT-13 (1965) 194.
 */
export function reflection(load: Complex, source: Complex): Complex {
  if (!(source.re > 0)) throw new RangeError(`reflection: source resistance must be positive, got ${source.re}`);
  if (load.re === Infinity) return ONE;
  return divide(subtract(load, conjugate(source)), add(load, source));
}

/**
 * Impedance that has a reflection coefficient in a real reference, Zr·(1 + Γ)/(1 − Γ).
 * @param gamma - dimensionless
 * @param referenceOhm - above 0
 * @returns ohm; re = Infinity, im = NaN for Γ = 1
 * @throws RangeError when referenceOhm is not positive
 */
export function impedanceOfReflection(gamma: Complex, referenceOhm: number): Complex {
  if (!(referenceOhm > 0))
    throw new RangeError(`impedanceOfReflection: referenceOhm must be positive, got ${referenceOhm}`);
  const under = subtract(ONE, gamma);
  if (under.re === 0 && under.im === 0) return { re: Infinity, im: NaN };
  return scale(divide(add(ONE, gamma), under), referenceOhm);
}

/** Reflections below this are rounding, not reflections. */
const noReflection = 1e-15;
/** Within this of total reflection, what is left is rounding. */
const totalReflection = 1e-14;

/**
 * Return loss −20·log|Γ|, dB, at least 0.
 * @param magnitude - |Γ|, at least 0
 * @returns Infinity for no reflection (below 10⁻¹⁵, where only rounding is left)
 */
export function returnLossDb(magnitude: number): number {
  if (magnitude < noReflection) return Infinity;
  return Math.max(0, -20 * Math.log10(magnitude));
}

/**
 * Voltage standing-wave ratio (1 + |Γ|)/(1 − |Γ|), at least 1.
 * @param magnitude - |Γ|, at least 0
 * @returns Infinity for total reflection (within 10⁻¹⁴ of 1, where only rounding is left)
 */
export function vswr(magnitude: number): number {
  const left = 1 - magnitude;
  return left < totalReflection ? Infinity : (1 + magnitude) / left;
}

/**
 * Mismatch loss −10·log(1 − |Γ|²), dB, at least 0: available power over power taken.
 * @param magnitude - |Γ|, at least 0
 * @returns Infinity for total reflection (within 10⁻¹⁴ of 1)
 */
export function mismatchLossDb(magnitude: number): number {
  const left = 1 - magnitude;
  return left < totalReflection ? Infinity : Math.max(0, (-10 * Math.log1p(-magnitude * magnitude)) / Math.LN10);
}

/** |Γ| of a VSWR, (S − 1)/(S + 1); 1 for Infinity. Throws RangeError below 1. */
export function magnitudeOfVswr(ratio: number): number {
  if (!(ratio >= 1)) throw new RangeError(`magnitudeOfVswr: ratio must be at least 1, got ${ratio}`);
  return ratio === Infinity ? 1 : (ratio - 1) / (ratio + 1);
}

/** |Γ| of a return loss in dB, 10^(−RL/20). Throws RangeError below 0. */
export function magnitudeOfReturnLoss(lossDb: number): number {
  if (!(lossDb >= 0)) throw new RangeError(`magnitudeOfReturnLoss: lossDb must be at least 0, got ${lossDb}`);
  return Math.pow(10, -lossDb / 20);
}

/** |Γ| of an impedance in a source impedance; `reflection` for the terms. */
export function reflectionMagnitude(load: Complex, source: Complex): number {
  return abs(reflection(load, source));
}

/**
 * |Γ| at the near end of a matched line whose far end reflects: |Γ|·10^(−A/10). For a line impedance that is real.
 * @param magnitude - |Γ| at the far end
 * @param lossDb - matched loss A of the line, one way, dB, at least 0
 */
export function magnitudeThroughLine(magnitude: number, lossDb: number): number {
  return magnitude * Math.pow(10, -lossDb / 10);
}

/**
 * Total loss of a mismatched line, dB: (a² − |Γ|²) / (a·(1 − |Γ|²)) with a = 10^(A/10). For a line impedance that is real.
 * @param magnitude - |Γ| at the far end, below 1
 * @param lossDb - matched loss A of the line, one way, dB, at least 0
 */
export function mismatchedLineLossDb(magnitude: number, lossDb: number): number {
  const a = Math.pow(10, lossDb / 10);
  const reflected = magnitude * magnitude;
  return 10 * Math.log10((a * a - reflected) / (a * (1 - reflected)));
}

/**
 * `reflection` of an impedance given as a pair of voltage and current, so an open end or a short needs no infinity.
 * A source without resistance reflects everything: magnitude 1.
 * @param v - volt
 * @param i - ampere
 * @param source - ohm
 * @returns NaN where neither side carries anything (a short on a 0 Ω source)
 */
export function portReflection(v: Complex, i: Complex, source: Complex): Complex {
  // with u = v + jX·i the two sides are u ∓ R·i
  const re = v.re - source.im * i.im;
  const im = v.im + source.im * i.re;
  const dropRe = source.re * i.re;
  const dropIm = source.re * i.im;
  return divide({ re: re - dropRe, im: im - dropIm }, { re: re + dropRe, im: im + dropIm });
}
