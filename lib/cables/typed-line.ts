/** The five figures of a typed cable as people write them -> the engine's model. Loads mathjs; the model alone is in `typed-model.ts`. */
import { readQuantity, type Read } from "@/lib/format/read-quantity";
import { typedLineModel } from "@/lib/cables/typed-model";
import { readVelocityFactor } from "@/lib/format/read-velocity-factor";
import type { LineModel } from "@/lib/line/element";

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
