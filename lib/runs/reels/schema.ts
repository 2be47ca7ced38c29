/** The reels a run is to be cut from. Pure. */
import { z } from "zod";
import { lotSchema } from "@/lib/cables/lots/schema";

export const newReelSchema = z
  .strictObject({ lotId: z.string().min(1).max(60).describe("of a cable the run uses") })
  .meta({ id: "NewReel" });

const reelSchema = z
  .strictObject({
    cableId: z.string(),
    designation: z.string(),
    lot: lotSchema.describe("its model is what the run may be computed with in the place of the nominal one"),
  })
  .meta({ id: "Reel" });
export type Reel = z.infer<typeof reelSchema>;

export const reelListSchema = z.strictObject({ items: z.array(reelSchema) });
export type ReelList = z.infer<typeof reelListSchema>;
