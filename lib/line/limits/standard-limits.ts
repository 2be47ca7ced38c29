/** Every limit of a standard that is kept, and finding one. */
import { delayLimits, dcLimits, segmentLimits } from "@/lib/line/limits/delay-and-dc";
import { cableLossLimits, channelLossLimits } from "@/lib/line/limits/insertion-loss";
import type { StandardLimit } from "@/lib/line/limits/limit-line";
import { returnLossLimits } from "@/lib/line/limits/return-loss";

export const standardLimits: readonly StandardLimit[] = [
  ...cableLossLimits,
  ...channelLossLimits,
  ...returnLossLimits,
  ...delayLimits,
  ...dcLimits,
  ...segmentLimits,
];

/** @throws RangeError where there is none of that id */
export function standardLimit(id: string): StandardLimit {
  const found = standardLimits.find((limit) => limit.id === id);
  if (!found) throw new RangeError(`standardLimit: there is no limit ${id}`);
  return found;
}
