/** What an import is asked and what it answers. Pure. */
import { z } from "zod";
import { familySchema } from "@/lib/cables/schema";

export const outcomeSchema = z
  .enum(["draft", "quarantined", "unchanged", "duplicate", "noEntry"])
  .describe(
    "draft: brought in as a draft; quarantined: brought in, but contradicts itself; unchanged: the catalogue has it as it is; " +
      "duplicate: the designation is taken by other values, kept with the reason; noEntry: cannot be an entry, kept with the reason",
  );
export type ImportOutcome = z.infer<typeof outcomeSchema>;

export const importQuerySchema = z.object({
  dryRun: z
    .enum(["true", "false"], { error: "Say true or false." })
    .transform((text) => text === "true")
    .optional()
    .describe("true: say what would be brought in, and store nothing"),
  fileName: z
    .string({ error: "The name is given once." })
    .trim()
    .min(1)
    .max(200, { error: "A file name has at most 200 characters." })
    .optional(),
  family: familySchema.optional().describe("of rows that name none"),
});
export type ImportQuery = z.output<typeof importQuerySchema>;

const rowSchema = z.strictObject({
  row: z.int().describe("from 1, the head counted; of JSON the place in the list"),
  designation: z.string().nullable(),
  outcome: outcomeSchema,
  faults: z.array(z.string()).describe("why it does not become a draft, sentences"),
  notes: z.array(z.string()).describe("what was understood, and what to look at, sentences"),
  figures: z
    .strictObject({ z0Ohm: z.number(), velocityFactor: z.number(), lossDbPer100m: z.number().describe("at 1 GHz") })
    .nullable()
    .describe("what the entry comes to; null where it is none"),
  cableId: z.string().nullable().describe("the entry that came of it"),
});
export type ImportRow = z.infer<typeof rowSchema>;

const countsSchema = z.strictObject({
  draft: z.int(),
  quarantined: z.int(),
  unchanged: z.int(),
  duplicate: z.int(),
  noEntry: z.int(),
});
export type ImportCounts = z.infer<typeof countsSchema>;

export const importReportSchema = z
  .strictObject({
    importId: z.string().nullable().describe("null of a dry run"),
    fileName: z.string(),
    rowCount: z.int(),
    columns: z
      .array(
        z.strictObject({ head: z.string(), readAs: z.string().nullable().describe("null: not understood, not read") }),
      )
      .describe("of a table"),
    notes: z.array(z.string()).describe("about the whole file"),
    counts: countsSchema,
    rows: z.array(rowSchema),
  })
  .meta({ id: "ImportReport" });
export type ImportReport = z.infer<typeof importReportSchema>;

const importFields = {
  id: z.string(),
  fileName: z.string(),
  startedByName: z.string(),
  startedAt: z.string(),
  rowCount: z.int(),
  drafts: z.int(),
  quarantined: z.int(),
  skipped: z.int(),
};

export const importListSchema = z.strictObject({
  items: z.array(z.strictObject(importFields).meta({ id: "Import" })).describe("the newest first, at most 200"),
});
export type ImportList = z.infer<typeof importListSchema>;

export const keptImportSchema = z
  .strictObject({
    ...importFields,
    rows: z
      .array(
        z.strictObject({
          row: z.int(),
          text: z.string().describe("as it stood in the file"),
          faults: z.array(z.string()),
          cableId: z.string().nullable().describe("the quarantined entry that came of it"),
        }),
      )
      .describe("rows that became no draft"),
  })
  .meta({ id: "KeptImport" });
export type KeptImport = z.infer<typeof keptImportSchema>;
