/** What can be asked of the catalogue as files: taken out, brought in. */
import { z } from "zod";
import { catalogueSchema } from "@/lib/cables/exchange/catalogue";
import { importListSchema, importQuerySchema, importReportSchema, keptImportSchema } from "@/lib/cables/imports/schema";
import { operation } from "@/lib/http/operation";

const exportQuerySchema = z.object({
  format: z.enum(["csv", "json"], { error: "The format is csv or json." }),
  after: z
    .string({ error: "The designation is given once." })
    .max(60)
    .optional()
    .describe("begin after this designation: a large catalogue can be taken out in parts"),
  limit: z
    .string({ error: "The limit is given once." })
    .regex(/^\d{1,6}$/, { error: "The limit is a whole number." })
    .transform(Number)
    .optional()
    .describe("entries at most; all without it"),
});

export const exportOperation = operation({
  id: "exportCables",
  method: "GET",
  path: "/cables/export",
  summary:
    "The entries that the asker may read, by designation, as a file that can be brought in again. In CSV a text that a " +
    "spreadsheet would run has an apostrophe before it, which bringing in takes off.",
  permission: "cables.export",
  query: exportQuerySchema,
  answer: {
    status: 200,
    description: "The catalogue, as bringing in takes it (schema Catalogue).",
    mediaType: ["application/json", "text/csv"],
  },
});

export const importOperation = operation({
  id: "importCables",
  method: "POST",
  path: "/cables/import",
  summary:
    "Bring in many entries at once, all or nothing; ask with dryRun=true first. At most 25 MB and 20,000 entries. With " +
    "`Accept: application/x-ndjson` the answer is lines: {progress:{done,of}} as it goes, then {report} or {problem}.",
  permission: "cables.import",
  query: importQuerySchema,
  accepts: { "application/json": catalogueSchema, "text/csv": z.string() },
  answer: { status: 200, description: "Row by row, what becomes of it.", schema: importReportSchema },
  refusals: ["malformed"],
});

export const listImportsOperation = operation({
  id: "listImports",
  method: "GET",
  path: "/cables/imports",
  summary: "What was brought in at once, the newest first.",
  permission: "cables.readImports",
  answer: { status: 200, description: "The imports.", schema: importListSchema },
});

export const readImportOperation = operation({
  id: "readImport",
  method: "GET",
  path: "/cables/imports/{importId}",
  summary: "One import, with the rows that became no draft.",
  permission: "cables.readImports",
  answer: { status: 200, description: "The import.", schema: keptImportSchema },
});

export const catalogueSchemaOperation = operation({
  id: "readCatalogueSchema",
  method: "GET",
  path: "/catalogue-schema.json",
  summary: "The JSON Schema of a catalogue as a file.",
  permission: null,
  answer: { status: 200, description: "A JSON Schema." },
});
