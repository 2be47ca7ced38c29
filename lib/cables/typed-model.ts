/** A cable that is typed rather than chosen, as the engine's model. Pure. */
import { modelFromNominal } from "@/lib/line/cable";
import type { LineModel } from "@/lib/line/element";

export interface TypedLine {
  /** ohm */
  z0: number;
  velocityFactor: number;
  /** dc resistance out and back, ohm per metre */
  loopResistance: number;
  /** hertz; without one the resistance stays at its dc value */
  skinCorner: number | undefined;
  lossTangent: number;
}

/** One lumped conductor term: all that is known of a typed cable is its resistance and where the skin effect begins. */
export function typedLineModel({ z0, velocityFactor, loopResistance, skinCorner, lossTangent }: TypedLine): LineModel {
  const hasSkin = skinCorner !== undefined && loopResistance > 0;
  return modelFromNominal({
    z0,
    velocityFactor,
    lossTangent,
    conductors: [
      hasSkin
        ? { form: "sqrt", r0OhmPerM: loopResistance, skinCornerRadPerS: 2 * Math.PI * skinCorner }
        : { form: "constant", r0OhmPerM: loopResistance },
    ],
  });
}
