import { product, root, sum, type Analytic } from "@/lib/line/analytic";
import { conductorImpedance } from "@/lib/line/conductor";
import { SPEED_OF_LIGHT } from "@/lib/line/constants";
import { divide, type Complex } from "@/lib/line/complex";
import type { LineModel } from "@/lib/line/element";

/** Frequency at which a model's capacitance is stated, rad/s. */
const CAPACITANCE_CORNER = 2e6 * Math.PI;

/** What a metre of cable is at one complex frequency, with derivatives by s. */
export interface PerMetre {
  /** series impedance, ohm per metre */
  z: Analytic;
  /** shunt admittance, siemens per metre */
  y: Analytic;
  /** γ² = z·y, 1/m² */
  gammaSquared: Analytic;
  /** propagation constant, 1/m, real part at least 0 */
  gamma: Analytic;
}

/** A cable as a function of complex frequency, its constants worked out once. */
export type LineAt = (s: Complex) => PerMetre;

export interface Propagation extends PerMetre {
  /** characteristic impedance, ohm, real part at least 0; not finite at s = 0 without leakage */
  zc: Complex;
}

/**
 * Series impedance, shunt admittance and propagation constant of a metre of cable as a function of s.
 * Z(s) = Σ conductor terms + s·L∞; Y(s) = G0 + s·(C/cos δ)·(s/ωr)^(−2δ/π), δ = atan(tan δ), ωr = 2π·1 MHz; γ = √(ZY).
 * The principal root is √Z·√Y wherever Re s is at least 0; taken of the product, a lossless line has no loss at all.
 * The last answer is kept, so elements that share a cable work it out once for each s (the same object).
 * @param model - as it is, no temperature applied
 * @returns a function of s, rad/s, real part at least 0, 0 itself included
 * Source: telegrapher's equations, D. M. Pozar, Microwave Engineering, 4th ed., section 2.1; a dielectric of constant
 * loss angle as a power of s, which is causal, A. K. Jonscher, Dielectric Relaxation in Solids, chapter 3.
 */
export function prepareLine(model: LineModel): LineAt {
  const { conductors, lInfHPerM } = model;
  const admittance = prepareAdmittance(model);
  let lastS: Complex | undefined;
  let last: PerMetre | undefined;
  return (s) => {
    if (last !== undefined && s === lastS) return last;
    let z: Analytic = { re: s.re * lInfHPerM, im: s.im * lInfHPerM, slopeRe: lInfHPerM, slopeIm: 0 };
    for (const term of conductors) z = sum(z, conductorImpedance(term, s));
    const y = admittance(s);
    const gammaSquared = product(z, y);
    lastS = s;
    last = { z, y, gammaSquared, gamma: root(gammaSquared) };
    return last;
  };
}

function prepareAdmittance({ cFPerM, lossTangent = 0, g0SPerM = 0 }: LineModel): (s: Complex) => Analytic {
  if (lossTangent === 0)
    return (s) => ({ re: g0SPerM + s.re * cFPerM, im: s.im * cFPerM, slopeRe: cFPerM, slopeIm: 0 });
  const exponent = (2 * Math.atan(lossTangent)) / Math.PI;
  const magnitudeAtCorner = cFPerM * Math.sqrt(1 + lossTangent * lossTangent);
  return (s) => {
    const size = Math.sqrt(s.re * s.re + s.im * s.im);
    // the capacitance grows without bound toward dc, though its admittance does not
    if (size === 0) return { re: g0SPerM, im: 0, slopeRe: Infinity, slopeIm: 0 };
    const growth = Math.exp(-exponent * Math.log(size / CAPACITANCE_CORNER));
    let re = cFPerM * growth;
    let im = s.im > 0 ? -re * lossTangent : re * lossTangent;
    // on the imaginary axis the angle is ∓δ, and that is all there is to it
    if (s.re !== 0) {
      const angle = -exponent * Math.atan2(s.im, s.re);
      re = magnitudeAtCorner * growth * Math.cos(angle);
      im = magnitudeAtCorner * growth * Math.sin(angle);
    }
    return {
      re: g0SPerM + s.re * re - s.im * im,
      im: s.re * im + s.im * re,
      slopeRe: (1 - exponent) * re,
      slopeIm: (1 - exponent) * im,
    };
  };
}

/** `prepareLine` at one s. */
export function perMetre(model: LineModel, s: Complex): PerMetre {
  return prepareLine(model)(s);
}

/**
 * What a metre of cable is at one s, and its characteristic impedance Zc = Z/γ.
 * @param model - as it is, no temperature applied
 * @param s - complex frequency, rad/s; real part at least 0
 */
export function propagation(model: LineModel, s: Complex): Propagation {
  const line = perMetre(model, s);
  return { ...line, zc: divide(line.z, line.gamma) };
}

export interface NominalFigures {
  /** √(L∞/C), ohm */
  z0: number;
  /** 1/√(L∞·C) over the speed of light; may exceed 1 for a model that is not physical */
  velocityFactor: number;
  /** √(L∞·C), s/m */
  delay: number;
  /** F/m */
  capacitance: number;
  /** L∞, H/m */
  inductance: number;
}

/** What is printed on a data sheet: the lossless, high-frequency figures of a model. */
export function nominalFigures(model: LineModel): NominalFigures {
  const { lInfHPerM: inductance, cFPerM: capacitance } = model;
  const delay = Math.sqrt(inductance * capacitance);
  return {
    z0: Math.sqrt(inductance / capacitance),
    velocityFactor: 1 / (delay * SPEED_OF_LIGHT),
    delay,
    capacitance,
    inductance,
  };
}

/**
 * A model from nominal impedance and velocity factor: C = 1/(z0·c·VF), L∞ = z0/(c·VF).
 * @param nominal - z0 in ohm and velocityFactor, both above 0; whatever else of the model is known (conductors, loss
 * tangent …); without conductors the line is lossless
 * @throws RangeError when z0 or velocityFactor is not positive
 */
export function modelFromNominal(
  nominal: { z0: number; velocityFactor: number } & Partial<Omit<LineModel, "lInfHPerM" | "cFPerM">>,
): LineModel {
  const { z0, velocityFactor, ...rest } = nominal;
  if (!(z0 > 0)) throw new RangeError(`modelFromNominal: z0 must be positive, got ${z0}`);
  if (!(velocityFactor > 0))
    throw new RangeError(`modelFromNominal: velocityFactor must be positive, got ${velocityFactor}`);
  const velocity = SPEED_OF_LIGHT * velocityFactor;
  return {
    conductors: [{ form: "constant", r0OhmPerM: 0 }],
    ...rest,
    lInfHPerM: z0 / velocity,
    cFPerM: 1 / (z0 * velocity),
  };
}
