/**
 * The one description of a run: zod schemas that validate requests, shape answers and become the OpenAPI document.
 * Pure, runs in the browser too.
 */
import { z } from "zod";
import { positive, temperature } from "@/lib/cables/schema";
import { plain } from "@/lib/http/plain-text";
import { circuitSchema, planeSchema } from "@/lib/runs/circuit-schema";

const finite = (what: string) => z.number({ error: `${what} must be a number.` });
const frequencyHz = positive("A frequency");

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

const words = (what: string, most: number) =>
  plain(
    z
      .string({ error: `${what} must be text.` })
      .trim()
      .max(most, { error: `${what} has at most ${most} characters.` }),
    what,
  );
const title = words("The name", 120).min(1, { error: "Give the run a name." });

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
