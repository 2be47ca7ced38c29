/** What `/compute/extract` is asked and answers. Pure. */
import { z } from "zod";
import { lineModelSchema, positive } from "@/lib/cables/schema";
import { conductorFormSchema } from "@/lib/compute/fit/schema";
import { maxFrequencies } from "@/lib/runs/termination-schema";

const finite = z.number({ error: "A value must be a number." });
const values = z
  .array(finite, { error: "The values must be a list." })
  .max(maxFrequencies, { error: `At most ${maxFrequencies} values are possible.` });
const complexValues = z.strictObject({ re: values, im: values });
const axis = {
  referenceOhm: positive("The reference"),
  frequenciesHz: z
    .array(positive("A frequency"), { error: "The frequencies must be a list." })
    .min(3, { error: "At least three frequencies are needed." })
    .max(maxFrequencies, { error: `At most ${maxFrequencies} frequencies are possible.` })
    .refine((list) => list.every((f, k) => k === 0 || f > (list[k - 1] ?? 0)), {
      error: "The frequencies must ascend.",
    }),
};

interface Swept {
  frequenciesHz: number[];
  [data: string]: unknown;
}

/** Refuses data of another length than their frequencies, at the path of each. */
function checkLengths(sweep: Swept, names: readonly string[], context: z.core.$RefinementCtx): void {
  for (const name of names) {
    const { re, im } = sweep[name] as { re: number[]; im: number[] };
    if (re.length !== sweep.frequenciesHz.length || im.length !== sweep.frequenciesHz.length)
      context.addIssue({ code: "custom", path: [name], message: "As many values as frequencies are needed." });
  }
}

const parameters = ["s11", "s21", "s12", "s22"] as const;

const twoPortSchema = z
  .strictObject({ ...axis, s11: complexValues, s21: complexValues, s12: complexValues, s22: complexValues })
  .superRefine((sweep, context) => checkLengths(sweep, parameters, context));

const onePortSchema = z
  .strictObject({ ...axis, reflection: complexValues })
  .superRefine((sweep, context) => checkLengths(sweep, ["reflection"], context));

export const extractRequestSchema = z
  .strictObject({
    lengthM: positive("The length"),
    twoPort: twoPortSchema.optional().describe("a sweep through the sample; or open and short"),
    open: onePortSchema.optional().describe("far end open"),
    short: onePortSchema.optional().describe("far end short"),
    form: conductorFormSchema.default("sqrt").describe("of the one conductor term"),
    r0OhmPerM: positive("The dc resistance").optional().describe("loop, where it is known apart"),
  })
  .superRefine(({ twoPort, open, short }, context) => {
    const refuse = (path: string[], message: string) => context.addIssue({ code: "custom", path, message });
    if (twoPort && (open || short)) return refuse(["twoPort"], "Give a two-port sweep or open and short, not both.");
    if (twoPort) return;
    if (!open && !short) return refuse(["twoPort"], "A two-port sweep is needed, or one open and one short.");
    if (!open || !short) return refuse([open ? "short" : "open"], "Open and short belong together.");
    if (open.referenceOhm !== short.referenceOhm) refuse(["short", "referenceOhm"], "The references differ.");
    const isSame = open.frequenciesHz.every((f, k) => f === short.frequenciesHz[k]);
    if (!isSame || open.frequenciesHz.length !== short.frequenciesHz.length)
      refuse(["short", "frequenciesHz"], "Open and short must be swept over the same frequencies.");
  })
  .meta({ id: "ExtractRequest" });
export type ExtractRequest = z.output<typeof extractRequestSchema>;

const figures = z.array(z.number().nullable()).describe("one value a frequency, null where the sweep does not tell it");

export const extractAnswerSchema = z
  .strictObject({
    frequenciesHz: z.array(z.number()),
    zcOhm: z.strictObject({ re: figures, im: figures }),
    attenuationDbPerM: figures,
    phaseRadPerM: figures,
    model: lineModelSchema.describe("at the temperature of the sweep"),
    residuals: z
      .strictObject({
        attenuationPercent: figures,
        phasePercent: figures,
        zcPercent: figures,
        rmsPercent: z.number().nullable(),
      })
      .describe("model against measured; rms of the attenuation"),
    warnings: z.array(z.string()),
  })
  .meta({ id: "ExtractAnswer" });
export type ExtractAnswer = z.infer<typeof extractAnswerSchema>;
