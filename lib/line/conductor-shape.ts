/** A conductor's size and metal as a conductor term: dc resistance and skin corner of a round wire and of a tube. */
import { COPPER_RESISTIVITY, MU0 } from "@/lib/line/constants";
import type { Conductor } from "@/lib/line/element";

/**
 * One round wire.
 * @param diameter - metre, above 0
 * @param resistivity - ohm metre, above 0
 * @param highFrequencyFactor - high-frequency resistance over that of a smooth wire alone in space, above 0: stranding,
 * roughness, the proximity of the other wire; dc resistance does not know it
 * Source: R0 = ρ/(π·a²), ωs = 4ρ/(μ0·a²); S. Ramo, J. R. Whinnery and T. Van Duzer, Fields and Waves in Communication
 * Electronics, 3rd ed., section 4.5, wire of finite skin depth.
 */
export function roundConductor(diameter: number, resistivity = COPPER_RESISTIVITY, highFrequencyFactor = 1): Conductor {
  requirePositive("roundConductor", { diameter, resistivity, highFrequencyFactor });
  const radius = diameter / 2;
  return {
    form: "round",
    r0OhmPerM: resistivity / (Math.PI * radius * radius),
    skinCornerRadPerS: (4 * resistivity) / (MU0 * radius * radius * highFrequencyFactor ** 2),
  };
}

/**
 * One tube whose current flows at its bore.
 * @param bore - inner diameter, metre, above 0
 * @param wall - metre, above 0
 * @param resistivity - ohm metre, above 0
 * @param highFrequencyFactor - high-frequency resistance over that of a smooth tube: braiding
 * Source: R0 = ρ/(π·((b + t)² − b²)), ωs = (R0·2πb)²/(μ0·ρ); S. Ramo, J. R. Whinnery and T. Van Duzer, as above,
 * section 3.17, a plane conductor of finite thickness wound to a tube.
 */
export function tubeConductor(
  bore: number,
  wall: number,
  resistivity = COPPER_RESISTIVITY,
  highFrequencyFactor = 1,
): Conductor {
  requirePositive("tubeConductor", { bore, wall, resistivity, highFrequencyFactor });
  const radius = bore / 2;
  const r0OhmPerM = resistivity / (Math.PI * wall * (2 * radius + wall));
  const resistancePerSquare = r0OhmPerM * 2 * Math.PI * radius;
  return {
    form: "sheet",
    r0OhmPerM,
    skinCornerRadPerS: resistancePerSquare ** 2 / (MU0 * resistivity * highFrequencyFactor ** 2),
  };
}

/** @throws RangeError when one of the values is not positive and finite */
export function requirePositive(where: string, values: Record<string, number>): void {
  for (const [name, value] of Object.entries(values))
    if (!(value > 0 && value < Infinity)) throw new RangeError(`${where}: ${name} must be positive, got ${value}`);
}

/**
 * Resistance of a square of a thick conductor's surface, ohm: √(π·f·μ0·ρ).
 * @param frequency - hertz, above 0
 * @throws RangeError when a value is not positive
 * Source: S. Ramo, J. R. Whinnery and T. Van Duzer, as above, section 3.17.
 */
export function surfaceResistance(frequency: number, resistivity = COPPER_RESISTIVITY): number {
  requirePositive("surfaceResistance", { frequency, resistivity });
  return Math.sqrt(Math.PI * frequency * MU0 * resistivity);
}
