/**
 * A catalogue as a file: its public schema and its version. JSON carries it as it is; `csv-columns.ts` says how a row of a
 * table carries one entry. Pure.
 */
import { z } from "zod";
import { entryInputsSchema } from "@/lib/cables/inputs";
import { newCableSchema } from "@/lib/cables/new-cable";
import { stateSchema, successorSchema } from "@/lib/cables/schema";

export const catalogueFormat = "ropewalk-catalogue";

/** One more whenever a file of before could be read wrongly; a field that may be left out changes nothing. */
export const catalogueVersion = 1;

/** How many entries one file brings in at most. */
export const mostEntries = 20_000;

const standingSchema = z
  .strictObject({
    state: stateSchema,
    revision: z.int(),
    preferred: z.boolean(),
    successor: successorSchema.omit({ cableId: true }).nullable(),
  })
  .describe("how the entry stood where it was taken out; said only: what is brought in starts anew, unapproved");

/** An entry's values, whole: what a file holds of it and what an import makes of it. */
export const catalogueEntrySchema = newCableSchema
  .extend({
    inputs: entryInputsSchema.nullable().default(null).describe("what was typed, by each of the ways in"),
    condition: z
      .string()
      .trim()
      .max(300, { error: "A condition has at most 300 characters." })
      .nullable()
      .default(null)
      .describe("use condition; an approval then restricts the entry to it"),
    standing: standingSchema.optional(),
  })
  .meta({ id: "CatalogueEntry" });
export type CatalogueEntry = z.output<typeof catalogueEntrySchema>;

/** The values of an entry, without where it stood. */
export type EntryValues = Omit<CatalogueEntry, "standing">;

const head = {
  format: z.literal(catalogueFormat, { error: `The format is ${catalogueFormat}.` }),
  version: z.literal(catalogueVersion, {
    error: `This reads version ${catalogueVersion} of the format.`,
  }),
};

export const catalogueSchema = z
  .strictObject({ ...head, cables: z.array(catalogueEntrySchema).max(mostEntries) })
  .meta({
    id: "Catalogue",
    description: "A catalogue as a file. SI units, named in the keys; R and L are loop values.",
  });

/** A file whose entries have not been looked at yet: each is read for itself, so that one fault does not hide the rest. */
export const catalogueFileSchema = z.strictObject({
  ...head,
  cables: z
    .array(z.unknown(), { error: "The cables are a list." })
    .max(mostEntries, { error: `A file brings in at most ${mostEntries.toLocaleString("en")} entries; part it.` }),
});

/** The public JSON Schema of a catalogue. */
export function catalogueJsonSchema(): Record<string, unknown> {
  return z.toJSONSchema(catalogueSchema, { io: "input" }) as Record<string, unknown>;
}

/** A value with the keys of its objects in order and nothing that is undefined, so that the same values are the same text. */
export function inOrder(value: unknown): unknown {
  if (Array.isArray(value)) return value.map(inOrder);
  if (typeof value !== "object" || value === null) return value;
  const entries = Object.entries(value).filter(([, inner]) => inner !== undefined);
  return Object.fromEntries(entries.sort(([a], [b]) => (a < b ? -1 : 1)).map(([key, inner]) => [key, inOrder(inner)]));
}

/** An entry as it stands in a file: its own keys in reading order, those inside by the alphabet. */
export function entryInOrder(entry: CatalogueEntry): CatalogueEntry {
  const { designation, aliases, name, family, condition, standing, model, build, ...rest } = entry;
  const { construction, limits, figures, inputs } = rest;
  // An empty jacket is none: a table has one way to say so.
  const jacketed = build && { ...build, jacket: build.jacket || null };
  const parts = inOrder({ model, construction, build: jacketed, limits, figures, inputs }) as Pick<
    EntryValues,
    "model" | "construction" | "build" | "limits" | "figures" | "inputs"
  >;
  return { designation, aliases, name, family, condition: condition || null, standing, ...parts };
}

/** The values of an entry as text: two entries that say the same have the same. */
export function valuesText(entry: CatalogueEntry): string {
  return JSON.stringify({ ...entryInOrder(entry), standing: undefined });
}
