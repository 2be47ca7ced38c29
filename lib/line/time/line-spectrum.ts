/**
 * A metre of cable over a whole grid of s at once: numbers in Float64Arrays and no derivatives, for the time domain. The
 * readable form is `propagation` in `cable.ts`; tests hold both against each other.
 */
import type { Conductor, LineModel } from "@/lib/line/element";
import type { LaplaceGrid } from "@/lib/line/time/laplace-grid";

/** Complex values over a grid. */
export interface Spectrum {
  re: Float64Array;
  im: Float64Array;
}

export function spectrum(count: number): Spectrum {
  return { re: new Float64Array(count), im: new Float64Array(count) };
}

export interface LineSpectrum {
  /** propagation constant, 1/m */
  gamma: Spectrum;
  /** characteristic impedance, ohm, and admittance, siemens */
  zc: Spectrum;
  yc: Spectrum;
}

/** Frequency at which a model's capacitance is stated, rad/s. */
const capacitanceCorner = 2e6 * Math.PI;

/**
 * γ, Zc and 1/Zc of a cable.
 * @param model - at its temperature
 * @throws RangeError when a conductor form that needs a skin corner has none above 0
 */
export function lineSpectrum(model: LineModel, grid: LaplaceGrid): LineSpectrum {
  const { count, damping, omega } = grid;
  const z = spectrum(count);
  for (let k = 0; k < count; k++) {
    z.re[k] = damping * model.lInfHPerM;
    z.im[k] = omega[k]! * model.lInfHPerM;
  }
  for (const term of model.conductors) addConductor(term, grid, z);
  return secondary(z, admittance(model, grid));
}

/** γ = √(ZY) and Zc = Z/γ, written over Z and Y. */
function secondary(z: Spectrum, y: Spectrum): LineSpectrum {
  const count = z.re.length;
  const gamma = spectrum(count);
  for (let k = 0; k < count; k++) {
    const zRe = z.re[k]!;
    const zIm = z.im[k]!;
    const re = zRe * y.re[k]! - zIm * y.im[k]!;
    const im = zRe * y.im[k]! + zIm * y.re[k]!;
    const magnitude = Math.sqrt(re * re + im * im);
    const larger = Math.sqrt((magnitude + Math.abs(re)) / 2);
    const smaller = im / (2 * larger);
    const gRe = re >= 0 ? larger : smaller;
    const gIm = re >= 0 ? smaller : larger;
    gamma.re[k] = gRe;
    gamma.im[k] = gIm;
    const zcRe = (zRe * gRe + zIm * gIm) / magnitude;
    const zcIm = (zIm * gRe - zRe * gIm) / magnitude;
    const size = zcRe * zcRe + zcIm * zcIm;
    z.re[k] = zcRe;
    z.im[k] = zcIm;
    y.re[k] = zcRe / size;
    y.im[k] = -zcIm / size;
  }
  return { gamma, zc: z, yc: y };
}

/** G0 + s·(C/cos δ)·(s/ωr)^(−2δ/π). */
function admittance({ cFPerM, lossTangent = 0, g0SPerM = 0 }: LineModel, grid: LaplaceGrid): Spectrum {
  const { count, damping, omega } = grid;
  const y = spectrum(count);
  const exponent = (2 * Math.atan(lossTangent)) / Math.PI;
  const atCorner = cFPerM * Math.sqrt(1 + lossTangent * lossTangent);
  for (let k = 0; k < count; k++) {
    const w = omega[k]!;
    let re = cFPerM;
    let im = 0;
    if (exponent !== 0) {
      const square = (damping * damping + w * w) / (capacitanceCorner * capacitanceCorner);
      const size = atCorner * Math.exp(-0.5 * exponent * Math.log(square));
      const angle = -exponent * Math.atan2(w, damping);
      re = size * Math.cos(angle);
      im = size * Math.sin(angle);
    }
    y.re[k] = g0SPerM + damping * re - w * im;
    y.im[k] = damping * im + w * re;
  }
  return y;
}

/** Adds the impedance of a conductor; each form as in `conductorImpedance`. */
function addConductor({ form, r0OhmPerM, skinCornerRadPerS }: Conductor, grid: LaplaceGrid, z: Spectrum): void {
  if (form === "constant" || r0OhmPerM === 0) {
    for (let k = 0; k < grid.count; k++) z.re[k]! += r0OhmPerM;
    return;
  }
  if (skinCornerRadPerS === undefined || !(skinCornerRadPerS > 0))
    throw new RangeError(`lineSpectrum: skinCornerRadPerS must be positive for ${form}, got ${skinCornerRadPerS}`);
  const add = { sqrt: addSqrt, round: addRound, sheet: addSheet }[form];
  add(r0OhmPerM, skinCornerRadPerS, grid, z);
}

type AddTerm = (r0: number, corner: number, grid: LaplaceGrid, z: Spectrum) => void;

/** √(1 + p); the real part of 1 + p is above 0, so both parts come from the same root. */
const addSqrt: AddTerm = (r0, corner, { count, damping, omega }, z) => {
  const re = 1 + damping / corner;
  for (let k = 0; k < count; k++) {
    const im = omega[k]! / corner;
    const larger = Math.sqrt((Math.sqrt(re * re + im * im) + re) / 2);
    z.re[k]! += r0 * larger;
    z.im[k]! += (r0 * im) / (2 * larger);
  }
};

/** 1 + (p/2) / (1 + 2p / (5 + √(49 + 16p))). */
const addRound: AddTerm = (r0, corner, { count, damping, omega }, z) => {
  const pRe = damping / corner;
  const under = 49 + 16 * pRe;
  for (let k = 0; k < count; k++) {
    const pIm = omega[k]! / corner;
    const larger = Math.sqrt((Math.sqrt(under * under + 256 * pIm * pIm) + under) / 2);
    const rootRe = 5 + larger;
    const rootIm = (8 * pIm) / larger;
    const rootSize = rootRe * rootRe + rootIm * rootIm;
    const downRe = 1 + (2 * (pRe * rootRe + pIm * rootIm)) / rootSize;
    const downIm = (2 * (pIm * rootRe - pRe * rootIm)) / rootSize;
    const size = 2 * (downRe * downRe + downIm * downIm);
    z.re[k]! += r0 * (1 + (pRe * downRe + pIm * downIm) / size);
    z.im[k]! += (r0 * (pIm * downRe - pRe * downIm)) / size;
  }
};

/** q·coth q with q = √p, as q·(1 + e)/(1 − e), e = e^{−2q}; p is never 0 on a damped grid. */
const addSheet: AddTerm = (r0, corner, { count, damping, omega }, z) => {
  const pRe = damping / corner;
  for (let k = 0; k < count; k++) {
    const pIm = omega[k]! / corner;
    const qRe = Math.sqrt((Math.sqrt(pRe * pRe + pIm * pIm) + pRe) / 2);
    const qIm = pIm / (2 * qRe);
    const decay = Math.exp(-2 * qRe);
    const sine = Math.sin(2 * qIm);
    // tanh q = (sinh 2qRe + j·sin 2qIm) / (cosh 2qRe + cos 2qIm), both over e^{2qRe}/2
    const upRe = -Math.expm1(-4 * qRe);
    const upIm = 2 * decay * sine;
    const down = 1 + decay * decay + 2 * decay * Math.cos(2 * qIm);
    const size = upRe * upRe + upIm * upIm;
    z.re[k]! += (r0 * down * (qRe * upRe + qIm * upIm)) / size;
    z.im[k]! += (r0 * down * (qIm * upRe - qRe * upIm)) / size;
  }
};
