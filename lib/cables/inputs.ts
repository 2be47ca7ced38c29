/**
 * What was typed of a cable, by each of the four ways in, and which of them rules where they disagree. The inputs are
 * kept as they were given; construction stands in the entry's own field. Pure.
 */
import { z } from "zod";
import { provenanceSchema } from "@/lib/cables/provenance";
import { lineModelSchema, notNegative, positive, temperature } from "@/lib/cables/schema";

const typed = z
  .record(z.string().max(60), z.string().max(120))
  .describe("each figure as it was typed, with its unit, by the name of its field");

export const nominalInputSchema = z.strictObject({
  z0Ohm: positive("The impedance").optional(),
  z0ToleranceOhm: notNegative("The tolerance of the impedance").optional(),
  velocityFactor: positive("The velocity factor").max(1.2, { error: "A velocity factor is at most 1." }).optional(),
  velocityFactorTolerance: notNegative("The tolerance of the velocity factor").optional(),
  cFPerM: positive("The capacitance").optional(),
  cToleranceFPerM: notNegative("The tolerance of the capacitance").optional(),
  lInfHPerM: positive("The inductance").optional(),
  loopResistanceOhmPerM: notNegative("The loop resistance").optional(),
  conductorResistanceOhmPerM: notNegative("The resistance of the inner conductor or of one wire").optional(),
  lossTangent: notNegative("The loss tangent").max(1, { error: "The loss tangent must be at most 1." }).optional(),
  typed: typed.optional(),
});

export const lossRowSchema = z.strictObject({
  frequencyHz: positive("The frequency"),
  lossDbPerM: positive("The loss"),
  typed: z.string().max(120).optional().describe("the row as it was typed or pasted"),
  isLeftOut: z.boolean().optional().describe("kept, but not fitted"),
  note: z.string().max(300).optional().describe("why it is kept or left out"),
});

export const lossTableInputSchema = z.strictObject({
  temperatureC: temperature().default(20),
  kind: z.enum(["nominal", "typical", "maximum", "measured"], { error: "Say what kind of figures the rows are." }),
  rows: z.array(lossRowSchema).max(500, { error: "A loss table has at most 500 rows." }),
});

export const readingsInputSchema = z.strictObject({
  lengthM: positive("The length of the sample"),
  openCapacitanceF: positive("The capacitance").optional(),
  shortInductanceH: positive("The inductance").optional(),
  shortResistanceOhm: notNegative("The resistance").optional(),
  oneWayDelayS: positive("The delay").optional(),
  roundTripS: positive("The round trip").optional(),
  meterHz: positive("The meter's frequency").optional(),
  temperatureC: temperature().optional(),
  instrument: z.string().max(200).optional().describe("instrument, serial number and calibration"),
  typed: typed.optional(),
});

export const sweepInputSchema = z.strictObject({
  lengthM: positive("The length of the sample"),
  evidenceId: z.string().max(60).optional().describe("the sweep's file among the entry's evidence"),
  fileName: z.string().max(200).optional().describe("what the file was called"),
  shortEvidenceId: z.string().max(60).optional().describe("with a one-port sweep: that of the far end shorted"),
  model: lineModelSchema.optional().describe("what was worked out of it when it was read"),
});

/** Which way rules for what; a way that has nothing to say about it is passed over. */
export const rulingSchema = z.strictObject({
  impedance: z.enum(["construction", "nominal", "readings", "sweep"], { error: "Say which way rules." }),
  loss: z.enum(["construction", "lossTable", "sweep", "nominal"], { error: "Say which way rules." }),
  resistance: z.enum(["construction", "nominal", "readings", "sweep"], { error: "Say which way rules." }),
});

export const sourcesSchema = z
  .strictObject({
    construction: provenanceSchema,
    nominal: provenanceSchema,
    lossTable: provenanceSchema,
    readings: provenanceSchema,
  })
  .partial();

export const entryInputsSchema = z
  .strictObject({
    /** the construction as it was typed; its values stand in the entry's own field */
    constructionTyped: typed.optional(),
    nominal: nominalInputSchema.optional(),
    lossTable: lossTableInputSchema.optional(),
    readings: readingsInputSchema.optional(),
    sweep: sweepInputSchema.optional(),
    ruling: rulingSchema.optional(),
    sources: sourcesSchema.optional().describe("where each way's figures come from"),
    form: z.enum(["round", "sqrt"], { error: "The form is round or sqrt." }).optional(),
  })
  .meta({ id: "EntryInputs" });
export type EntryInputs = z.infer<typeof entryInputsSchema>;
