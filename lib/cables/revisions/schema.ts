/** Revisions of an entry on the wire. Pure. */
import { z } from "zod";
import { entryInputsSchema } from "@/lib/cables/inputs";
import { newCableSchema } from "@/lib/cables/new-cable";
import { type Cable, cableSchema, stateSchema } from "@/lib/cables/schema";
import { plain } from "@/lib/http/plain-text";

const time = z.string().describe("ISO 8601");

export const checkSchema = z
  .strictObject({
    check: z.string().describe("its name; a reviewer's answer is kept under it"),
    verdict: z.enum(["fine", "look", "contradiction"]),
    sentence: z.string(),
    percent: z.number().nullable().optional().describe("how far apart, per cent; null where there is no finite number"),
    culprit: z.string().optional().describe("the figure that does not fit the others"),
  })
  .meta({ id: "Check" });

/** As they are answered, what has a usual value filled in; they are sent as `EntryInputs`. */
const keptInputsSchema = z
  .strictObject(entryInputsSchema.shape)
  .meta({ id: "KeptEntryInputs", description: "what was typed, by each of the ways in" });

/** One revision of an entry, whole. */
export const cableRevisionSchema = cableSchema
  .extend({
    version: z.int().describe("one more at every change; the ETag"),
    isCurrent: z.boolean().describe("whether it is the one people see"),
    reason: z.string(),
    authorId: z.string(),
    authorName: z.string(),
    createdAt: time,
    submittedAt: time.nullable(),
    approvedByName: z.string().nullable(),
    approvedAt: time.nullable(),
    inputs: keptInputsSchema.nullable(),
    checks: z.array(checkSchema).describe("what the entry's figures say of each other"),
  })
  .meta({ id: "CableRevision" });
export type CableRevision = z.infer<typeof cableRevisionSchema>;

/** What a revision says of the cable, without what is said of the revision. */
export function cableOf(revision: CableRevision): Cable {
  const keys = Object.keys(cableSchema.shape) as (keyof Cable)[];
  return Object.fromEntries(keys.map((key) => [key, revision[key]])) as Cable;
}

const lineSchema = z
  .strictObject({
    revision: z.int(),
    state: stateSchema,
    condition: z.string().nullable(),
    reason: z.string(),
    authorName: z.string(),
    createdAt: time,
    submittedAt: time.nullable(),
    approvedByName: z.string().nullable(),
    approvedAt: time.nullable(),
    version: z.int(),
  })
  .meta({ id: "RevisionLine" });
export type RevisionLine = z.infer<typeof lineSchema>;

export const revisionLinesSchema = z.strictObject({ items: z.array(lineSchema).describe("newest first") });

export const newRevisionSchema = z
  .strictObject({
    reason: plain(
      z
        .string({ error: "The reason is text." })
        .trim()
        .min(1, { error: "Say why there is to be a new revision." })
        .max(500, { error: "A reason has at most 500 characters." }),
      "The reason",
    ),
  })
  .meta({ id: "NewRevision" });

// Without their defaults: what a change leaves out stays as it is.
const { designation, aliases, name, family, model, construction, build, figures, limits } = newCableSchema.shape;

/** Fields of an open draft; what is left out stays. */
export const cableChangeSchema = z
  .strictObject({
    ...{ designation, aliases: aliases.unwrap(), name: name.unwrap(), family, model },
    ...{
      construction: construction.unwrap(),
      build: build.unwrap(),
      figures: figures.unwrap(),
      limits: limits.unwrap(),
    },
    inputs: entryInputsSchema.nullable(),
  })
  .partial()
  .meta({ id: "CableChange" });
export type CableChange = z.infer<typeof cableChangeSchema>;
