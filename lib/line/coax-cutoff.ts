import { SPEED_OF_LIGHT } from "@/lib/line/constants";

/**
 * Frequency above which a coaxial line also carries its first waveguide mode (TE11), hertz: about 2c/(π(d + D)√εr), a
 * wavelength round the middle of the insulation. For bores of 1.5 to 7 inner diameters at most 2.8 % below the exact root.
 * @param innerM - diameter of the inner conductor, metre, above 0
 * @param boreM - bore of the outer conductor, metre, above innerM
 * @param permittivity - relative, of the insulation, at least 1
 * @throws RangeError when a figure is out of range
 * Source: N. Marcuvitz, Waveguide Handbook, section 2.4, kc ≈ 2/(a + b).
 */
export function coaxCutoff(innerM: number, boreM: number, permittivity: number): number {
  if (!(innerM > 0)) throw new RangeError(`coaxCutoff: innerM must be positive, got ${innerM}`);
  if (!(boreM > innerM)) throw new RangeError(`coaxCutoff: boreM must be above ${innerM}, got ${boreM}`);
  if (!(permittivity >= 1)) throw new RangeError(`coaxCutoff: permittivity must be at least 1, got ${permittivity}`);
  return (2 * SPEED_OF_LIGHT) / (Math.PI * (innerM + boreM) * Math.sqrt(permittivity));
}
