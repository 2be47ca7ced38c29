/** What `GET /runs` is asked and answers. Pure. */
import { z } from "zod";
import { nextCursorSchema, pageFields } from "@/lib/http/list";
import { runItemSchema, runStateSchema } from "@/lib/runs/schema";

export const runQuerySchema = z.strictObject({
  q: z
    .string({ error: "The search is given once." })
    .trim()
    .max(200, { error: "A search has at most 200 characters." })
    .optional()
    .describe("text in the number, name, site or folder"),
  state: z
    .preprocess((given) => (Array.isArray(given) ? given : [given]), z.array(runStateSchema))
    .optional()
    .describe("repeatable; default all"),
  ...pageFields,
});
export type RunQuery = z.output<typeof runQuerySchema>;

export const runPageSchema = z
  .strictObject({ items: z.array(runItemSchema), nextCursor: nextCursorSchema, total: z.int() })
  .meta({ id: "RunPage", description: "The latest changed first." });
export type RunPage = z.infer<typeof runPageSchema>;
