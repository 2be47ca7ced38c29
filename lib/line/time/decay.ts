/** e^{−x} of a whole spectrum: the one thing that costs in a walk, so sine and cosine are found together. */
import { spectrum, type Spectrum } from "@/lib/line/time/spectrum";

/** π/2 in three parts, the first two of 33 bits, so that taking whole quarter turns away loses nothing. */
const quarter1 = 1.570796326734125614166;
const quarter2 = 6.077100506303966e-11;
const quarter3 = 2.02226624879595e-21;
const perQuarter = 2 / Math.PI;
/** Up to here a number of quarter turns times `quarter1` is exact. */
const mostTurned = 1e6;

/** Inverse products of the power series of sine and cosine, each the one before over the next two whole numbers. */
const s3 = 1 / 6;
const s5 = s3 / 20;
const s7 = s5 / 42;
const s9 = s7 / 72;
const s11 = s9 / 110;
const s13 = s11 / 156;
const s15 = s13 / 210;
const s17 = s15 / 272;
const c4 = 1 / 24;
const c6 = c4 / 30;
const c8 = c6 / 56;
const c10 = c8 / 90;
const c12 = c10 / 132;
const c14 = c12 / 182;
const c16 = c14 / 240;

/**
 * e^{−factor·x} at every place, to the last digits.
 * @param x - its last imaginary part is the largest
 * @param factor - real, at least 0
 */
export function decayOf(x: Spectrum, factor: number): Spectrum {
  const count = x.re.length;
  const out = spectrum(count);
  if (!(factor * Math.abs(x.im[count - 1]!) < mostTurned)) return farDecay(x, factor, out);
  for (let k = 0; k < count; k++) {
    const size = Math.exp(-factor * x.re[k]!);
    const angle = factor * x.im[k]!;
    const turns = Math.floor(angle * perQuarter + 0.5);
    const r = angle - turns * quarter1 - turns * quarter2 - turns * quarter3;
    const q = r * r;
    const sin = r - r * q * (s3 - q * (s5 - q * (s7 - q * (s9 - q * (s11 - q * (s13 - q * (s15 - q * s17)))))));
    const cos = 1 - q * (0.5 - q * (c4 - q * (c6 - q * (c8 - q * (c10 - q * (c12 - q * (c14 - q * c16)))))));
    const re = turns & 1 ? sin : cos;
    const im = turns & 1 ? cos : sin;
    out.re[k] = (turns + 1) & 2 ? -size * re : size * re;
    out.im[k] = turns & 2 ? size * im : -size * im;
  }
  return out;
}

function farDecay(x: Spectrum, factor: number, out: Spectrum): Spectrum {
  for (let k = 0; k < x.re.length; k++) {
    const size = Math.exp(-factor * x.re[k]!);
    out.re[k] = size * Math.cos(factor * x.im[k]!);
    out.im[k] = -size * Math.sin(factor * x.im[k]!);
  }
  return out;
}
