/** What `/compute/dc` is asked and answers. Pure. */
import { z } from "zod";
import { temperature } from "@/lib/cables/schema";
import { figure, supplyFields } from "@/lib/compute/conditions";
import { circuitSchema } from "@/lib/runs/circuit-schema";

export const dcRequestSchema = z
  .strictObject({ circuit: circuitSchema, ...supplyFields, temperatureC: temperature().default(20) })
  .meta({ id: "DcRequest" });
export type DcRequest = z.output<typeof dcRequestSchema>;

export const dcAnswerSchema = z
  .strictObject({
    loopResistanceOhm: figure.describe("of the trunk's cables alone, both conductors"),
    supplyCurrentA: figure.describe("null without a supply"),
    points: z
      .array(
        z.strictObject({
          at: z.enum(["end", "joint", "tap"]),
          element: z.int().nonnegative().optional().describe("index of the joint or tap"),
          ohmMeterReadsOhm: figure.describe(
            "the run unpowered, as wired; a tap is read on the trunk; null: nothing conducts",
          ),
          voltageV: figure.describe("null without a supply"),
          nodeVoltageV: figure.optional().describe("at the far end of a tap that has a length"),
          dissipatedW: figure.describe(
            "source end: in the source; tap: in all that hangs on it; load end: all that arrives there",
          ),
        }),
      )
      .describe("from the source end to the load end"),
    elementDissipatedW: z.array(figure).describe("[element], null without a supply"),
    notes: z.array(z.string()),
  })
  .meta({ id: "DcAnswer" });
