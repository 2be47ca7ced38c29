import { product, root, sum, type Analytic } from "@/lib/line/analytic";
import { conductorImpedance } from "@/lib/line/conductor";
import { SPEED_OF_LIGHT } from "@/lib/line/constants";
import { divide, type Complex } from "@/lib/line/complex";
import type { LineModel } from "@/lib/line/element";

/** Frequency at which a model's capacitance is stated, rad/s. */
const CAPACITANCE_CORNER = 2e6 * Math.PI;

/** Series impedance (ohm per metre) and shunt admittance (siemens per metre), with their derivatives by s. */
export interface PerMetre {
  z: Analytic;
  y: Analytic;
}

export interface Propagation extends PerMetre {
  /** propagation constant, 1/m, real part at least 0, with its derivative by s */
  gamma: Analytic;
  /** characteristic impedance, ohm, real part at least 0; not finite at s = 0 without leakage */
  zc: Complex;
}

/**
 * Series impedance and shunt admittance of a metre of cable.
 * Z(s) = Σ conductor terms + s·L∞; Y(s) = G0 + s·(C/cos δ)·(s/ωr)^(−2δ/π), δ = atan(tan δ), ωr = 2π·1 MHz.
 * @param model - as it is, no temperature applied
 * @param s - complex frequency, rad/s; real part at least 0, 0 itself included
 * Source: constant-loss-angle permittivity that is causal, J. C. Curie and E. von Schweidler's law as a power of s;
 * telegrapher's equations, D. M. Pozar, Microwave Engineering, 4th ed., section 2.1.
 */
export function perMetre(model: LineModel, s: Complex): PerMetre {
  let z: Analytic = { re: s.re * model.lInfHPerM, im: s.im * model.lInfHPerM, slopeRe: model.lInfHPerM, slopeIm: 0 };
  for (const term of model.conductors) z = sum(z, conductorImpedance(term, s));
  return { z, y: shuntAdmittance(model, s) };
}

function shuntAdmittance(model: LineModel, s: Complex): Analytic {
  const leakage = model.g0SPerM ?? 0;
  const lossTangent = model.lossTangent ?? 0;
  const c = model.cFPerM;
  const size = Math.hypot(s.re, s.im);
  if (lossTangent === 0 || size === 0)
    return { re: leakage + s.re * c, im: s.im * c, slopeRe: size === 0 && lossTangent > 0 ? Infinity : c, slopeIm: 0 };
  const delta = Math.atan(lossTangent);
  const exponent = (2 * delta) / Math.PI;
  const magnitude = c * Math.sqrt(1 + lossTangent * lossTangent) * Math.pow(size / CAPACITANCE_CORNER, -exponent);
  const angle = -exponent * Math.atan2(s.im, s.re);
  // capacitance at s, complex; Y' = (1 − exponent)·capacitance
  const re = magnitude * Math.cos(angle);
  const im = magnitude * Math.sin(angle);
  return {
    re: leakage + s.re * re - s.im * im,
    im: s.re * im + s.im * re,
    slopeRe: (1 - exponent) * re,
    slopeIm: (1 - exponent) * im,
  };
}

/**
 * Propagation constant and characteristic impedance: γ = √(ZY), Zc = Z/γ. The principal root has a real part of at
 * least 0 and is √Z·√Y wherever Re s is at least 0; taken of the product, a lossless line has no loss at all.
 * @param model - as it is, no temperature applied
 * @param s - complex frequency, rad/s; real part at least 0
 */
export function propagation(model: LineModel, s: Complex): Propagation {
  const { z, y } = perMetre(model, s);
  const gamma = root(product(z, y));
  return { z, y, gamma, zc: divide(z, gamma) };
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
  return { z0: Math.sqrt(inductance / capacitance), velocityFactor: 1 / (delay * SPEED_OF_LIGHT), delay, capacitance, inductance };
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
  if (!(velocityFactor > 0)) throw new RangeError(`modelFromNominal: velocityFactor must be positive, got ${velocityFactor}`);
  const velocity = SPEED_OF_LIGHT * velocityFactor;
  return {
    conductors: [{ form: "constant", r0OhmPerM: 0 }],
    ...rest,
    lInfHPerM: z0 / velocity,
    cFPerM: 1 / (z0 * velocity),
  };
}
