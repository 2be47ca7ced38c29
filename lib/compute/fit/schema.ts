/** What `/compute/fit` is asked and answers. Pure. */
import { z } from "zod";
import { constructionSchema, lineModelSchema, notNegative, positive, temperature } from "@/lib/cables/schema";
import { checkConstruction } from "@/lib/compute/geometry/schema";

const mostPoints = 1000;

export const conductorFormSchema = z.enum(["round", "sheet", "sqrt", "constant"], {
  error: "The form is round, sheet, sqrt or constant.",
});

const pointSchema = z.strictObject({
  frequencyHz: positive("The frequency"),
  lossDbPerM: positive("The loss"),
  weight: positive("The weight").optional(),
});

export const fitRequestSchema = z
  .strictObject({
    z0Ohm: positive("The impedance"),
    velocityFactor: positive("The velocity factor"),
    r0OhmPerM: notNegative("The dc resistance").describe("loop, at 20 °C"),
    points: z
      .array(pointSchema, { error: "The points must be a list." })
      .min(2, { error: "At least two points are needed." })
      .max(mostPoints, { error: `At most ${mostPoints} points are possible.` }),
    form: conductorFormSchema.default("sqrt").describe("of the one conductor term"),
    temperatureC: temperature().default(20).describe("of the points; models are at 20 °C"),
    construction: constructionSchema.optional().describe("to hold k1 against smooth conductors of this cross-section"),
  })
  .superRefine(({ construction }, context) => {
    if (construction) checkConstruction(construction, "construction", context);
  })
  .meta({ id: "FitRequest" });
export type FitRequest = z.output<typeof fitRequestSchema>;

const percent = z.number().nullable();

export const fitAnswerSchema = z
  .strictObject({
    k1DbPerMRootHz: z.number().describe("of the points, at their temperature; at least 0"),
    k2DbPerMHz: z.number().describe("at least 0"),
    model: lineModelSchema.describe("closed mapping of k1 and k2, exact far above the skin corner"),
    refit: z
      .strictObject({ model: lineModelSchema, rmsPercent: z.number() })
      .describe("skin corner and loss tangent fitted to the points directly, within bounds"),
    residuals: z.array(
      z.strictObject({
        frequencyHz: z.number(),
        givenDbPerM: z.number(),
        fittedDbPerM: z.number(),
        errorPercent: z.number().describe("100·(given − fitted)/given"),
        leftOutErrorPercent: percent.describe("against the fit of all other points; null where they say nothing"),
        refitErrorPercent: z.number().describe("against the refitted model"),
      }),
    ),
    rmsPercent: z.number(),
    worstPercent: z.number(),
    dcFloorDbPerM: z.number().describe("loss of the dc resistance alone, where resistance is less than reactance"),
    k1OverSmooth: z.number().optional().describe("k1 over that of smooth conductors of the construction"),
    warnings: z.array(z.string()),
  })
  .meta({ id: "FitAnswer" });
export type FitAnswer = z.infer<typeof fitAnswerSchema>;
