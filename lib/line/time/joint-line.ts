import { DB_PER_NEPER } from "@/lib/line/constants";
import type { LaplaceGrid } from "@/lib/line/time/laplace-grid";
import type { LineSpectrum } from "@/lib/line/time/line-spectrum";
import { spectrum } from "@/lib/line/time/spectrum";

/**
 * A joint's loss over a grid, θ = (a + b·√(2s/(2π·1 GHz)))/8.6859 over a real impedance, as a metre of line.
 * @param flatDb - a, dB
 * @param rootDb - b, dB at 1 GHz
 * @param referenceOhm - of the joint, ohm, above 0
 */
export function jointLine(flatDb: number, rootDb: number, referenceOhm: number, grid: LaplaceGrid): LineSpectrum {
  const { count, damping, omega } = grid;
  const theta = spectrum(count);
  const zc = spectrum(count);
  const yc = spectrum(count);
  const perRoot = rootDb / DB_PER_NEPER / Math.sqrt(1e9 * Math.PI);
  for (let k = 0; k < count; k++) {
    const w = omega[k]!;
    const larger = Math.sqrt((Math.sqrt(damping * damping + w * w) + damping) / 2);
    theta.re[k] = flatDb / DB_PER_NEPER + perRoot * larger;
    theta.im[k] = (perRoot * w) / (2 * larger);
  }
  zc.re.fill(referenceOhm);
  yc.re.fill(1 / referenceOhm);
  return { gamma: theta, zc, yc, roundTrips: new Map() };
}
