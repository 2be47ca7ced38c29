/** What is said about a run. Pure. */
import { z } from "zod";
import { plain } from "@/lib/http/plain-text";

export const newCommentSchema = z
  .strictObject({
    text: plain(
      z
        .string({ error: "A comment is text." })
        .trim()
        .min(1, { error: "Say something." })
        .max(2000, { error: "A comment has at most 2000 characters." }),
      "A comment",
    ),
  })
  .meta({ id: "NewComment" });

export const commentSchema = z
  .strictObject({
    id: z.string(),
    personName: z.string(),
    saidAt: z.string().describe("ISO 8601"),
    text: z.string(),
  })
  .meta({ id: "Comment" });
export type Comment = z.infer<typeof commentSchema>;

export const commentsSchema = z.strictObject({ items: z.array(commentSchema).describe("oldest first") });
