import { COPPER_RESISTIVITY, MU0 } from "@/lib/line/constants";

/**
 * Depth at which a current in a thick, non-magnetic conductor has fallen to 1/e, metre: √(ρ/(π·f·μ0)).
 * @param frequency - hertz, above 0
 * @param resistivity - ohm metre, above 0; default annealed copper at 20 °C
 * @throws RangeError when the frequency or the resistivity is not positive
 * Source: S. Ramo, J. R. Whinnery and T. Van Duzer, Fields and Waves in Communication Electronics, 3rd ed., section 3.16.
 */
export function skinDepth(frequency: number, resistivity = COPPER_RESISTIVITY): number {
  if (!(frequency > 0)) throw new RangeError(`skinDepth: frequency must be positive, got ${frequency}`);
  if (!(resistivity > 0)) throw new RangeError(`skinDepth: resistivity must be positive, got ${resistivity}`);
  return Math.sqrt(resistivity / (Math.PI * frequency * MU0));
}
