/** A cable that is typed rather than chosen: five figures as people write them -> the engine's model. Pure. */
import { readQuantity, type Read } from "@/lib/format/read-quantity";
import { readVelocityFactor } from "@/lib/format/read-velocity-factor";
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

/** The names under which the five figures stand in an address. */
export type TypedLineTexts = { z0: string; vf: string; r0: string; corner: string; tan: string };

/** Reads the five texts; the first that cannot be read refuses the whole. Empty ones are a line without that loss. */
export function readTypedLine(texts: TypedLineTexts): Read<LineModel> {
  const z0 = readQuantity("resistance", texts.z0);
  const vf = readVelocityFactor(texts.vf);
  const r0 = readQuantity("resistancePerLength", texts.r0.trim() || "0");
  const corner = texts.corner.trim() === "" ? undefined : readQuantity("frequency", texts.corner);
  const tan = readQuantity("number", texts.tan.trim() || "0");
  for (const read of [z0, vf, r0, corner, tan]) if (read && !read.ok) return read;
  if (!(z0.ok && vf.ok && r0.ok && tan.ok)) return { ok: false, message: "The typed cable cannot be read." };
  const isPossible = z0.value > 0 && r0.value >= 0 && tan.value >= 0 && tan.value <= 1;
  if (!isPossible || (corner?.ok && !(corner.value > 0)))
    return { ok: false, message: "The typed cable is not possible: figures below 0, or no impedance." };
  const model = typedLineModel({
    z0: z0.value,
    velocityFactor: vf.value,
    loopResistance: r0.value,
    skinCorner: corner?.ok ? corner.value : undefined,
    lossTangent: tan.value,
  });
  return { ok: true, value: model, understood: `${z0.understood}, velocity factor ${vf.understood}` };
}
