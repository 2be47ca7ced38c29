/** The steps in the life of an entry, on the wire. Pure. */
import { z } from "zod";
import { stateSchema } from "@/lib/cables/schema";

export const eventSteps = [
  ...["begin", "edit", "submit", "approve", "return", "restrict"],
  ...["quarantine", "release", "supersede", "withdraw", "prefer", "unprefer"],
] as const;

export const eventSchema = z
  .strictObject({
    revision: z.int(),
    at: z.string().describe("ISO 8601"),
    personName: z.string(),
    step: z.enum(eventSteps),
    state: stateSchema.describe("the state the revision was in after it"),
    condition: z.string().nullable(),
    note: z.string(),
    answers: z.record(z.string(), z.string()).nullable().describe("a reviewer's answers, by check"),
  })
  .meta({ id: "CableEvent" });
export type CableEvent = z.infer<typeof eventSchema>;

export const eventsSchema = z.strictObject({ items: z.array(eventSchema).describe("oldest first") });
