/** What `/compute/solve` is asked and answers. Pure. */
import { z } from "zod";
import { conditionFields, figure, limitsSchema, pathSchema, targetsField } from "@/lib/compute/conditions";
import { checkFrequencies, frequencyFields } from "@/lib/compute/frequencies";
import { circuitSchema } from "@/lib/runs/circuit-schema";

export const solveRequestSchema = z
  .strictObject({
    circuit: circuitSchema,
    ...frequencyFields,
    vary: z.strictObject({
      path: pathSchema.describe(
        "into the circuit, as of a spread; or temperatureC, supplyV, loadCurrentA, availablePowerW, drive.riseS",
      ),
      between: limitsSchema("The ends of the range"),
    }),
    targets: targetsField.min(1, { error: "At least one target is needed." }),
    want: z.enum(["largest", "smallest"], { error: "Wanted is the largest or the smallest value." }).default("largest"),
    ...conditionFields,
  })
  .superRefine(checkFrequencies)
  .meta({ id: "SolveRequest" });
export type SolveAsked = z.output<typeof solveRequestSchema>;

export const solveAnswerSchema = z
  .strictObject({
    value: figure.describe("null when no value was found with which all targets hold"),
    binds: z
      .int()
      .nonnegative()
      .nullable()
      .describe("index of the target that fails just beyond; null where the range ends first"),
    why: z.string().describe("a sentence: what binds, or why there is none"),
    assumed: z.string().describe("how the range was looked at, and what might not be seen"),
    margins: z.array(figure).describe("of each target at the value, in its unit; empty when there is none"),
  })
  .meta({ id: "SolveAnswer" });
