/** Files that bear out an entry's figures, on the wire. Pure. */
import { z } from "zod";
import { evidenceTypes } from "@/lib/cables/evidence/media";
import { strangeIn } from "@/lib/cables/exchange/plain-text";

export const evidenceSchema = z
  .strictObject({
    id: z.string(),
    revision: z.int().describe("the revision it was attached to; later ones keep it"),
    fileName: z.string(),
    mediaType: z.enum(evidenceTypes).describe("what its content was found to be"),
    sizeBytes: z.int(),
    hash: z.string().describe("SHA-256 of the content, hexadecimal"),
    title: z.string().describe("title, issue and page, as figures cite it"),
    addedByName: z.string(),
    addedAt: z.string(),
  })
  .meta({ id: "Evidence" });
export type Evidence = z.infer<typeof evidenceSchema>;

export const evidenceListSchema = z.strictObject({
  items: z.array(evidenceSchema).describe("the newest first"),
  mayAdd: z.boolean().describe("whether the asker may add to it"),
});
export type EvidenceList = z.infer<typeof evidenceListSchema>;

/** What a form says beside its file. */
export const evidenceFieldsSchema = z.strictObject({
  title: z
    .string({ error: "Give a title: what it is, its issue and page." })
    .trim()
    .min(1, { error: "Give a title: what it is, its issue and page." })
    .max(300, { error: "A title has at most 300 characters." })
    .refine((text) => strangeIn(text) === undefined, { error: "The title holds characters that are not seen." }),
});

/** The form itself, for the description. */
export const evidenceFormSchema = z.object({
  file: z.string().describe("the file: PDF, PNG, JPEG, WebP, Touchstone or CSV, told by its content; at most 25 MB"),
  title: z.string().describe("title, issue and page"),
});

export const evidenceQuerySchema = z.object({
  view: z
    .enum(["true", "false"], { error: "Say true or false." })
    .optional()
    .describe("true: an image or a PDF to be looked at rather than kept"),
});
