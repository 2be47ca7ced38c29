/** What several requests of `/compute` say beside the circuit: targets, and what stands on the run. Pure. */
import { z } from "zod";
import { notNegative, temperature } from "@/lib/cables/schema";
import { driveSchema } from "@/lib/compute/step/schema";
import { targetSchema } from "@/lib/runs/schema";

export const figure = z.number().nullable().describe("null where there is no finite number");
export const figures = z.array(figure).describe("one value per frequency, null where there is no finite number");

const finite = (what: string) => z.number({ error: `${what} must be a number.` });

export const supplyFields = {
  supplyV: finite("The supply").optional().describe("the source's e.m.f. at direct current, behind its resistance"),
  loadCurrentA: finite("The load's current")
    .optional()
    .describe("at direct current, drawn at the load end besides the load's own resistance"),
};

export const conditionFields = {
  ...supplyFields,
  availablePowerW: notNegative("The power").optional().describe("for targets on voltage and power"),
  drive: driveSchema
    .optional()
    .describe("for targets on overshoot, settling, tapDip, and on delay without a band or level without a supply"),
  temperatureC: temperature().default(20),
};

export const targetsField = z
  .array(targetSchema, { error: "The targets must be a list." })
  .max(50, { error: "At most 50 targets are possible." });

export const pathSchema = z
  .string({ error: "A path is text." })
  .min(1, { error: "A path is needed." })
  .max(200, { error: "A path has at most 200 characters." });

/** @param what - named in the refusal */
export const limitsSchema = (what: string) =>
  z
    .tuple([finite("The lower limit"), finite("The upper limit")], { error: `${what} are two numbers.` })
    .refine(([low, high]) => low <= high, { error: "The upper limit is below the lower one." });
