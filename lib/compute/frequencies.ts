/** The frequencies of a request: a list of them, or a span. Pure. */
import { z } from "zod";
import { positive } from "@/lib/cables/schema";
import { maxFrequencies } from "@/lib/runs/termination-schema";

const most = maxFrequencies.toLocaleString("en").replaceAll(",", " ");

/** Fields of a request that asks for frequencies; `checkFrequencies` says which go together. */
export const frequencyFields = {
  frequenciesHz: z
    .array(positive("A frequency"), { error: "The frequencies must be a list." })
    .min(1, { error: "At least one frequency is needed." })
    .max(maxFrequencies, { error: `At most ${most} frequencies are possible.` })
    .optional()
    .describe("either these, or startHz, stopHz, points and spacing"),
  startHz: positive("The first frequency").optional(),
  stopHz: positive("The last frequency").optional(),
  points: z
    .int({ error: "The number of points is a whole number." })
    .min(2, { error: "At least two points are needed." })
    .max(maxFrequencies, { error: `At most ${most} points are possible.` })
    .optional(),
  spacing: z.enum(["linear", "log"], { error: "The spacing is linear or log." }).optional(),
};

export interface Frequencies {
  frequenciesHz?: number[];
  startHz?: number;
  stopHz?: number;
  points?: number;
  spacing?: "linear" | "log";
}

const spanKeys = ["startHz", "stopHz", "points", "spacing"] as const;

/** Refuses a request that names its frequencies in no way, by halves or in two ways. */
export function checkFrequencies(asked: Frequencies, context: z.core.$RefinementCtx): void {
  const refuse = (path: string, message: string) => context.addIssue({ code: "custom", path: [path], message });
  const missing = spanKeys.filter((key) => asked[key] === undefined);
  if (asked.frequenciesHz !== undefined) {
    if (missing.length < spanKeys.length) refuse("frequenciesHz", "Give a list of frequencies or a span, not both.");
  } else if (missing.length === spanKeys.length) {
    refuse("frequenciesHz", "Frequencies are needed: a list, or startHz, stopHz, points and spacing.");
  } else {
    for (const key of missing) refuse(key, "A span needs startHz, stopHz, points and spacing.");
  }
  if ((asked.stopHz ?? Infinity) < (asked.startHz ?? 0)) refuse("stopHz", "The last frequency is below the first.");
}

/** The frequencies asked, hertz, in the order given; the ends of a span are exactly those asked. */
export function frequenciesOf({ frequenciesHz, startHz, stopHz, points, spacing }: Frequencies): number[] {
  if (frequenciesHz) return frequenciesHz;
  if (startHz === undefined || stopHz === undefined || points === undefined)
    throw new RangeError("frequenciesOf: neither a list nor a whole span");
  const ratio = stopHz / startHz;
  return Array.from({ length: points }, (_, i) => {
    const part = i / (points - 1);
    if (i === 0) return startHz;
    if (i === points - 1) return stopHz;
    return spacing === "log" ? startHz * ratio ** part : startHz + (stopHz - startHz) * part;
  });
}
