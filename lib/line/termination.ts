import { product, steady, sum, times, type Analytic } from "@/lib/line/analytic";
import { divide, type Complex } from "@/lib/line/complex";
import type { Termination } from "@/lib/line/element";

/**
 * What a port shows, as a pair of voltage and current that stand in the ratio of its impedance. An open end is
 * 1 : 0 and a short 0 : 1, so neither needs an infinity.
 */
export interface Port {
  /** volt */
  v: Analytic;
  /** ampere */
  i: Analytic;
}

const ONE = steady(1);
const NONE = steady(0);
const OPEN: Port = { v: ONE, i: NONE };
const SHORT: Port = { v: NONE, i: ONE };

/**
 * Voltage and current of a termination at complex frequency s, in the ratio of its impedance.
 * @param termination - constant (ohm), series or parallel network of parts, open, short, or a sampled reflection
 * @param s - rad/s, real part at least 0; on the imaginary axis for `sampled` and for a constant with a reactance
 * @throws RangeError outside the range of a sampled termination, or off the imaginary axis where only that is known
 */
export function terminationPort(termination: Termination, s: Complex): Port {
  switch (termination.kind) {
    case "constant":
      return { v: steady(termination.reOhm, termination.imOhm), i: ONE };
    case "network":
      return termination.topology === "series" ? seriesNetwork(termination, s) : parallelNetwork(termination, s);
    case "open":
      return OPEN;
    case "short":
      return SHORT;
    case "sampled":
      return sampledPort(termination, s);
  }
}

type Network = Extract<Termination, { kind: "network" }>;

/** s times a real factor. */
function sTimes(s: Complex, factor: number): Analytic {
  return { re: s.re * factor, im: s.im * factor, slopeRe: factor, slopeIm: 0 };
}

/** R + sL + 1/(sC); with a capacitor as (1 + sC·(R + sL)) : sC, which is right at s = 0 too. */
function seriesNetwork({ rOhm = 0, lH = 0, cF }: Network, s: Complex): Port {
  const ohmic = sum(steady(rOhm), sTimes(s, lH));
  if (cF === undefined) return { v: ohmic, i: ONE };
  const susceptance = sTimes(s, cF);
  return { v: sum(ONE, product(susceptance, ohmic)), i: susceptance };
}

/** 1 / (1/R + 1/(sL) + sC), cleared of fractions. A part of 0 Ω or 0 H is a short. */
function parallelNetwork({ rOhm, lH, cF = 0 }: Network, s: Complex): Port {
  if (rOhm === 0 || lH === 0) return SHORT;
  const coil = lH === undefined ? ONE : sTimes(s, lH);
  const voltage = times(coil, rOhm ?? 1);
  let current = product(voltage, sTimes(s, cF));
  if (lH !== undefined) current = sum(current, steady(rOhm ?? 1));
  if (rOhm !== undefined) current = sum(current, coil);
  return { v: voltage, i: current };
}

type Sampled = Extract<Termination, { kind: "sampled" }>;

/**
 * A measured one-port: its reflection, linear between neighbouring samples and never extrapolated. At a sample the
 * derivative is that of the interval above it.
 */
function sampledPort({ referenceOhm, frequenciesHz, reflection }: Sampled, s: Complex): Port {
  if (s.re !== 0)
    throw new RangeError(
      `terminationPort: a sampled termination is known on the imaginary axis only, got Re s = ${s.re}`,
    );
  const frequency = s.im / (2 * Math.PI);
  const last = frequenciesHz.length - 1;
  const low = frequenciesHz[0] ?? NaN;
  const high = frequenciesHz[last] ?? NaN;
  // a frequency that went through 2π and back may miss the end by rounding
  const slack = 4 * Number.EPSILON * high;
  if (!(frequency >= low - slack && frequency <= high + slack))
    throw new RangeError(`terminationPort: frequency ${frequency} Hz is outside the samples, ${low} to ${high} Hz`);
  const k = Math.max(0, Math.min(intervalOf(frequenciesHz, frequency), last - 1));
  const gamma = interpolated(frequenciesHz, reflection, k, frequency);
  return { v: sum(ONE, gamma), i: times(sum(ONE, times(gamma, -1)), 1 / referenceOhm) };
}

/** Index of the last sample not above the frequency. */
function intervalOf(frequencies: number[], frequency: number): number {
  let low = 0;
  let high = frequencies.length - 1;
  while (low < high) {
    const middle = Math.ceil((low + high) / 2);
    if (frequencies[middle]! <= frequency) low = middle;
    else high = middle - 1;
  }
  return low;
}

function interpolated(
  frequencies: number[],
  { re, im }: Sampled["reflection"],
  k: number,
  frequency: number,
): Analytic {
  if (frequencies.length === 1) return steady(re[0]!, im[0]!);
  const span = frequencies[k + 1]! - frequencies[k]!;
  const part = (frequency - frequencies[k]!) / span;
  const stepRe = re[k + 1]! - re[k]!;
  const stepIm = im[k + 1]! - im[k]!;
  // dΓ/ds = (dΓ/df) / (2πj)
  const perS = 1 / (2 * Math.PI * span);
  return { re: re[k]! + part * stepRe, im: im[k]! + part * stepIm, slopeRe: stepIm * perS, slopeIm: -stepRe * perS };
}

/** Voltage over current; an open end is re = Infinity, im = NaN (it has no angle). */
export function portImpedance(port: { v: Complex; i: Complex }): Complex {
  if (port.i.re === 0 && port.i.im === 0) return { re: Infinity, im: NaN };
  return divide(port.v, port.i);
}

/** Impedance of a termination at s, ohm; infinite for an open end, see `portImpedance`. Throws as `terminationPort`. */
export function terminationImpedance(termination: Termination, s: Complex): Complex {
  return portImpedance(terminationPort(termination, s));
}

/** Admittance of a termination at s, siemens; infinite for a short. Throws as `terminationPort`. */
export function terminationAdmittance(termination: Termination, s: Complex): Complex {
  const { v, i } = terminationPort(termination, s);
  return portImpedance({ v: i, i: v });
}
