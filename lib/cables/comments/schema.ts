/** What is said of a revision. Pure. */
import { z } from "zod";
import { commentSchema, newCommentSchema } from "@/lib/runs/comments/schema";

export const newCableCommentSchema = newCommentSchema
  .extend({
    revision: z
      .int({ error: "The revision is a whole number." })
      .positive({ error: "Revisions are counted from 1." })
      .optional()
      .describe("the revision it is about; else the open one, else the current one"),
  })
  .meta({ id: "NewCableComment" });
export type NewCableComment = z.output<typeof newCableCommentSchema>;

export const cableCommentSchema = commentSchema.extend({ revision: z.int() }).meta({ id: "CableComment" });
export type CableComment = z.infer<typeof cableCommentSchema>;

export const cableCommentsSchema = z.strictObject({ items: z.array(cableCommentSchema).describe("oldest first") });
