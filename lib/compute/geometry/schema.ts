/** What `/compute/geometry` is asked and answers. Pure. */
import { z } from "zod";
import { constructionSchema, lineModelSchema, positive, type Construction } from "@/lib/cables/schema";

type Refuse = (path: string, message: string) => void;

function checkCoax(coax: Extract<Construction, { kind: "coax" }>, refuse: Refuse): void {
  if (!(coax.dielectricMm > coax.innerMm)) refuse("dielectricMm", "The dielectric must be wider than the conductor.");
  if (!(coax.relativePermittivity >= 1)) refuse("relativePermittivity", "The permittivity is at least 1.");
}

function checkPair(pair: Extract<Construction, { kind: "pair" }>, refuse: Refuse): void {
  if (!(pair.spacingMm > pair.wireMm)) refuse("spacingMm", "The wires touch: the spacing is between their centres.");
  if (!(pair.effectivePermittivity >= 1)) refuse("effectivePermittivity", "The permittivity is at least 1.");
  if (pair.screen && !(pair.screen.innerMm > pair.spacingMm + pair.wireMm))
    refuse("screen.innerMm", "The wires do not fit into the screen.");
}

/** Refuses a construction whose parts do not fit together, each rule at its place under `at`. */
export function checkConstruction(construction: Construction, at: string, context: z.core.$RefinementCtx): void {
  const refuse: Refuse = (path, message) =>
    context.addIssue({ code: "custom", path: [at, ...path.split(".")], message });
  if (construction.kind === "coax") checkCoax(construction, refuse);
  else checkPair(construction, refuse);
}

export const geometryRequestSchema = z
  .strictObject({
    construction: constructionSchema,
    frequencyHz: positive("The frequency").optional().describe("for the series resistance there"),
  })
  .superRefine(({ construction }, context) => checkConstruction(construction, "construction", context))
  .meta({ id: "GeometryRequest" });
export type GeometryRequest = z.output<typeof geometryRequestSchema>;

export const geometryAnswerSchema = z
  .strictObject({
    model: lineModelSchema,
    z0Ohm: z.number(),
    velocityFactor: z.number(),
    capacitanceFPerM: z.number(),
    inductanceHPerM: z.number().describe("external, at high frequency"),
    cutoffHz: z.number().nullable().describe("second mode (TE11) of a coaxial line; null for a pair"),
    r0OhmPerM: z.number().describe("dc, loop"),
    rOhmPerM: z.number().optional().describe("series resistance of the model at frequencyHz"),
    highFrequencyROhmPerM: z.number().optional().describe("the closed form far above the skin corners, at frequencyHz"),
    notes: z.array(z.string()).describe("what was taken or is not told well"),
  })
  .meta({ id: "GeometryAnswer" });
export type GeometryAnswer = z.infer<typeof geometryAnswerSchema>;
