/**
 * A metre of cable over a whole grid of s at once: numbers in Float64Arrays and no derivatives, for the time domain. The
 * readable form is `propagation` in `cable.ts`; tests hold both against each other.
 */
import type { LineModel } from "@/lib/line/element";
import { addConductor } from "@/lib/line/time/conductor-spectrum";
import { decayOf } from "@/lib/line/time/decay";
import type { LaplaceGrid } from "@/lib/line/time/laplace-grid";
import { spectrum, type Spectrum } from "@/lib/line/time/spectrum";

export interface LineSpectrum {
  /** propagation constant, 1/m */
  gamma: Spectrum;
  /** characteristic impedance, ohm, and admittance, siemens */
  zc: Spectrum;
  yc: Spectrum;
  /** e^{−2γ·length} of the lengths met last */
  roundTrips: Map<number, Spectrum>;
}

/** A bus has many pieces of few lengths. */
const mostLengths = 4;

/** e^{−2γ·length}. */
export function roundTripOf(
  { gamma, roundTrips }: Pick<LineSpectrum, "gamma" | "roundTrips">,
  length: number,
): Spectrum {
  const known = roundTrips.get(length);
  if (known) return known;
  if (roundTrips.size >= mostLengths) roundTrips.clear();
  const found = decayOf(gamma, 2 * length);
  roundTrips.set(length, found);
  return found;
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

/** γ = √(ZY), and Zc and 1/Zc written over Z and Y. */
function secondary(z: Spectrum, y: Spectrum): LineSpectrum {
  const count = z.re.length;
  const gamma = spectrum(count);
  for (let k = 0; k < count; k++) {
    const zRe = z.re[k]!;
    const zIm = z.im[k]!;
    const yRe = y.re[k]!;
    const yIm = y.im[k]!;
    const re = zRe * yRe - zIm * yIm;
    const im = zRe * yIm + zIm * yRe;
    const magnitude = Math.sqrt(re * re + im * im);
    const larger = Math.sqrt((magnitude + Math.abs(re)) / 2);
    const smaller = im / (2 * larger);
    const gRe = re >= 0 ? larger : smaller;
    const gIm = re >= 0 ? smaller : larger;
    gamma.re[k] = gRe;
    gamma.im[k] = gIm;
    // |γ|² is |ZY|; Zc = Z/γ and 1/Zc = Y/γ
    const perSize = 1 / magnitude;
    z.re[k] = (zRe * gRe + zIm * gIm) * perSize;
    z.im[k] = (zIm * gRe - zRe * gIm) * perSize;
    y.re[k] = (yRe * gRe + yIm * gIm) * perSize;
    y.im[k] = (yIm * gRe - yRe * gIm) * perSize;
  }
  return { gamma, zc: z, yc: y, roundTrips: new Map() };
}

/** G0 + s·(C/cos δ)·(s/ωr)^(−2δ/π). */
function admittance({ cFPerM, lossTangent = 0, g0SPerM = 0 }: LineModel, grid: LaplaceGrid): Spectrum {
  const { count, damping, omega } = grid;
  const atCorner = cFPerM * Math.sqrt(1 + lossTangent * lossTangent);
  const y = spectrum(count);
  if (lossTangent === 0) y.re.fill(1);
  else putPower(y, (-2 * Math.atan(lossTangent)) / Math.PI, grid);
  for (let k = 0; k < count; k++) {
    const w = omega[k]!;
    const re = atCorner * y.re[k]!;
    const im = atCorner * y.im[k]!;
    y.re[k] = g0SPerM + damping * re - w * im;
    y.im[k] = damping * im + w * re;
  }
  return y;
}

/** log(s/ωr) over each grid, worked out once. */
const logarithms = new WeakMap<LaplaceGrid, Spectrum>();

function logarithm(grid: LaplaceGrid): Spectrum {
  const found = logarithms.get(grid);
  if (found) return found;
  const { count, damping, omega } = grid;
  const log = spectrum(count);
  for (let k = 0; k < count; k++) {
    const w = omega[k]!;
    log.re[k] = 0.5 * Math.log(damping * damping + w * w) - Math.log(capacitanceCorner);
    log.im[k] = Math.atan2(w, damping);
  }
  logarithms.set(grid, log);
  return log;
}

/** Up to here ten terms of a power series are exact to the last digits. */
const seriesReach = 0.25;

/** (s/ωr)^power = e^{power·log(s/ωr)}; of a good dielectric the exponent is small and a series is enough. */
function putPower(out: Spectrum, power: number, grid: LaplaceGrid): void {
  const log = logarithm(grid);
  const last = grid.count - 1;
  const largest = Math.abs(power) * Math.max(Math.abs(log.re[0]!), Math.abs(log.re[last]!), Math.PI / 2);
  const isSmall = largest <= seriesReach;
  for (let k = 0; k < grid.count; k++) {
    const x = power * log.re[k]!;
    const angle = power * log.im[k]!;
    const size = isSmall ? shortExp(x) : Math.exp(x);
    out.re[k] = size * (isSmall ? shortCos(angle * angle) : Math.cos(angle));
    out.im[k] = size * (isSmall ? angle * shortSinc(angle * angle) : Math.sin(angle));
  }
}

/** Inverse factorials, of the power series below. */
const per2 = 1 / 2;
const per3 = per2 / 3;
const per4 = per3 / 4;
const per5 = per4 / 5;
const per6 = per5 / 6;
const per7 = per6 / 7;
const per8 = per7 / 8;
const per9 = per8 / 9;
const per10 = per9 / 10;
const per11 = per10 / 11;

function shortExp(x: number): number {
  const high = per6 + x * (per7 + x * (per8 + x * (per9 + x * per10)));
  return 1 + x * (1 + x * (per2 + x * (per3 + x * (per4 + x * (per5 + x * high)))));
}

/** cos √q */
function shortCos(q: number): number {
  return 1 - q * (per2 - q * (per4 - q * (per6 - q * (per8 - q * per10))));
}

/** sin √q over √q */
function shortSinc(q: number): number {
  return 1 - q * (per3 - q * (per5 - q * (per7 - q * (per9 - q * per11))));
}
