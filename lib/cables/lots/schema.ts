/** Deliveries that were measured, on the wire. Pure. */
import { z } from "zod";
import { strangeIn } from "@/lib/cables/exchange/plain-text";
import { figureSchema, lineModelSchema, notNegative, positive, temperature } from "@/lib/cables/schema";
import { plain } from "@/lib/http/plain-text";

const name = (what: string) =>
  z
    .string({ error: `${what} must be text.` })
    .trim()
    .max(60, { error: `${what} has at most 60 characters.` })
    .refine((text) => strangeIn(text) === undefined, { error: `${what} holds characters that are not seen.` });

const lossSchema = z.strictObject({ frequencyHz: positive("The frequency"), lossDbPerM: positive("The loss") });

const day = z.iso
  .date({ error: "Give the day as 2026-03-01." })
  .refine((date) => Date.parse(date) <= Date.now() + 86_400_000, { error: "A measurement lies in the past." });

/** What was measured of a lot, or of one reel of it. */
export const newLotSchema = z
  .strictObject({
    lot: name("The lot").min(1, { error: "Name the lot." }),
    reel: name("The reel").default("").describe("where the figures are one reel's"),
    lengthM: positive("The length").optional().describe("of the sample or the reel"),
    measuredAt: day,
    temperatureC: temperature().default(20),
    z0Ohm: positive("The impedance").optional(),
    velocityFactor: positive("The velocity factor").max(1, { error: "A velocity factor is at most 1." }).optional(),
    loopResistanceOhmPerM: notNegative("The loop resistance").optional().describe("at temperatureC, out and back"),
    losses: z.array(lossSchema).max(50, { error: "At most 50 rows of loss." }).default([]),
    method: name("The method")
      .max(200)
      .default("")
      .describe("instrument, method, uncertainty: the source of the figures"),
    note: plain(z.string().trim().max(500, { error: "A note has at most 500 characters." }), "A note").default(""),
  })
  .refine(
    ({ z0Ohm, velocityFactor, loopResistanceOhmPerM, losses }) =>
      losses.length > 0 || [z0Ohm, velocityFactor, loopResistanceOhmPerM].some((figure) => figure !== undefined),
    { error: "Give at least one figure that was measured." },
  )
  .meta({ id: "NewLot" });
export type NewLot = z.output<typeof newLotSchema>;

export const lotSchema = z
  .strictObject({
    id: z.string(),
    lot: z.string(),
    reel: z.string(),
    lengthM: z.number().nullable(),
    figures: z.array(figureSchema).describe("of kind measured; what is nominal stays as it is"),
    note: z.string(),
    measuredAt: z.string(),
    addedByName: z.string(),
    addedAt: z.string(),
    model: lineModelSchema.nullable().describe("the entry's model with these figures; null where they make none"),
  })
  .meta({ id: "Lot" });
export type Lot = z.infer<typeof lotSchema>;

export const lotListSchema = z.strictObject({
  items: z.array(lotSchema).describe("the newest first"),
  mayAdd: z.boolean().describe("whether the asker may add to it"),
});
export type LotList = z.infer<typeof lotListSchema>;

/** The form of a lot with the file it was measured in: the lot as JSON, and the file. */
export const lotFormSchema = z.object({
  lot: z.string().describe("a NewLot as JSON"),
  file: z.string().optional().describe("the sweep or the log; it becomes evidence of the entry"),
});
