/** Attenuation of many lines at once, values only: a whole catalogue at the frequencies of a question. */
import { addConductor } from "@/lib/line/conductor-columns";
import type { LineModel } from "@/lib/line/element";
import { frequencyColumns } from "@/lib/line/line-columns";

/**
 * Attenuation constant of each line at each frequency.
 * @param models - as they are, no temperature applied
 * @param frequencies - hertz, each above 0
 * @returns neper per metre, frequency after frequency of one line, then of the next
 * @throws RangeError when a frequency is not positive, or a form that needs a skin corner has none above 0
 * Source: as `prepareLine`; Re √(zy) from the real numbers alone, the smaller part by dividing, which does not cancel.
 */
export function attenuations(models: readonly LineModel[], frequencies: ArrayLike<number>): Float64Array {
  const { omega, logarithm } = frequencyColumns(frequencies);
  const count = omega.length;
  const result = new Float64Array(models.length * count);
  const zRe = new Float64Array(count);
  const zIm = new Float64Array(count);
  for (let n = 0; n < models.length; n++) {
    const { conductors, lInfHPerM, cFPerM, lossTangent = 0, g0SPerM = 0 } = models[n]!;
    for (let k = 0; k < count; k++) {
      zRe[k] = 0;
      zIm[k] = omega[k]! * lInfHPerM;
    }
    for (let c = 0; c < conductors.length; c++) {
      const { form, r0OhmPerM, skinCornerRadPerS = 0 } = conductors[c]!;
      addConductor(form, r0OhmPerM, skinCornerRadPerS, omega, zRe, zIm);
    }
    const exponent = (-2 * Math.atan(lossTangent)) / Math.PI;
    for (let k = 0; k < count; k++) {
      const yIm = omega[k]! * cFPerM * (exponent === 0 ? 1 : Math.exp(exponent * logarithm[k]!));
      const yRe = g0SPerM + yIm * lossTangent;
      const re = zRe[k]! * yRe - zIm[k]! * yIm;
      const im = zRe[k]! * yIm + zIm[k]! * yRe;
      const larger = Math.sqrt((Math.sqrt(re * re + im * im) + Math.abs(re)) / 2);
      result[n * count + k] = re < 0 ? im / (2 * larger) : larger;
    }
  }
  return result;
}
