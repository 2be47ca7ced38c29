import { requirePositive } from "@/lib/line/conductor-shape";
import { COPPER_RESISTIVITY } from "@/lib/line/constants";

/** How a braid is made; metre. */
export interface BraidMake {
  /** diameter below the braid */
  under: number;
  /** diameter of each of its wires */
  wire: number;
  /** carriers, a whole even number */
  carriers: number;
  /** wires a carrier */
  ends: number;
  /** picks a metre: crossings along the axis */
  picks: number;
}

export interface Braid {
  /** share of the surface that is covered, 0 to 1 */
  coverage: number;
  /** between a carrier and the axis, radians */
  angle: number;
  /** ohm per metre at dc */
  resistance: number;
}

/**
 * What a braid covers and its dc resistance: tan a = 2π(D + 2d)·P/C, F = N·P·d/sin a, coverage 2F − F²,
 * R = r/(N·C·cos a), r being the resistance of one wire.
 * @throws RangeError when a figure is not positive, or the wires would not fit side by side
 * Source: MIL-C-17 as handbooks give it, percentage of braid coverage.
 */
export function braidOf({ under, wire, carriers, ends, picks }: BraidMake, resistivity = COPPER_RESISTIVITY): Braid {
  requirePositive("braidOf", { under, wire, carriers, ends, picks, resistivity });
  const angle = Math.atan((2 * Math.PI * (under + 2 * wire) * picks) / carriers);
  const fill = (ends * picks * wire) / Math.sin(angle);
  if (!(fill <= 1)) throw new RangeError(`braidOf: ends of ${ends} wires do not fit side by side, fill ${fill}`);
  const ofOneWire = resistivity / (Math.PI * (wire / 2) ** 2);
  return { coverage: 2 * fill - fill * fill, angle, resistance: ofOneWire / (ends * carriers * Math.cos(angle)) };
}
