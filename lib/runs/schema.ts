/**
 * The one description of a run and of the circuit in it: zod schemas that validate requests, shape answers and become
 * the OpenAPI document. Pure, runs in the browser too.
 */
import { z } from "zod";
import type {
  Circuit as EngineCircuit,
  Element as EngineElement,
  Termination as EngineTermination,
} from "@/lib/line/element";
import { minimumPadLossDb } from "@/lib/line/pad";
import { lineModelSchema, notNegative, positive, temperature } from "@/lib/cables/schema";

export const maxFrequencies = 10_001;
export const maxElements = 200;

const finite = (what: string) => z.number({ error: `${what} must be a number.` });
const name = z.string().max(80, { error: "A name has at most 80 characters." }).optional();
const frequencyHz = positive("A frequency");

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

const networkSchema = z
  .strictObject({
    kind: z.literal("network"),
    topology: z.enum(["series", "parallel"], { error: "The topology is series or parallel." }),
    rOhm: notNegative("The resistance").optional(),
    lH: notNegative("The inductance").optional(),
    cF: notNegative("The capacitance").optional(),
  })
  .refine((n) => n.rOhm !== undefined || n.lH !== undefined || n.cF !== undefined, {
    error: "A network needs at least one of resistance, inductance and capacitance.",
  });

const sampledSchema = z
  .strictObject({
    kind: z.literal("sampled"),
    referenceOhm: positive("The reference"),
    frequenciesHz: z.array(frequencyHz).min(1).max(maxFrequencies),
    reflection: z.strictObject({
      re: z.array(finite("A reflection")).max(maxFrequencies),
      im: z.array(finite("A reflection")).max(maxFrequencies),
    }),
  })
  .refine(
    (s) => s.reflection.re.length === s.frequenciesHz.length && s.reflection.im.length === s.frequenciesHz.length,
    {
      path: ["reflection"],
      error: "The reflection needs as many values as there are frequencies.",
    },
  )
  .refine((s) => s.frequenciesHz.every((f, i) => i === 0 || f > (s.frequenciesHz[i - 1] ?? 0)), {
    path: ["frequenciesHz"],
    error: "The frequencies must ascend.",
  });

const openSchema = z.strictObject({ kind: z.literal("open") });
const shortSchema = z.strictObject({ kind: z.literal("short") });
const constantSchema = z.strictObject({
  kind: z.literal("constant"),
  reOhm: notNegative("The resistance"),
  imOhm: finite("The reactance"),
});

const terminationKinds = "A termination is constant, network, open, short or sampled.";
export const terminationSchema = z
  .discriminatedUnion("kind", [constantSchema, networkSchema, openSchema, shortSchema, sampledSchema], {
    error: terminationKinds,
  })
  .meta({ id: "Termination" });

const sourceSchema = z.discriminatedUnion("kind", [constantSchema, networkSchema, shortSchema], {
  error: "A source is constant, network or short (0 Ω); it cannot be open or sampled.",
});

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
export type Termination = EngineTermination;

export const planeSchema = z
  .union([
    z.strictObject({ at: z.enum(["source", "load"]) }),
    z.strictObject({ beforeElement: z.int().nonnegative({ error: "Elements are counted from 0." }) }),
  ])
  .meta({ id: "Plane" });

const band = z
  .tuple([positive("The lower end of the band"), positive("The upper end of the band")], {
    error: "A band is two frequencies.",
  })
  .refine(([from, to]) => to >= from, { error: "The band's upper end is below its lower end." });
export const bandSchema = band;

export const targetSchema = z
  .strictObject({
    quantity: z.enum(
      // prettier-ignore
      ["loss", "returnLoss", "vswr", "delay", "skew", "level", "overshoot", "settling", "tapDip", "dcDrop", "idleBias", "voltage", "power"],
    ),
    plane: planeSchema.optional(),
    bandHz: band.optional(),
    atLeast: finite("The least value").optional(),
    atMost: finite("The greatest value").optional(),
  })
  .refine((t) => t.atLeast !== undefined || t.atMost !== undefined, {
    error: "A target needs a least or a greatest value.",
  })
  .meta({ id: "Target" });
export type Target = z.infer<typeof targetSchema>;

export const runStateSchema = z.enum(["draft", "issued", "verified"]);
export type RunState = z.infer<typeof runStateSchema>;

const title = z
  .string({ error: "The name must be text." })
  .trim()
  .min(1, { error: "Give the run a name." })
  .max(120, { error: "A name has at most 120 characters." });
const words = (what: string, most: number) =>
  z
    .string({ error: `${what} must be text.` })
    .trim()
    .max(most, { error: `${what} has at most ${most} characters.` });

const runFields = {
  name: title,
  site: words("The site", 120),
  folder: words("The folder", 120),
  circuit: circuitSchema,
  temperatureC: temperature(),
  designHz: frequencyHz.describe("the frequency at which spot figures are given"),
  availablePowerW: positive("The power").max(1e9, { error: "The power is at most 1 GW." }).nullable(),
  bandHz: band.nullable(),
  targets: z.array(targetSchema).max(50, { error: "A run has at most 50 targets." }),
  sourceName: words("The source's name", 40),
  loadName: words("The load's name", 40),
};

export const newRunSchema = z
  .strictObject({
    name: runFields.name,
    site: runFields.site.default(""),
    folder: runFields.folder.default(""),
    circuit: runFields.circuit,
    temperatureC: runFields.temperatureC.default(20),
    designHz: runFields.designHz.optional(),
    availablePowerW: runFields.availablePowerW.default(null),
    bandHz: runFields.bandHz.default(null),
    targets: runFields.targets.default([]),
    sourceName: runFields.sourceName.default("Source"),
    loadName: runFields.loadName.default("Load"),
  })
  .meta({ id: "NewRun" });
export type NewRun = z.infer<typeof newRunSchema>;

export const runChangeSchema = z.strictObject(runFields).partial().meta({ id: "RunChange" });
export type RunChange = z.infer<typeof runChangeSchema>;

export const runSchema = z
  .strictObject({
    id: z.string(),
    number: z.string().describe("sheet number within the team"),
    ...runFields,
    state: runStateSchema,
    condition: z.string().nullable(),
    ownerId: z.string(),
    ownerName: z.string(),
    version: z.int().positive(),
    changedAt: z.string().describe("ISO 8601"),
    changedByName: z.string(),
    pinned: z.array(z.strictObject({ cableId: z.string(), revision: z.int() })),
  })
  .meta({ id: "Run" });
export type Run = z.infer<typeof runSchema>;

/** A row of the run list. */
export const runItemSchema = runSchema
  .pick({
    id: true,
    number: true,
    name: true,
    site: true,
    folder: true,
    state: true,
    condition: true,
    ownerId: true,
    ownerName: true,
    version: true,
    changedAt: true,
    designHz: true,
    bandHz: true,
  })
  .extend({ totalLengthM: z.number(), cables: z.array(z.string()).describe("designations, in order, once each") })
  .meta({ id: "RunItem" });
export type RunItem = z.infer<typeof runItemSchema>;
