/** From a sweep of a sample to its propagation constant and characteristic impedance, frequency by frequency. */
import {
  abs,
  add,
  complex,
  divide,
  multiply,
  negate,
  ONE,
  scale,
  sqrt,
  subtract,
  type Complex,
} from "@/lib/line/complex";
import type { ComplexArray } from "@/lib/line/line-figures";

/** A two-port sweep; S against one real reference. */
export interface TwoPortSweep {
  referenceOhm: number;
  frequencies: ArrayLike<number>;
  s11: ComplexArray;
  s21: ComplexArray;
  s12: ComplexArray;
  s22: ComplexArray;
}

/** The same sample open and short at its far end; reflections against one real reference. */
export interface OnePortSweeps {
  referenceOhm: number;
  frequencies: ArrayLike<number>;
  open: ComplexArray;
  short: ComplexArray;
}

/**
 * What one frequency of a sweep says before the impedance is known everywhere.
 * Near multiples of a half wavelength (for one-ports a quarter) a sample without loss looks like nothing at all, whatever
 * its impedance: there the impedance must come from the neighbours, while the propagation constant is sound.
 */
export interface SweepPoint {
  zc: Complex;
  /** 0 to about 1: how much of the impedance is in the data; below `soundness` it is mostly error */
  soundness: number;
  /** e^{n·γ·len} once the impedance is known */
  growth: (zc: Complex) => Complex;
}

export interface SampleSweep {
  frequencies: ArrayLike<number>;
  points: SweepPoint[];
  /** times that the wave passes the sample: γ·len times this is what `growth` is the exponential of */
  passes: 1 | 2;
}

/** Below this an error of a thousandth in the data is two per cent and more of the impedance. */
export const leastSoundness = 0.05;

/** What must come back of a wave, once through the sample or there and back, to be told from error. */
export const leastThrough = { 1: 1e-5, 2: 5e-3 } as const;

const at = ({ re, im }: ComplexArray, k: number): Complex => complex(re[k] ?? NaN, im[k] ?? NaN);

/** The root that is an impedance: real part at least 0. */
function impedanceOf(square: Complex): Complex {
  const root = sqrt(square);
  return root.re < 0 ? negate(root) : root;
}

/**
 * cosh γl = (A + D)/2, Zc = √(B/C), sinh γl = (B/Zc + C·Zc)/2, e^{γl} = cosh γl + sinh γl.
 * Source: D. M. Pozar, Microwave Engineering, 4th ed., table 4.2 and the chain matrix of a line, table 4.1.
 */
export function twoPortPoints({ referenceOhm, frequencies, s11, s21, s12, s22 }: TwoPortSweep): SampleSweep {
  const points = Array.from({ length: frequencies.length }, (_, k): SweepPoint => {
    const [a11, a22] = [at(s11, k), at(s22, k)];
    const through = multiply(at(s12, k), at(s21, k));
    const twice = add(at(s12, k), at(s21, k));
    const series = subtract(multiply(add(ONE, a11), add(ONE, a22)), through);
    const shunt = subtract(multiply(subtract(ONE, a11), subtract(ONE, a22)), through);
    const b = scale(divide(series, twice), referenceOhm);
    const c = scale(divide(shunt, twice), 1 / referenceOhm);
    // (A + D)/2 = (1 − S11·S22 + S12·S21)/(S12 + S21)
    const cosh = divide(add(subtract(ONE, multiply(a11, a22)), through), twice);
    return {
      zc: impedanceOf(divide(b, c)),
      soundness: Math.min(abs(series), abs(shunt)) / 2,
      growth: (zc) => add(cosh, scale(add(divide(b, zc), multiply(c, zc)), 0.5)),
    };
  });
  return { frequencies, points, passes: 1 };
}

/**
 * Zc = √(Zo·Zs); seen against Zc the open shows e^{−2γl} and the short −e^{−2γl}.
 * Source: D. M. Pozar, as above, section 2.3, open and short lines.
 */
export function onePortPoints({ referenceOhm, frequencies, open, short }: OnePortSweeps): SampleSweep {
  const points = Array.from({ length: frequencies.length }, (_, k): SweepPoint => {
    const [o, s] = [at(open, k), at(short, k)];
    const up = multiply(add(ONE, o), add(ONE, s));
    const down = multiply(subtract(ONE, o), subtract(ONE, s));
    const against = (reflection: Complex, zc: Complex) => {
      const v = scale(add(ONE, reflection), referenceOhm);
      const i = multiply(zc, subtract(ONE, reflection));
      return divide(subtract(v, i), add(v, i));
    };
    return {
      zc: scale(impedanceOf(divide(up, down)), referenceOhm),
      soundness: Math.min(abs(up), abs(down)) / 2,
      growth: (zc) => divide(complex(2), subtract(against(o, zc), against(s, zc))),
    };
  });
  return { frequencies, points, passes: 2 };
}
