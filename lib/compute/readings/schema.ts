/** What `/compute/readings` is asked and answers. Pure. */
import { z } from "zod";
import { lineModelSchema, positive } from "@/lib/cables/schema";
import { conductorFormSchema } from "@/lib/compute/fit/schema";

export const readingsRequestSchema = z
  .strictObject({
    lengthM: positive("The length"),
    openCapacitanceF: positive("The capacitance").optional().describe("far end open"),
    shortInductanceH: positive("The inductance").optional().describe("far end short"),
    shortResistanceOhm: positive("The resistance").optional().describe("far end short"),
    oneWayDelayS: positive("The delay").optional(),
    roundTripS: positive("The round trip").optional(),
    meterHz: positive("The meter's frequency").default(1000),
    k1DbPerMRootHz: positive("k1").optional().describe("conductors' part of the attenuation over √f"),
    form: conductorFormSchema.default("sqrt").describe("of the one conductor term"),
  })
  .superRefine((asked, context) => {
    const refuse = (path: string, message: string) => context.addIssue({ code: "custom", path: [path], message });
    const delay = asked.oneWayDelayS ?? asked.roundTripS;
    const given = [asked.openCapacitanceF, asked.shortInductanceH, delay].filter((each) => each !== undefined);
    if (given.length < 2) {
      const message = "Two of capacitance, inductance and delay are needed.";
      if (asked.openCapacitanceF === undefined) refuse("openCapacitanceF", message);
      if (asked.shortInductanceH === undefined) refuse("shortInductanceH", message);
      if (delay === undefined) refuse("oneWayDelayS", message);
    }
    if (asked.k1DbPerMRootHz !== undefined && asked.shortResistanceOhm === undefined)
      refuse("shortResistanceOhm", "k1 tells the skin corner only with the resistance of the shorted sample.");
  })
  .meta({ id: "ReadingsRequest" });
export type ReadingsRequest = z.output<typeof readingsRequestSchema>;

const figure = z.number().nullable();

export const readingsAnswerSchema = z
  .strictObject({
    model: lineModelSchema,
    z0Ohm: z.number(),
    velocityFactor: z.number(),
    checks: z.array(
      z.strictObject({
        reading: z.enum(["shortInductanceH", "velocityFactor", "oneWayDelayS"]),
        givenSi: z.number(),
        expectedSi: z.number(),
        deviationPercent: z.number(),
        verdict: z.enum(["fine", "look", "contradiction"]),
      }),
    ),
    meterWillRead: z
      .array(
        z.strictObject({
          frequencyHz: z.number(),
          openCapacitanceF: figure,
          shortInductanceH: figure.describe("negative where the sample is so long that it looks like a capacitor"),
          shortResistanceOhm: figure,
          shortInductanceSecondOrderH: figure.describe("(l − r²·c·len²/3)·len"),
          zcOhm: z.strictObject({ re: figure, im: figure }),
          velocityFactor: figure,
        }),
      )
      .describe("on this sample, at the meter's own frequency, 1 kHz, 10 kHz and 100 kHz"),
    notes: z.array(z.string()),
  })
  .meta({ id: "ReadingsAnswer" });
export type ReadingsAnswer = z.infer<typeof readingsAnswerSchema>;
