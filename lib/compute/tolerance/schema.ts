/** What `/compute/tolerance` is asked and answers. Pure. */
import { z } from "zod";
import { conditionFields, figure, figures, limitsSchema, pathSchema, targetsField } from "@/lib/compute/conditions";
import { checkFrequencies, frequencyFields } from "@/lib/compute/frequencies";
import { distributions } from "@/lib/line/distribution";
import { mostCornerPaths } from "@/lib/line/spread";
import { circuitSchema } from "@/lib/runs/circuit-schema";

const mostDraws = 20_000;
const mostPaths = 100;

const spreadSchema = z
  .strictObject({
    path: pathSchema.describe(
      "into the circuit: elements.0.lengthM, .z0Percent, .velocityFactorPercent, .lossPercent, elements.3.valuePercent, load.reflectionMagnitude, load.reflectionPhase (radian), or any figure",
    ),
    limits: limitsSchema("Limits").describe("SI values; deviations for a path in percent"),
    distribution: z
      .enum(distributions, { error: `A distribution is one of ${distributions.join(", ")}.` })
      .optional()
      .describe("between the limits; uniform unless told. truncatedNormal has its limits at two standard deviations"),
  })
  .meta({ id: "Spread" });

function checkSpread(
  { spread, corners }: { spread: { path: string }[]; corners?: boolean },
  context: z.core.$RefinementCtx,
): void {
  const refuse = (path: (string | number)[], message: string) => context.addIssue({ code: "custom", path, message });
  const paths = spread.map(({ path }) => path);
  paths.forEach((path, index) => {
    if (paths.indexOf(path) < index) refuse(["spread", index, "path"], "This path is named twice.");
  });
  if (corners && paths.length > mostCornerPaths)
    refuse(["corners"], `Corners of at most ${mostCornerPaths} paths can be looked at; there are ${paths.length}.`);
}

export const toleranceRequestSchema = z
  .strictObject({
    circuit: circuitSchema,
    ...frequencyFields,
    spread: z
      .array(spreadSchema, { error: "The spread must be a list." })
      .max(mostPaths, { error: `At most ${mostPaths} paths can be spread.` }),
    draws: z
      .int({ error: "The number of draws is a whole number." })
      .min(1, { error: "At least one draw is needed." })
      .max(mostDraws, { error: "At most 20 000 draws are possible." }),
    seed: z
      .int({ error: "The seed is a whole number." })
      .min(0, { error: "The seed cannot be negative." })
      .max(2 ** 32 - 1, { error: "The seed is at most 4 294 967 295." })
      .describe("the same seed gives the same draws"),
    corners: z.boolean({ error: "Corners is true or false." }).optional().describe("every combination of limits too"),
    targets: targetsField.default([]),
    ...conditionFields,
  })
  .superRefine(checkFrequencies)
  .superRefine(checkSpread)
  .meta({ id: "ToleranceRequest" });
export type ToleranceAsked = z.output<typeof toleranceRequestSchema>;

const shares = z.strictObject({ min: figures, p05: figures, median: figures, p95: figures, max: figures });
const extremes = z.strictObject({ min: figures, max: figures });

export const toleranceAnswerSchema = z
  .strictObject({
    frequenciesHz: z.array(z.number()),
    returnLossDb: shares.describe("at the source plane"),
    transducerLossDb: shares,
    corners: z.strictObject({ returnLossDb: extremes, transducerLossDb: extremes }).optional(),
    yieldPercent: figure.describe("draws that keep every target; null without a target"),
    targetPercents: z.array(figure).describe("the same of each target alone"),
    contributors: z
      .array(
        z.strictObject({
          path: z.string(),
          effectDb: figure.describe("the larger of the two that follow"),
          returnLossEffectDb: figure.describe(
            "what the worst return loss, counted up to 60 dB, changes by while this alone goes from limit to limit",
          ),
          transducerLossEffectDb: figure.describe("the same of the worst transducer loss"),
        }),
      )
      .describe("largest effect first"),
  })
  .meta({ id: "ToleranceAnswer" });
