/** A problem with a cable, reported and settled. Pure. */
import { z } from "zod";
import { plain } from "@/lib/http/plain-text";

const sentence = (what: string, missing: string) =>
  plain(
    z
      .string({ error: `${what} is text.` })
      .trim()
      .min(1, { error: missing })
      .max(2000, { error: `${what} has at most 2000 characters.` }),
    what,
  );

export const newReportSchema = z
  .strictObject({ text: sentence("A report", "Say what is wrong with the cable.") })
  .meta({ id: "NewCableReport" });

const outcomes = ["quarantined", "corrected", "noFault"] as const;

export const settleSchema = z
  .strictObject({
    outcome: z
      .enum(outcomes, { error: "The outcome is quarantined, corrected or noFault." })
      .describe("quarantined also quarantines the entry"),
    answer: sentence("The answer", "Say what came of it."),
  })
  .meta({ id: "Settlement" });
export type Settlement = z.output<typeof settleSchema>;

const time = z.string().describe("ISO 8601");

export const reportSchema = z
  .strictObject({
    id: z.string(),
    cableId: z.string(),
    designation: z.string(),
    revision: z.int(),
    personName: z.string(),
    reportedAt: time,
    text: z.string(),
    settledAt: time.nullable(),
    settledByName: z.string().nullable(),
    outcome: z.enum(outcomes).nullable(),
    answer: z.string().nullable(),
  })
  .meta({ id: "CableReport" });
export type CableReport = z.infer<typeof reportSchema>;

export const reportsSchema = z.strictObject({ items: z.array(reportSchema).describe("newest first") });
