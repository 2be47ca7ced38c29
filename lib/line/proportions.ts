import { MU0, SPEED_OF_LIGHT } from "@/lib/line/constants";

/** Impedance of free space, ohm. */
const FREE_SPACE = MU0 * SPEED_OF_LIGHT;

/**
 * Bore of the outer over diameter of the inner conductor of the coaxial line that has an impedance and a velocity:
 * D/d = exp(2π·Z0/(Zf·VF)), from Z0 = (Zf·VF/2π)·ln(D/d), Zf the impedance of free space.
 * @param z0 - ohm, above 0
 * @param velocityFactor - above 0
 * @throws RangeError when a figure is not positive
 * Source: S. Ramo, J. R. Whinnery and T. Van Duzer, Fields and Waves in Communication Electronics, 3rd ed., table 5.11b.
 */
export function coaxRatio(z0: number, velocityFactor: number): number {
  requirePositive("coaxRatio", z0, velocityFactor);
  return Math.exp((2 * Math.PI * z0) / (FREE_SPACE * velocityFactor));
}

/**
 * Spacing of the centres over the diameter of the wires of the round pair that has an impedance and a velocity:
 * s/d = cosh(π·Z0/(Zf·VF)), without a screen.
 * @throws RangeError when a figure is not positive
 * Source: as `coaxRatio`, two parallel wires.
 */
export function pairRatio(z0: number, velocityFactor: number): number {
  requirePositive("pairRatio", z0, velocityFactor);
  return Math.cosh((Math.PI * z0) / (FREE_SPACE * velocityFactor));
}

function requirePositive(where: string, z0: number, velocityFactor: number): void {
  if (!(z0 > 0)) throw new RangeError(`${where}: z0 must be positive, got ${z0}`);
  if (!(velocityFactor > 0)) throw new RangeError(`${where}: velocityFactor must be positive, got ${velocityFactor}`);
}
