/** The cable of a calculator: chosen from the catalogue or typed. Pure. */
import type { CableLine } from "@/lib/cables/line";
import { typedCable } from "@/lib/cables/line";
import { typedLineModel } from "@/lib/cables/typed-model";
import { optional, quantity, typed, type Texts, type Values } from "@/lib/calculators/input";
import { readVelocityFactor } from "@/lib/format/read-velocity-factor";
import type { LineModel } from "@/lib/line/element";

const isTyped = (texts: Texts) => texts.cable === typedCable;

/** The usual typed cable is a thin solid-polyethylene coaxial one, not of the catalogue. */
export const lineInputs = {
  cable: { input: "cable" as const, label: "Cable", usual: typedCable },
  z0: quantity("resistance", "Impedance", "50", { isPositive: true, most: 1e6, isShown: isTyped }),
  vf: typed("Velocity factor", "0.66", readVelocityFactor, { isShown: isTyped }),
  r0: quantity("resistancePerLength", "Loop resistance, dc", "50 Ω/km", { isNotNegative: true, isShown: isTyped }),
  corner: optional(quantity("frequency", "Skin corner", "40 kHz", { isPositive: true, isShown: isTyped })),
  tan: quantity("number", "Loss tangent", "0.0003", { isNotNegative: true, most: 1, isShown: isTyped }),
};

/** What a calculator works with. */
export interface ChosenLine {
  label: string;
  model: LineModel;
  /** the entry of the catalogue; null for a typed cable */
  entry: CableLine | null;
}

/**
 * The cable that the inputs mean.
 * @param entries - of the catalogue, as far as they have been loaded
 * @returns null where the entry has not been loaded
 */
export function chosenLine(
  values: Values<typeof lineInputs>,
  entries: ReadonlyMap<string, CableLine>,
): ChosenLine | null {
  if (values.cable === typedCable)
    return {
      label: "the typed cable",
      model: typedLineModel({
        z0: values.z0,
        velocityFactor: values.vf,
        loopResistance: values.r0,
        skinCorner: values.corner,
        lossTangent: values.tan,
      }),
      entry: null,
    };
  const entry = entries.get(values.cable);
  return entry ? { label: entry.designation, model: entry.model, entry } : null;
}
