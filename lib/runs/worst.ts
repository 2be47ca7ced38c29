/** The worst point of a curve inside a band. Pure. */

import { goldenSection } from "@/lib/line/golden-section";

/** 18 steps leave 2·10⁻⁴ of the distance between two samples. */
const refiningSteps = 18;

/** The worst value in the band and where it is. */
export interface Worst {
  frequencyHz: number;
  value: number;
}

/** The least of a curve inside the band, refined between the samples by golden section. */
export function worstIn(
  frequencies: Float64Array,
  values: Float64Array,
  band: readonly [number, number],
  valueAt: (frequency: number) => number,
): Worst {
  let best = -1;
  for (let k = 0; k < values.length; k++) {
    const f = frequencies[k]!;
    const isInside = f >= band[0] * (1 - 1e-12) && f <= band[1] * (1 + 1e-12);
    if (isInside && !Number.isNaN(values[k]!) && (best < 0 || values[k]! < values[best]!)) best = k;
  }
  if (best < 0) return { frequencyHz: band[0], value: valueAt(band[0]) };
  const sampled = { frequencyHz: frequencies[best]!, value: values[best]! };
  const low = Math.max(band[0], frequencies[best - 1] ?? band[0]);
  const high = Math.min(band[1], frequencies[best + 1] ?? band[1]);
  const refined = goldenSection((f) => -valueAt(f), low, high, refiningSteps);
  return -refined.value < sampled.value ? { frequencyHz: refined.at, value: -refined.value } : sampled;
}
