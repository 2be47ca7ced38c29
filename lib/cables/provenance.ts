/** Where a figure comes from. Pure. */
import { z } from "zod";

export const provenanceKinds = ["standard", "dataSheet", "construction", "measurement", "estimate"] as const;

/** Where a figure comes from, as far as that is known. */
export const provenanceSchema = z
  .strictObject({
    kind: z.enum(provenanceKinds, {
      error: "A source is a standard, dataSheet, construction, measurement or estimate.",
    }),
    title: z.string().max(200, { error: "A title has at most 200 characters." }).optional(),
    issue: z.string().max(60, { error: "An issue has at most 60 characters." }).optional().describe("issue or date"),
    page: z.string().max(40, { error: "A page has at most 40 characters." }).optional(),
    enteredBy: z.string().max(120, { error: "A name has at most 120 characters." }).optional(),
    checkedBy: z.string().max(120, { error: "A name has at most 120 characters." }).optional(),
    instrument: z.string().max(200, { error: "An instrument has at most 200 characters." }).optional(),
    calibration: z
      .string()
      .max(120, { error: "A calibration has at most 120 characters." })
      .optional()
      .describe("certificate and until when it holds"),
    evidenceId: z.string().max(60).optional().describe("the file it is read from, among the entry's evidence"),
  })
  .meta({ id: "Provenance" });
export type Provenance = z.infer<typeof provenanceSchema>;

const kindWords: Record<Provenance["kind"], string> = {
  standard: "Standard",
  dataSheet: "Data sheet",
  construction: "Worked out from the construction",
  measurement: "Measurement",
  estimate: "Estimate",
};

/** A source in one line, as a figure's `source` has it: "Data sheet: Ternledge cable sheet, issue 2, page 3". */
export function sourceWords(provenance: Provenance | undefined, otherwise: string): string {
  if (!provenance) return otherwise;
  const { kind, title, issue, page, instrument } = provenance;
  const parts = [title, issue && `issue ${issue}`, page && `page ${page}`, kind === "measurement" && instrument];
  const words = parts.filter(Boolean).join(", ");
  return (words ? `${kindWords[kind]}: ${words}` : kindWords[kind]).slice(0, 300);
}
