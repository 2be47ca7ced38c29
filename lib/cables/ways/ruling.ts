/** Which way rules for what. Pure. */
import type { EntryInputs } from "@/lib/cables/inputs";
import type { Estimate } from "@/lib/cables/ways/estimate";
import type { Way, Ways } from "@/lib/cables/ways/way";

export type Ruling = NonNullable<EntryInputs["ruling"]>;

/** The order in which ways are believed where nobody has said. */
const orders = {
  impedance: ["nominal", "construction", "sweep", "readings"],
  loss: ["lossTable", "sweep", "construction", "nominal"],
  resistance: ["nominal", "readings", "construction", "sweep"],
} as const satisfies { [K in keyof Ruling]: readonly Ruling[K][] };

export const usualRuling: Ruling = { impedance: "nominal", loss: "lossTable", resistance: "nominal" };

/** The ways asked for one thing, the one that rules first. */
export function waysInOrder<K extends keyof Ruling>(what: K, ruling: Ruling | undefined): Way[] {
  const first = ruling?.[what];
  const rest: readonly Way[] = orders[what];
  return first ? [first, ...rest.filter((way) => way !== first)] : [...rest];
}

/** What the first way that has it says, and which one that is. */
export function firstSaid(
  ways: Ways,
  order: readonly Way[],
  quantity: "z0" | "velocityFactor" | "loopResistance",
): { way: Way; estimate: Estimate } | undefined {
  for (const way of order) {
    const estimate = ways[way]?.[quantity];
    if (estimate && Number.isFinite(estimate.value)) return { way, estimate };
  }
  return undefined;
}
