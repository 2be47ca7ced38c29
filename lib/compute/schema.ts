/** What the routes of `/compute/*` that have no file of their own are asked and answer. Pure. */
import { z } from "zod";
import { notNegative, positive, temperature } from "@/lib/cables/schema";
import { checkFrequencies, frequencyFields } from "@/lib/compute/frequencies";
import { circuitSchema, lineRefSchema, maxElements, planeSchema } from "@/lib/runs/circuit-schema";

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
