/** The zod schemas of what stands at an end: of a run, of a stub, or across the line. Pure. */
import { z } from "zod";
import { notNegative, positive } from "@/lib/cables/schema";

export const maxFrequencies = 10_001;

const finite = (what: string) => z.number({ error: `${what} must be a number.` });
const frequencyHz = positive("A frequency");

const networkSchema = z
  .strictObject({
    kind: z.literal("network"),
    topology: z.enum(["series", "parallel"], { error: "The topology is series or parallel." }),
    rOhm: notNegative("The resistance").optional(),
    lH: notNegative("The inductance").optional(),
    cF: notNegative("The capacitance").optional(),
  })
  .refine((n) => n.rOhm !== undefined || n.lH !== undefined || n.cF !== undefined, {
    error: "A network needs at least one of resistance, inductance and capacitance.",
  });

const sampledSchema = z
  .strictObject({
    kind: z.literal("sampled"),
    referenceOhm: positive("The reference"),
    frequenciesHz: z.array(frequencyHz).min(1).max(maxFrequencies),
    reflection: z.strictObject({
      re: z.array(finite("A reflection")).max(maxFrequencies),
      im: z.array(finite("A reflection")).max(maxFrequencies),
    }),
  })
  .refine(
    (s) => s.reflection.re.length === s.frequenciesHz.length && s.reflection.im.length === s.frequenciesHz.length,
    {
      path: ["reflection"],
      error: "The reflection needs as many values as there are frequencies.",
    },
  )
  .refine((s) => s.frequenciesHz.every((f, i) => i === 0 || f > (s.frequenciesHz[i - 1] ?? 0)), {
    path: ["frequenciesHz"],
    error: "The frequencies must ascend.",
  });

const openSchema = z.strictObject({ kind: z.literal("open") });
const shortSchema = z.strictObject({ kind: z.literal("short") });
const constantSchema = z.strictObject({
  kind: z.literal("constant"),
  reOhm: notNegative("The resistance"),
  imOhm: finite("The reactance"),
});

const terminationKinds = "A termination is constant, network, open, short or sampled.";
export const terminationSchema = z
  .discriminatedUnion("kind", [constantSchema, networkSchema, openSchema, shortSchema, sampledSchema], {
    error: terminationKinds,
  })
  .meta({ id: "Termination" });

export const sourceSchema = z.discriminatedUnion("kind", [constantSchema, networkSchema, shortSchema], {
  error: "A source is constant, network or short (0 Ω); it cannot be open or sampled.",
});
