/** What another revision of a cable does to the runs that use it, on the wire. Pure. */
import { z } from "zod";
import { planeSchema } from "@/lib/runs/circuit-schema";
import { runStateSchema, targetSchema } from "@/lib/runs/schema";

const judgedSchema = z.strictObject({
  value: z.number().nullable().describe("at its worst over the band; in the target's unit; null: no finite number"),
  frequencyHz: z.number().nullable().describe("where it is at its worst"),
  isMet: z.boolean().nullable().describe("null where there is no limit, or it cannot be told"),
});

const effectSchema = z
  .strictObject({
    quantity: targetSchema.shape.quantity,
    plane: planeSchema.nullable(),
    bandHz: z.tuple([z.number(), z.number()]),
    atLeast: z.number().nullable(),
    atMost: z.number().nullable(),
    now: judgedSchema,
    then: judgedSchema,
    changePercent: z.number().nullable(),
    why: z.string().nullable().describe("why it cannot be worked out"),
  })
  .meta({ id: "Effect" });
export type Effect = z.infer<typeof effectSchema>;

export const runEffectSchema = z
  .strictObject({
    runId: z.string(),
    number: z.string(),
    name: z.string(),
    state: runStateSchema,
    ownerName: z.string(),
    revisions: z.array(z.int()).describe("those of the cable that the run now uses"),
    isAffected: z.boolean().describe("issued, and a later revision has been approved since"),
    effects: z.array(effectSchema).describe("the run's targets, and its loss where none is set on it"),
    changesState: z.boolean().describe("whether a target that is met would no longer be, or the other way round"),
    largestPercent: z.number().nullable(),
    why: z.string().nullable().describe("why the run cannot be worked out"),
  })
  .meta({ id: "RunEffect" });
export type RunEffect = z.infer<typeof runEffectSchema>;

export const usesSchema = z
  .strictObject({
    cableId: z.string(),
    designation: z.string(),
    revision: z.int().describe("the revision whose effect is told"),
    total: z.int().describe("runs that use the cable"),
    items: z.array(runEffectSchema).describe("largest change first; at most the 500 that changed last"),
  })
  .meta({ id: "CableUses" });
export type CableUses = z.infer<typeof usesSchema>;

export const usesQuerySchema = z.strictObject({
  revision: z.coerce
    .number({ error: "The revision is a number." })
    .int({ error: "The revision is a whole number." })
    .positive({ error: "Revisions are counted from 1." })
    .optional()
    .describe("the revision whose effect is asked; the current one without"),
});
