/** What is said of a revision. Pure. */
import { z } from "zod";
import { plain } from "@/lib/http/plain-text";

export const newCableCommentSchema = z
  .strictObject({
    text: plain(
      z
        .string({ error: "A comment is text." })
        .trim()
        .min(1, { error: "Say something." })
        .max(2000, { error: "A comment has at most 2000 characters." }),
      "A comment",
    ),
    revision: z
      .int({ error: "The revision is a whole number." })
      .positive({ error: "Revisions are counted from 1." })
      .optional()
      .describe("the revision it is about; else the open one, else the current one"),
  })
  .meta({ id: "NewCableComment" });
export type NewCableComment = z.output<typeof newCableCommentSchema>;

export const cableCommentSchema = z
  .strictObject({
    id: z.string(),
    revision: z.int(),
    personName: z.string(),
    saidAt: z.string().describe("ISO 8601"),
    text: z.string(),
  })
  .meta({ id: "CableComment" });
export type CableComment = z.infer<typeof cableCommentSchema>;

export const cableCommentsSchema = z.strictObject({ items: z.array(cableCommentSchema).describe("oldest first") });
