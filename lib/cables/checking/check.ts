/** Verdicts and their words. Pure. */
import type { Verdict } from "@/lib/cables/agreement";
import { digits } from "@/lib/format/quantity";
import { agreementLimits } from "@/lib/line/per-length";

/** Up to which share two things agree, and up to which somebody should look; the house's 3 and 6 per cent unless told. */
export function verdictOf(deviation: number, { fine, look } = agreementLimits): Verdict {
  const size = Math.abs(deviation);
  if (size <= fine) return "fine";
  return size <= look ? "look" : "contradiction";
}

/** "4.3 %", without a sign. */
export const percentWords = (share: number) => `${digits(Math.abs(share) * 100, 1)} %`;

/** After “within”: never less than the last digit shown. */
export const withinWords = (share: number) => percentWords(Math.max(Math.abs(share), 0.001));

/** "4.3 % above" */
export const aboveWords = (share: number) => `${percentWords(share)} ${share < 0 ? "below" : "above"}`;
