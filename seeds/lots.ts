/** The demo's measured lot: kept beside the entry, whose nominal values stay. */
import { database } from "@/db/client";
import { cableLots } from "@/db/schema/cable-records";
import { figuresOfLot } from "@/lib/cables/lots/figures";
import { newLotSchema } from "@/lib/cables/lots/schema";

const lot = newLotSchema.parse({
  ...{ lot: "Q-114", reel: "", lengthM: 20, measuredAt: "2026-02-10", temperatureC: 20 },
  ...{ velocityFactor: 0.843, loopResistanceOhmPerM: 0.0089 },
  method: "Delay and loop resistance of 20 m, k = 2: ±0.4 %, ±0.5 %",
  note: "Velocity 0.8 % below nominal. Nominal values unchanged.",
});

/** Adds the lot if it is missing. */
export function seedLots(): void {
  const { lot: name, reel, lengthM, note, measuredAt } = lot;
  database()
    .insert(cableLots)
    .values({
      ...{ id: "c50-f10-q-114", cableId: "c50-f10", lot: name, reel, lengthM, note, measuredAt },
      ...{ figures: figuresOfLot(lot), addedById: "libby-thornquist", addedAt: "2026-02-10T10:00:00.000Z" },
    })
    .onConflictDoNothing()
    .run();
}
