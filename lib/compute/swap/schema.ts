/** What `/compute/swap` is asked and answers. Pure. */
import { z } from "zod";
import { familySchema } from "@/lib/cables/schema";
import { conditionFields, figure, pathSchema, targetsField } from "@/lib/compute/conditions";
import { checkFrequencies, frequencyFields } from "@/lib/compute/frequencies";
import { circuitSchema, maxElements } from "@/lib/runs/circuit-schema";

export const swapRequestSchema = z
  .strictObject({
    circuit: circuitSchema,
    ...frequencyFields,
    paths: z
      .array(pathSchema, { error: "The paths must be a list." })
      .min(1, { error: "At least one place is needed." })
      .max(maxElements, { error: `At most ${maxElements} places are possible.` })
      .describe("the places, as elements.0; of lines in parallel elements.2.branches.1"),
    targets: targetsField.default([]),
    ...conditionFields,
  })
  .superRefine(checkFrequencies)
  .meta({ id: "SwapRequest" });
export type SwapAsked = z.output<typeof swapRequestSchema>;

export const swapAnswerSchema = z
  .strictObject({
    items: z
      .array(
        z.strictObject({
          cableId: z.string(),
          designation: z.string(),
          family: familySchema,
          targetsMet: z.int().nonnegative().describe("how many of the targets"),
          margins: z.array(figure).describe("of each target in its unit; below 0 where it is missed"),
          totalLossDb: figure.describe("transducer loss at its worst over the frequencies asked"),
          massKg: figure.describe("of the cable in those places; null when unknown"),
        }),
      )
      .describe("best first: targets met, then the margin that is least for its limit, then loss"),
    refused: z.array(z.strictObject({ cableId: z.string(), designation: z.string(), why: z.string() })),
  })
  .meta({ id: "SwapAnswer" });
