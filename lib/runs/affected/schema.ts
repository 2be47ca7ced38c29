/** Which cables of a run have moved on, and what that changes, on the wire. Pure. */
import { z } from "zod";
import { runEffectSchema } from "@/lib/runs/effects/schema";

export const affectedSchema = z
  .strictObject({
    isAffected: z.boolean().describe("issued, and a cable of it has a later approved revision"),
    cables: z.array(
      z.strictObject({
        cableId: z.string(),
        designation: z.string(),
        uses: z.int().describe("the revision that the run uses"),
        current: z.int().describe("the one approved since"),
        reason: z.string().describe("why there is that revision"),
      }),
    ),
    effect: runEffectSchema.nullable().describe("the run as it stands and with every cable at its current revision"),
  })
  .meta({ id: "AffectedRun" });
export type AffectedRun = z.infer<typeof affectedSchema>;
