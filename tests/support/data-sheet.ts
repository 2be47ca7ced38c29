/**
 * A data sheet as a librarian gets one: a 75 Ω foam cable whose capacitance was copied from the solid version and whose
 * table has one mistyped row. The true row at 450 MHz is 13.72 dB/100 m.
 */
import type { Checked } from "@/lib/cables/checks";
import { fromInputs } from "@/lib/cables/from-inputs";
import type { EntryInputs } from "@/lib/cables/inputs";
import type { Build, Construction } from "@/lib/cables/schema";
import { figuresOf } from "@/lib/cables/ways/figures";

export const foamBuild: Build = {
  ...{ conductor: "1.02 mm solid copper", isStranded: false, dielectric: "foam", dielectricName: "PE" },
  ...{ screen: ["foil", "braid"], screenName: "foil and braid", jacket: "LSZH", pairCount: 1 },
};

export const foamConstruction: Construction = {
  ...{ kind: "coax", innerMm: 1.02, dielectricMm: 4.6, relativePermittivity: 1.4516, lossTangent: 1.5e-4 },
};

const megahertz = [5, 10, 50, 100, 200, 450, 900, 1500, 3000];
const decibels = [1.37, 1.94, 4.4, 6.28, 8.98, 11.92, 19.85, 26.18, 38.48];
export const rowsOf = (losses: readonly number[]) =>
  losses.map((loss, i) => ({ frequencyHz: megahertz[i]! * 1e6, lossDbPerM: loss / 100 }));

export const claimed: EntryInputs = {
  nominal: {
    ...{ z0Ohm: 75, z0ToleranceOhm: 2, velocityFactor: 0.83, cFPerM: 67e-12 },
    ...{ conductorResistanceOhmPerM: 0.0211, loopResistanceOhmPerM: 0.0301 },
  },
  lossTable: { temperatureC: 20, kind: "nominal", rows: rowsOf(decibels) },
};

/** The sheet as it should have been. */
export const corrected: EntryInputs = {
  ...claimed,
  nominal: { ...claimed.nominal, cFPerM: 53.6e-12 },
  lossTable: { ...claimed.lossTable!, rows: rowsOf(decibels.with(5, 13.72)) },
};

/** An entry as it is stored, made from what was typed. */
export function entryFrom(inputs: EntryInputs, change: Partial<Checked> = {}): Checked {
  const { family = "coaxial", construction = foamConstruction, build = foamBuild } = change;
  const worked = fromInputs({ family, construction, build, inputs });
  if (!worked.model) throw new Error(worked.missing ?? "no model");
  const figures = figuresOf(inputs, worked);
  return { model: worked.model, figures, construction, build, family, limits: {}, inputs, ...change };
}
