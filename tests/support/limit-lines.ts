/** A limit line of a team's own, for tests; made up. */
import type { NewLimitLine } from "@/lib/limit-lines/schema";

export function newLimitLine(name: string, change: Partial<NewLimitLine> = {}): NewLimitLine {
  return {
    ...{ name, quantity: "insertionLoss", of: "cable", perLengthM: 100 },
    curve: {
      ...{ form: "formula", referenceHz: 1e6 },
      pieces: [{ fromHz: 1e6, toHz: 100e6, k1: 1.9, k2: 0.02, k3: 0.1 }],
    },
    source: { title: "House specification 12", edition: "3, 2025", clause: "4.2" },
    note: "",
    ...change,
  };
}
