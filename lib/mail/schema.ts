/** The letters of a team on the wire. Pure. */
import { z } from "zod";
import { nextCursorSchema, pageFields } from "@/lib/http/list";

export const letterStateSchema = z.enum(["waiting", "sent", "givenUp"], {
  error: "A letter is waiting, sent or givenUp.",
});
export type LetterState = z.infer<typeof letterStateSchema>;

export const letterQuerySchema = z.strictObject({
  state: letterStateSchema.optional().describe("default all"),
  ...pageFields,
});
export type LetterQuery = z.output<typeof letterQuerySchema>;

export const letterSchema = z
  .strictObject({
    id: z.string(),
    toAddress: z.string(),
    subject: z.string(),
    body: z.string().describe("plain text"),
    writtenAt: z.string().describe("ISO 8601"),
    state: letterStateSchema,
    tries: z.int().describe("how often it has been tried"),
    nextTryAt: z.string().nullable().describe("ISO 8601; null unless it waits for a mail server that is set"),
    sentAt: z.string().nullable().describe("ISO 8601"),
    error: z.string().nullable().describe("what the mail server said last"),
  })
  .meta({ id: "Letter" });
export type LetterItem = z.infer<typeof letterSchema>;

export const letterPageSchema = z
  .strictObject({
    items: z.array(letterSchema),
    nextCursor: nextCursorSchema,
    total: z.int(),
    hasMailServer: z.boolean().describe("false: no mail server is set, and letters stay here to be read"),
  })
  .meta({ id: "LetterPage", description: "The latest written first." });
export type LetterPage = z.infer<typeof letterPageSchema>;
