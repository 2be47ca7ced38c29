/** Waivers: one run may have one cable that it otherwise could not, until a date. Pure. */
import { z } from "zod";
import { plain } from "@/lib/http/plain-text";

/** A day that is on the calendar, "2026-03-01". */
export const daySchema = (what: string) =>
  z.iso.date({ error: `${what} is a date of the calendar, as in 2026-03-01.` });

export const newWaiverSchema = z
  .strictObject({
    runId: z.string({ error: "Name the run by its id." }).min(1, { error: "Name the run." }).max(100),
    reason: plain(
      z
        .string({ error: "The reason is text." })
        .trim()
        .min(1, { error: "Say why the run may have it." })
        .max(1000, { error: "A reason has at most 1000 characters." }),
      "The reason",
    ),
    until: daySchema("The end").describe("the last day it holds"),
  })
  .meta({ id: "NewWaiver" });
export type NewWaiver = z.output<typeof newWaiverSchema>;

export const waiverSchema = z
  .strictObject({
    id: z.string(),
    runId: z.string(),
    runNumber: z.string(),
    runName: z.string(),
    reason: z.string(),
    until: z.string(),
    givenByName: z.string(),
    givenAt: z.string().describe("ISO 8601"),
    endedAt: z.string().nullable().describe("when it was taken back"),
    holds: z.boolean().describe("whether it holds today"),
  })
  .meta({ id: "Waiver" });
export type Waiver = z.infer<typeof waiverSchema>;

export const waiversSchema = z.strictObject({ items: z.array(waiverSchema).describe("newest first") });

/** Whether a waiver holds on a day; its last day counts. Days are those of UTC. */
export function holdsOn({ until, endedAt }: { until: string; endedAt: string | null }, day: string): boolean {
  return endedAt === null && day <= until;
}

export const today = (): string => new Date().toISOString().slice(0, 10);
