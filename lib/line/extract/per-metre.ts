import { arg, abs, complex, isFinite, type Complex } from "@/lib/line/complex";
import { leastSoundness, leastThrough, type SampleSweep } from "@/lib/line/extract/sample-sweep";
import { unwrapped } from "@/lib/line/extract/unwrap";
import { type ComplexArray, complexArray } from "@/lib/line/line-figures";

/** Propagation constant and impedance of a cable as a sample shows them. */
export interface MeasuredLine {
  frequencies: ArrayLike<number>;
  zc: ComplexArray;
  /** neper per metre; NaN where next to nothing comes through the sample */
  attenuation: Float64Array;
  /** radians per metre; NaN likewise */
  phase: Float64Array;
  /** 1 where the impedance is the point's own, 0 where it was taken from its neighbours */
  hasImpedance: Uint8Array;
  /** 1 where enough comes through the sample */
  isSeen: Uint8Array;
  /** whole turns that the first frequency seen was found to have */
  turns: number;
  /** the largest step of the unwrapped angle between neighbours, radians */
  largestStep: number;
}

/**
 * @param sweep - of a sample
 * @param length - metre, above 0
 * @throws RangeError when the impedance is in none of the points, or nothing comes through at any
 */
export function measuredLine(sweep: SampleSweep, length: number): MeasuredLine {
  const { frequencies, points, passes } = sweep;
  const hasImpedance = flags(points, ({ soundness, zc }) => soundness >= leastSoundness && isFinite(zc) && zc.re > 0);
  if (!hasImpedance.includes(1))
    throw new RangeError(
      "measuredLine: the sample is too short, or a multiple of a half wavelength, at every frequency",
    );
  const zc = filledIn(sweep, hasImpedance);
  const growths = points.map((point, k) => point.growth(complex(zc.re[k] ?? NaN, zc.im[k] ?? NaN)));
  const isSeen = flags(growths, (growth) => isFinite(growth) && abs(growth) * leastThrough[passes] <= 1);
  const seen = growths.map((_, k) => k).filter((k) => isSeen[k]);
  if (seen.length === 0)
    throw new RangeError("measuredLine: next to nothing comes through the sample at any frequency");
  const angles = Float64Array.from(seen, (k) => arg(growths[k] ?? complex(NaN)));
  const losses = Float64Array.from(seen, (k) => Math.log(abs(growths[k] ?? complex(NaN))));
  const found = unwrapped(
    angles,
    losses,
    seen.map((k) => frequencies[k] ?? NaN),
  );
  const spread = (values: Float64Array) => {
    const all = new Float64Array(points.length).fill(NaN);
    seen.forEach((k, n) => (all[k] = (values[n] ?? NaN) / (passes * length)));
    return all;
  };
  const { turns, largestStep } = found;
  return {
    frequencies,
    zc,
    attenuation: spread(losses),
    phase: spread(found.phase),
    hasImpedance,
    isSeen,
    turns,
    largestStep,
  };
}

const flags = <Each>(list: readonly Each[], is: (each: Each) => boolean) =>
  Uint8Array.from(list, (each) => (is(each) ? 1 : 0));

/** Impedance everywhere: where a point has none of its own, between the neighbours that do, by the logarithm of frequency. */
function filledIn({ frequencies, points }: SampleSweep, hasImpedance: Uint8Array): ComplexArray {
  const zc = complexArray(points.length);
  const put = (k: number, value: Complex) => {
    zc.re[k] = value.re;
    zc.im[k] = value.im;
  };
  let before = -1;
  for (let k = 0; k < points.length; k++) {
    if (!hasImpedance[k]) continue;
    const value = points[k]?.zc ?? complex(NaN);
    const earlier = points[before]?.zc ?? value;
    for (let m = before + 1; m < k; m++) put(m, between(earlier, value, share(frequencies, Math.max(before, 0), m, k)));
    put(k, value);
    before = k;
  }
  for (let m = before + 1; m < points.length; m++) put(m, points[before]?.zc ?? complex(NaN));
  return zc;
}

function share(frequencies: ArrayLike<number>, from: number, at: number, to: number): number {
  const log = (k: number) => Math.log(frequencies[k] ?? NaN);
  return from === to ? 0 : (log(at) - log(from)) / (log(to) - log(from));
}

function between(a: Complex, b: Complex, part: number): Complex {
  return { re: a.re + (b.re - a.re) * part, im: a.im + (b.im - a.im) * part };
}
