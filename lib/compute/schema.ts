/** What `/compute/*` is asked and answers. Pure. */
import { z } from "zod";
import { notNegative, positive, temperature } from "@/lib/cables/schema";
import { checkFrequencies, frequencyFields } from "@/lib/compute/frequencies";
import { matchMethods } from "@/lib/line/match/match-request";
import { terminationSchema } from "@/lib/runs/termination-schema";
import { circuitSchema, elementSchema, lineRefSchema, maxElements, planeSchema } from "@/lib/runs/circuit-schema";
import { bandSchema } from "@/lib/runs/schema";

const figure = z.number().nullable().describe("null where there is no finite number");
const figures = z.array(figure).describe("one value per frequency, null where there is no finite number");
const complexFigures = z.strictObject({ re: figures, im: figures });
const frequencies = z.array(z.number());

export const lineRequestSchema = z
  .strictObject({ line: lineRefSchema, ...frequencyFields, temperatureC: temperature().default(20) })
  .superRefine(checkFrequencies)
  .meta({ id: "LineRequest" });

export const lineAnswerSchema = z
  .strictObject({
    frequenciesHz: frequencies,
    rOhmPerM: figures,
    lHPerM: figures,
    gSPerM: figures,
    cFPerM: figures,
    zcOhm: complexFigures,
    attenuationDbPerM: figures,
    phaseRadPerM: figures,
    phaseVelocityMPerS: figures,
    velocityFactor: figures,
    groupDelaySPerM: figures,
  })
  .meta({ id: "LineAnswer" });

export const sweepRequestSchema = z
  .strictObject({
    circuit: circuitSchema,
    ...frequencyFields,
    temperatureC: temperature().default(20),
    planes: z
      .array(planeSchema, { error: "The planes must be a list." })
      .max(maxElements + 2, { error: `At most ${maxElements + 2} planes are possible.` })
      .default([]),
  })
  .superRefine(checkFrequencies)
  .meta({ id: "SweepRequest" });
export type SweepRequest = z.output<typeof sweepRequestSchema>;

const planeFigures = { reflection: complexFigures, returnLossDb: figures, vswr: figures };

export const sweepAnswerSchema = z
  .strictObject({
    frequenciesHz: frequencies,
    inputImpedanceOhm: complexFigures,
    ...planeFigures,
    loadReflection: complexFigures,
    transducerLossDb: figures,
    matchedLossDb: figures,
    mismatchLossDb: figures,
    extraLossDb: figures,
    groupDelayS: figures,
    elementLossDb: z.array(figures).describe("[element][frequency], power in over power out"),
    atPlanes: z.array(z.strictObject({ plane: planeSchema, impedanceOhm: complexFigures, ...planeFigures })),
  })
  .meta({ id: "SweepAnswer" });

const mostPoints = 200_000;

export const profileRequestSchema = z
  .strictObject({
    circuit: circuitSchema,
    frequencyHz: positive("The frequency"),
    availablePowerW: notNegative("The power"),
    pointsPerElement: z
      .int({ error: "The number of points is a whole number." })
      .min(2, { error: "At least two points are needed." })
      .max(10_001, { error: "At most 10 001 points are possible for each element." })
      .default(101)
      .describe("both ends of an element counted"),
    temperatureC: temperature().default(20),
  })
  .refine((asked) => asked.circuit.elements.length * asked.pointsPerElement <= mostPoints, {
    path: ["pointsPerElement"],
    error: "At most 200 000 points are possible in all.",
  })
  .meta({ id: "ProfileRequest" });
export type ProfileRequest = z.output<typeof profileRequestSchema>;

export const profileAnswerSchema = z
  .strictObject({
    positionM: z.array(z.number()),
    voltageV: z.array(figure).describe("rms"),
    currentA: z.array(figure).describe("rms"),
    maxVoltageV: figure,
    maxVoltageAtM: figure,
    maxCurrentA: figure,
    maxCurrentAtM: figure,
    elements: z.array(z.strictObject({ dissipatedW: figure })),
    loadPowerW: figure,
  })
  .meta({ id: "ProfileAnswer" });

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
      .describe("every usable cable of the catalogue"),
    methods: z
      .array(z.enum(matchMethods, { error: `A method is one of ${matchMethods.join(", ")}.` }))
      .min(1, { error: "At least one method is needed." })
      .optional(),
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
          worstTransducerLossDb: figure.describe("to the load, through what stands behind the network too"),
          worstMatchLossDb: figure.describe("available power over the power that leaves the network"),
          totalLengthM: z.number(),
          needs: z.array(z.string()),
          notes: z.array(z.string()),
        }),
      )
      .describe("best first"),
    refused: z.array(z.strictObject({ method: z.enum(matchMethods), why: z.string() })),
  })
  .meta({ id: "MatchesAnswer" });
