import { propagation } from "@/lib/line/cable";
import { abs2, add, multiply, reciprocal, scale, subtract, type Complex } from "@/lib/line/complex";
import type { LineModel } from "@/lib/line/element";

/** Voltage and current at one place, rms phasors. */
export interface Phasors {
  v: Complex;
  i: Complex;
}

/**
 * The standing wave on one uniform line at one frequency. Each travelling wave is kept as it is at the end it starts
 * from, so both only decay along the line and nothing overflows at any loss.
 */
export interface LineWave {
  length: number;
  /** 1/m */
  gamma: Complex;
  /** 1/Zc of all paralleled cables together, siemens */
  yc: Complex;
  /** series impedance and shunt admittance per metre, of all paralleled cables together */
  z: Complex;
  y: Complex;
  /** voltage of the wave toward the load at the source end, and of the one toward the source at the load end */
  forward: Complex;
  backward: Complex;
}

/**
 * @param model - at its temperature
 * @param s - on the imaginary axis, not 0
 * @param near - at the source end
 * @param far - at the load end
 */
export function lineWave(
  model: LineModel,
  length: number,
  paralleled: number,
  s: Complex,
  near: Phasors,
  far: Phasors,
): LineWave {
  const line = propagation(model, s);
  const zc = scale(line.zc, 1 / paralleled);
  return {
    length,
    gamma: line.gamma,
    yc: reciprocal(zc),
    z: scale(line.z, 1 / paralleled),
    y: scale(line.y, paralleled),
    forward: scale(add(near.v, multiply(zc, near.i)), 0.5),
    backward: scale(subtract(far.v, multiply(zc, far.i)), 0.5),
  };
}

/** Voltage and current at a distance from the source end, 0 to length. */
export function phasorsAt(wave: LineWave, distance: number): Phasors {
  const onward = multiply(wave.forward, decay(wave.gamma, distance));
  const returning = multiply(wave.backward, decay(wave.gamma, wave.length - distance));
  return { v: add(onward, returning), i: multiply(subtract(onward, returning), wave.yc) };
}

/** |V| and |I| at a distance from the source end. */
export function magnitudesAt(wave: LineWave, distance: number): { voltage: number; current: number } {
  const { v, i } = phasorsAt(wave, distance);
  return { voltage: Math.sqrt(abs2(v)), current: Math.sqrt(abs2(i)) };
}

function decay(gamma: Complex, distance: number): Complex {
  const magnitude = Math.exp(-gamma.re * distance);
  const angle = gamma.im * distance;
  return { re: magnitude * Math.cos(angle), im: -magnitude * Math.sin(angle) };
}

export interface Peak {
  value: number;
  /** metre from the source end */
  at: number;
}

/**
 * The true largest voltage on the line. The envelope |forward| + |backward| is convex along the line, so between the
 * first and the last place where both waves are in phase nothing exceeds those two; what is left to search is half a
 * wavelength at each end.
 */
export function peakVoltage(wave: LineWave): Peak {
  return peak(
    wave,
    (at) => at.v,
    ({ v, i }) => -inner(v, multiply(wave.z, i)),
  );
}

/** The true largest current on the line; see `peakVoltage`. */
export function peakCurrent(wave: LineWave): Peak {
  return peak(
    wave,
    (at) => at.i,
    ({ v, i }) => -inner(i, multiply(wave.y, v)),
  );
}

/** Re(a*·b). */
function inner(a: Complex, b: Complex): number {
  return a.re * b.re + a.im * b.im;
}

/** Places looked at in each half wavelength before refining; the slope changes sign at most a few times in it. */
const samples = 48;

function peak(wave: LineWave, of: (at: Phasors) => Complex, slope: (at: Phasors) => number): Peak {
  const size = (distance: number) => Math.sqrt(abs2(of(phasorsAt(wave, distance))));
  const rising = (distance: number) => slope(phasorsAt(wave, distance)) > 0;
  const halfWave = Math.PI / wave.gamma.im;
  const span = Math.min(wave.length, halfWave);
  let best: Peak = { value: size(0), at: 0 };
  const consider = (at: number) => {
    const value = size(at);
    if (value > best.value) best = { value, at };
  };
  consider(wave.length);
  for (const start of span < wave.length ? [0, wave.length - span] : [0]) {
    for (let n = 0; n < samples; n++) {
      const from = start + (span * n) / samples;
      const to = start + (span * (n + 1)) / samples;
      if (rising(from) && !rising(to)) consider(turningPoint(rising, from, to));
    }
  }
  return best;
}

/** Where a slope that is positive at `from` and not at `to` changes sign, by halving until the ends touch. */
function turningPoint(rising: (distance: number) => boolean, from: number, to: number): number {
  let low = from;
  let high = to;
  for (let n = 0; n < 60; n++) {
    const middle = (low + high) / 2;
    if (middle === low || middle === high) break;
    if (rising(middle)) low = middle;
    else high = middle;
  }
  return low;
}
