/** What waits for the team's reviewers, on the wire. Pure. */
import { z } from "zod";
import { eventSchema } from "@/lib/cables/events/schema";
import { reportSchema } from "@/lib/cables/reports/schema";
import { buildSchema, constructionSchema, familySchema } from "@/lib/cables/schema";

const waitingSchema = z
  .strictObject({
    cableId: z.string(),
    designation: z.string(),
    revision: z.int(),
    family: familySchema,
    construction: constructionSchema.nullable(),
    build: buildSchema.nullable(),
    outerDiameterMm: z.number().nullable(),
    authorName: z.string(),
    submittedAt: z.string().describe("ISO 8601"),
    changedFields: z.int().nullable().describe("against the current revision; null for a new entry"),
    refusal: z.string().nullable().describe("why you may not approve it, a sentence; null where you may"),
  })
  .meta({ id: "WaitingRevision" });
export type WaitingRevision = z.infer<typeof waitingSchema>;

const settledSchema = eventSchema
  .pick({ revision: true, at: true, personName: true, step: true })
  .extend({ cableId: z.string(), designation: z.string() })
  .meta({ id: "SettledRevision" });
export type SettledRevision = z.infer<typeof settledSchema>;

const dueSchema = z
  .strictObject({
    cableId: z.string(),
    designation: z.string(),
    revision: z.int(),
    reviewDueAt: z.string().describe("ISO 8601"),
    isOverdue: z.boolean(),
  })
  .meta({ id: "DueEntry" });
export type DueEntry = z.infer<typeof dueSchema>;

export const queueSchema = z
  .strictObject({
    waiting: z.array(waitingSchema).describe("the longest waiting first; at most 200"),
    waitingTotal: z.int(),
    settled: z.array(settledSchema).describe("approved and returned lately, the last first"),
    due: z.array(dueSchema).describe("entries due for another look within 90 days, the first due first; at most 200"),
    reports: z.array(reportSchema).describe("problems reported and not settled, newest first"),
  })
  .meta({ id: "ReviewQueue" });
export type ReviewQueue = z.infer<typeof queueSchema>;

export const waitingCountSchema = z.strictObject({ waiting: z.int() }).meta({ id: "WaitingCount" });
