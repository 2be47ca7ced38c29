/** What `/compute/step` is asked and answers. Pure. */
import { z } from "zod";
import { positive, temperature } from "@/lib/cables/schema";
import { circuitSchema } from "@/lib/runs/circuit-schema";
import { mostEdges } from "@/lib/line/time/laplace-grid";

const mostBits = 1024;
const mostVolts = 1e9;
const leastRiseS = 1e-15;
/** A window shorter than this part of the edge shows nothing. */
const leastEdges = 1e-3;

const edged = {
  amplitudeV: z
    .number({ error: "The amplitude must be a number." })
    .min(-mostVolts, { error: "The amplitude is at most 1 GV either way." })
    .max(mostVolts, { error: "The amplitude is at most 1 GV either way." }),
  riseS: z
    .number({ error: "The edge time must be a number." })
    .min(leastRiseS, { error: "An edge takes at least 1 fs." })
    .max(1e6, { error: "An edge takes at most 1 000 000 s." })
    .describe("the full time from 0 to 100 %"),
  edge: z
    .enum(["sineSquared", "raisedCosine"], { error: "An edge is sineSquared or raisedCosine." })
    .optional()
    .describe("sineSquared unless said"),
};

export const driveSchema = z
  .discriminatedUnion(
    "kind",
    [
      z.strictObject({ kind: z.literal("step"), ...edged }),
      z.strictObject({
        kind: z.literal("pulse"),
        ...edged,
        widthS: positive("The width").describe("from the start of the rise to the start of the fall"),
      }),
      z.strictObject({
        kind: z.literal("bits"),
        ...edged,
        bits: z
          .string({ error: "The bits must be text of 0 and 1." })
          .regex(/^[01]+$/, { error: "The bits must be text of 0 and 1, with at least one of them." })
          .max(mostBits, { error: `At most ${mostBits} bits are possible.` }),
        bitS: positive("The time of a bit"),
      }),
    ],
    { error: "A drive is a step, a pulse or bits." },
  )
  .meta({ id: "Drive" });

export const stepRequestSchema = z
  .strictObject({
    circuit: circuitSchema,
    drive: driveSchema,
    windowS: positive("The window").describe(`what is shown, from the start of the edge; at most ${mostEdges}·riseS`),
    points: z
      .int({ error: "The number of points is a whole number." })
      .min(2, { error: "At least two points are needed." })
      .max(65_536, { error: "At most 65 536 points are possible." }),
    temperatureC: temperature().default(20),
    delayFraction: z
      .number({ error: "The fraction must be a number." })
      .gt(0, { error: "The fraction must be above 0." })
      .lt(1, { error: "The fraction must be below 1." })
      .default(0.5)
      .describe("of the e.m.f. and of the settled level, between which delay runs"),
    thresholdV: z
      .number({ error: "The threshold must be a number." })
      .optional()
      .describe("voltage at the node that delay runs to instead of the fraction of the settled level"),
    settlingBand: positive("The band").default(0.05).describe("half width of the band, per settled level"),
    tapDips: z
      .boolean({ error: "Say true or false." })
      .default(false)
      .describe("whether the run is also held against the same run without taps"),
  })
  .superRefine(({ drive, windowS }, context) => {
    if (drive.riseS < leastRiseS) return;
    if (windowS < leastEdges * drive.riseS)
      context.addIssue({
        code: "custom",
        path: ["windowS"],
        message: `With an edge of ${drive.riseS} s less than ${leastEdges * drive.riseS} s shows nothing.`,
      });
    if (!(windowS > mostEdges * drive.riseS * (1 + 1e-12))) return;
    context.addIssue({
      code: "custom",
      path: ["windowS"],
      message: `With an edge of ${drive.riseS} s at most ${mostEdges * drive.riseS} s can be shown; the shortest edge that fits this window is ${windowS / mostEdges} s.`,
    });
  })
  .meta({ id: "StepRequest" });
export type StepRequest = z.output<typeof stepRequestSchema>;

const figure = z.number().nullable().describe("null where there is no finite number within the window");

const volts = z.array(figure).describe("volt, one value for each time");

const readingsSchema = z.strictObject({
  delayS: figure.describe(
    "from a fraction of the e.m.f. to the same fraction of the settled level, or to the threshold",
  ),
  reachedS: figure.describe("from the start of the edge to the same moment"),
  riseS: figure.describe("10 to 90 % of the settled level"),
  overshoot: figure.describe("peak over settled level, less 1"),
  settlingS: figure.describe("last time outside the band about the settled level"),
  settledV: figure.describe("the limit of s·V(s)"),
});

export const stepAnswerSchema = z
  .strictObject({
    timeS: z.array(z.number()),
    sourceNodeV: volts,
    loadNodeV: volts,
    tapNodesV: z.array(volts).describe("the line's voltage at each shunt stub, from source to load"),
    fronts: z
      .array(
        z.strictObject({
          timeS: z.number(),
          node: z.string().describe("source, load or taps.n"),
          amplitudeV: z.number().describe("jump of the node's voltage, lossless and at the highest frequencies"),
          path: z.array(z.string()).describe("places passed, the node's own last; of more than 64 the last ones"),
          passed: z.int().describe("how many places came before the node's own"),
        }),
      )
      .describe("the largest 2 000, in order of time"),
    omitted: z.int().describe("fronts left out, at least: a wave too weak to be followed counts as one"),
    readings: readingsSchema.describe("at the load"),
    tapReadings: z.array(readingsSchema).describe("at each tap"),
    tapDips: z
      .array(
        z.strictObject({
          element: z.int().describe("index of the tap"),
          dip: figure.describe(
            "largest shortfall against the run without taps, per unit of the step that comes by first",
          ),
          atS: figure,
        }),
      )
      .optional(),
  })
  .meta({ id: "StepAnswer" });
export type StepAnswer = z.infer<typeof stepAnswerSchema>;
