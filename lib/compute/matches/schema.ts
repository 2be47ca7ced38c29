/** What `/compute/matches` is asked and answers. Pure. */
import { z } from "zod";
import { notNegative, positive, temperature } from "@/lib/cables/schema";
import { matchMethods } from "@/lib/line/match/match-request";
import { mostSections } from "@/lib/line/match/step-transformer";
import { elementSchema, lineRefSchema, maxElements } from "@/lib/runs/circuit-schema";
import { bandSchema } from "@/lib/runs/schema";
import { terminationSchema } from "@/lib/runs/termination-schema";

const figure = z.number().nullable().describe("null where there is no finite number");

/** A part of a half wave of the feeder. */
const wavelengths = (what: string) =>
  z
    .number({ error: `${what} must be a number of wavelengths.` })
    .lt(0.5, { error: `${what} is less than half a wavelength.` });

const q = (what: string) => positive(`The Q of the ${what}`).optional();

export const matchesRequestSchema = z
  .strictObject({
    load: terminationSchema,
    targetOhm: positive("The target"),
    designHz: positive("The design frequency"),
    bandHz: bandSchema,
    returnLossDb: positive("The return loss").max(200, {
      error: "A return loss of more than 200 dB cannot be told from a perfect match.",
    }),
    feeder: lineRefSchema.optional().describe("the line between load and network, and the one that leads on"),
    lines: z
      .array(lineRefSchema, { error: "The lines must be a list." })
      .max(200, { error: "At most 200 lines are possible." })
      .optional()
      .describe("for stubs and sections; or catalogue: true"),
    catalogue: z
      .literal(true, { error: "Leave it out, or say true." })
      .optional()
      .describe("every usable cable of the catalogue, of a large one the nearest by impedance; two in series too"),
    methods: z
      .array(z.enum(matchMethods, { error: `A method is one of ${matchMethods.join(", ")}.` }))
      .min(1, { error: "At least one method is needed." })
      .optional(),
    spacingWavelengths: wavelengths("The spacing of the stubs")
      .gt(0, { error: "The spacing of the stubs is more than 0." })
      .optional()
      .describe("double stub: feeder from stub to stub; default an eighth of a wavelength"),
    firstDistanceWavelengths: wavelengths("The distance to the first stub")
      .min(0, { error: "The distance to the first stub is at least 0." })
      .optional()
      .describe("double stub: feeder from the load to the first stub; default 0"),
    sections: z
      .int({ error: "The number of sections is a whole number." })
      .min(1, { error: "At least one section is needed." })
      .max(mostSections, { error: `At most ${mostSections} sections are possible.` })
      .optional()
      .describe("binomial and equalRipple; default as few, from 2 to 5, as keep the return loss over the band"),
    rippleReturnLossDb: positive("The ripple's return loss")
      .max(200, { error: "A ripple of more than 200 dB of return loss cannot be told from none." })
      .optional()
      .describe("equalRipple; default 6 dB better than returnLossDb"),
    networkQ: positive("The Q of the network")
      .optional()
      .describe(
        "piNetwork and tNetwork: loaded Q at the middle resistance; default 1.5 times the L-section's, at least 2",
      ),
    notchHz: positive("The notch frequency")
      .optional()
      .describe("notchStub: the frequency kept from the load; without it there is no notch stub"),
    endAllowanceM: notNegative("The allowance for ends")
      .max(1, { error: "Ends and joints add at most 1 m." })
      .optional()
      .describe("what joints and ends add to each piece in all; cuts[].cutM is that much shorter than drawn"),
    place: z
      .strictObject({
        behind: z
          .array(elementSchema, { error: "What stands behind must be a list of elements." })
          .max(maxElements, { error: `At most ${maxElements} elements can stand behind.` })
          .describe("from the network to the load"),
      })
      .optional()
      .describe("where the network stands: before these elements of the run; without it, at the load"),
    tolerance: z
      .strictObject({
        lengthM: notNegative("The tolerance of a length").optional(),
        valuePercent: notNegative("The tolerance of a value")
          .lt(100, { error: "The tolerance of a value is less than 100 %." })
          .optional(),
      })
      .optional()
      .describe("how well lengths are cut and parts are chosen; each candidate then says what it keeps at its worst"),
    partQ: z
      .strictObject({ coilQ: q("coils"), capacitorQ: q("capacitors") })
      .optional()
      .describe("at the design frequency; without it parts have no loss"),
    temperatureC: temperature().default(20),
  })
  .refine((asked) => (asked.lines === undefined) !== (asked.catalogue === undefined), {
    path: ["lines"],
    error: "Say which lines there are to cut from: a list, or catalogue: true.",
  })
  .meta({ id: "MatchesRequest" });
export type MatchesRequest = z.output<typeof matchesRequestSchema>;

export const matchesAnswerSchema = z
  .strictObject({
    candidates: z
      .array(
        z.strictObject({
          method: z.enum(matchMethods),
          title: z.string(),
          elements: z.array(elementSchema).describe("the network alone, from the target side to the load"),
          designReturnLossDb: figure,
          bandwidthHz: figure.describe("contiguous width around designHz; may exceed the band"),
          worstReturnLossDb: figure,
          worstReturnLossAtLimitsDb: figure
            .optional()
            .describe("every length and value at its limits, in every combination; with tolerance only"),
          yieldPercent: z
            .number()
            .optional()
            .describe("of 500 seeded draws within the tolerance, those that keep returnLossDb; with tolerance only"),
          hasIdealLine: z
            .literal(true)
            .optional()
            .describe("a section is a line that no cable given has the impedance of, and has to be made"),
          resistorsOhm: z
            .array(z.number())
            .length(3)
            .optional()
            .describe("of a pad, from the source side: series, across, series; 0 is a wire"),
          notchLossDb: figure.optional().describe("transducer loss at notchHz; notch stubs only"),
          worstTransducerLossDb: figure.describe("to the load, through what stands behind the network too"),
          worstMatchLossDb: figure.describe("available power over the power that leaves the network"),
          totalLengthM: z.number(),
          cuts: z
            .array(
              z.strictObject({
                name: z.string(),
                line: z.string(),
                count: z.int(),
                lengthM: z.number().describe("as drawn and computed"),
                cutM: figure.describe("less endAllowanceM; null where nothing would be left"),
                trimHzPerM: figure.describe("how the best frequency moves for each metre taken off, up above 0"),
              }),
            )
            .describe("pieces of cable to cut, from the target side to the load"),
          needs: z.array(z.string()),
          notes: z.array(z.string()),
        }),
      )
      .describe("best first"),
    refused: z.array(z.strictObject({ method: z.enum(matchMethods), why: z.string() })),
    omitted: z
      .array(z.strictObject({ method: z.enum(matchMethods), count: z.int() }))
      .describe("solutions left out as the worst of a method that has over 120"),
    cutFrom: z
      .strictObject({ lines: z.int(), of: z.int() })
      .describe("how many lines were tried, and of how many: of a large catalogue the nearest by impedance"),
  })
  .meta({ id: "MatchesAnswer" });
