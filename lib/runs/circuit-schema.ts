/**
 * The zod schemas of a circuit: lines, terminations, elements, planes. They validate requests, and become the OpenAPI
 * document. Pure, runs in the browser too.
 */
import { z } from "zod";
import type { Circuit as EngineCircuit, Element as EngineElement } from "@/lib/line/element";
import { minimumPadLossDb } from "@/lib/line/pad";
import { lineModelSchema, notNegative, positive, temperature } from "@/lib/cables/schema";
import { sourceSchema, terminationSchema } from "@/lib/runs/termination-schema";
import { plain } from "@/lib/http/plain-text";

export const maxElements = 200;

const name = plain(z.string().max(80, { error: "A name has at most 80 characters." }), "The name").optional();

export const lineRefSchema = z
  .union(
    [
      z.strictObject({ cableId: z.string().min(1).max(80), revision: z.int().positive().optional() }),
      z.strictObject({ model: lineModelSchema }),
    ],
    { error: "A line is a cable of the catalogue, { cableId }, or a model of its own, { model }." },
  )
  .meta({ id: "LineRef" });
export type LineRef = z.infer<typeof lineRefSchema>;

const lengthM = notNegative("The length").max(1e7, { error: "A length is at most 10 000 km." });
const laid = {
  name,
  lengthM,
  lengthToleranceM: notNegative("The length tolerance").optional(),
  temperatureC: temperature().optional(),
};
const paralleled = z
  .int({ error: "The number in parallel is a whole number." })
  .min(1, { error: "At least one cable is needed." })
  .max(100, { error: "At most 100 cables can be paralleled." })
  .optional();

const partSchema = z
  .strictObject({
    kind: z.literal("part"),
    name,
    connection: z.enum(["shunt", "series"], { error: "The connection is shunt or series." }),
    rOhm: notNegative("The resistance").optional(),
    lH: notNegative("The inductance").optional(),
    cF: positive("The capacitance").optional(),
    q: positive("Q").optional(),
    qAtHz: positive("The frequency of Q").optional(),
  })
  .refine((p) => [p.rOhm, p.lH, p.cF].filter((v) => v !== undefined).length === 1, {
    error: "A part is exactly one of a resistor, a coil and a capacitor.",
  })
  .refine((p) => p.q === undefined || p.rOhm === undefined, { path: ["q"], error: "A resistor has no Q." })
  .refine((p) => p.qAtHz === undefined || p.q !== undefined, { path: ["q"], error: "A frequency of Q needs a Q." });

const padSchema = z
  .strictObject({
    kind: z.literal("pad"),
    name,
    topology: z.enum(["T", "pi"], { error: "The topology is T or pi." }).optional(),
    lossDb: notNegative("The loss").max(200, { error: "A pad loses at most 200 dB." }),
    inputOhm: positive("The input resistance"),
    outputOhm: positive("The output resistance"),
  })
  .superRefine((pad, context) => {
    if (!(pad.inputOhm > 0 && pad.outputOhm > 0)) return;
    const least = minimumPadLossDb(pad.inputOhm, pad.outputOhm);
    if (pad.lossDb < least - 1e-9)
      context.addIssue({
        code: "custom",
        path: ["lossDb"],
        message: `Between ${pad.inputOhm} Ω and ${pad.outputOhm} Ω a resistive pad loses at least ${least.toFixed(2)} dB.`,
      });
  });

export const elementSchema = z
  .discriminatedUnion(
    "kind",
    [
      z.strictObject({ kind: z.literal("cable"), ...laid, line: lineRefSchema, paralleled }),
      z.strictObject({
        kind: z.literal("parallel"),
        name,
        branches: z
          .array(
            z.strictObject({
              line: lineRefSchema,
              lengthM: positive("The length").max(1e7, { error: "A length is at most 10 000 km." }),
            }),
          )
          .min(1, { error: "At least one branch is needed." })
          .max(20, { error: "At most 20 branches are allowed." }),
        temperatureC: temperature().optional(),
      }),
      z.strictObject({
        kind: z.literal("stub"),
        ...laid,
        connection: z.enum(["shunt", "series"], { error: "The connection is shunt or series." }),
        end: z.union([z.enum(["open", "short"]), terminationSchema], {
          error: "The end of a stub is open, short or a termination.",
        }),
        line: lineRefSchema,
        paralleled,
      }),
      z.strictObject({ kind: z.literal("shunt"), name, termination: terminationSchema }),
      partSchema,
      padSchema,
      z.strictObject({
        kind: z.literal("joint"),
        name,
        lossDb: notNegative("The loss").max(200, { error: "A joint loses at most 200 dB." }).optional(),
        lossDbAtOneGhz: notNegative("The loss at 1 GHz")
          .max(200, { error: "A joint loses at most 200 dB." })
          .optional(),
        referenceOhm: positive("The reference").optional(),
        shuntF: notNegative("The capacitance").optional(),
      }),
      z.strictObject({
        kind: z.literal("transformer"),
        name,
        turnsRatio: positive("The turns ratio").describe("source side : load side"),
      }),
    ],
    { error: "An element is a cable, parallel, stub, shunt, part, pad, joint or transformer." },
  )
  .meta({ id: "Element" });

export const circuitSchema = z
  .strictObject({
    source: sourceSchema,
    elements: z
      .array(elementSchema, { error: "Elements must be a list." })
      .max(maxElements, { error: `A run has at most ${maxElements} elements.` })
      .describe("from source to load"),
    load: terminationSchema,
    referenceOhm: positive("The reference").optional(),
  })
  .meta({ id: "Circuit" });

/** A circuit whose lines are references, as stored and as sent. */
export type Circuit = EngineCircuit<LineRef>;
export type Element = EngineElement<LineRef>;

export const planeSchema = z
  .union([
    z.strictObject({ at: z.enum(["source", "load"]) }),
    z.strictObject({ beforeElement: z.int().nonnegative({ error: "Elements are counted from 0." }) }),
  ])
  .meta({ id: "Plane" });
