/** How the series of a chart are told apart: colour, dash and a label at the end of the line, always all three. */
import type { Values } from "@/components/plot/curve";

/** 1 the run, the model, candidate A; 2 second plane, candidate B; 3, 4; 5 reference only. */
export type SeriesLook = 1 | 2 | 3 | 4 | 5;

export const seriesColour: Record<SeriesLook, string> = {
  1: "var(--series-1)",
  2: "var(--series-2)",
  3: "var(--series-3)",
  4: "var(--series-4)",
  5: "var(--series-5)",
};

export const seriesDash: Record<SeriesLook, string | undefined> = {
  1: undefined,
  2: "7 3",
  3: "2 2.4",
  4: "9 3 2 3",
  5: "4 3",
};

export interface SweepSeries {
  id: string;
  label: string;
  look: SeriesLook;
  /** one per frequency of the sweep; null where nothing could be computed */
  values: Values;
  /** shaded between: where 5 to 95 % of the draws lie */
  spread?: { low: Values; high: Values };
  /** a measurement: solid and 2 px whatever its look */
  isMeasured?: boolean;
}

/** Moves labels apart to at least `gap`, keeping their order and staying near where they belong. */
export function separate(wishes: readonly number[], gap: number, from: number, to: number): number[] {
  const order = wishes.map((_, i) => i).sort((a, b) => (wishes[a] ?? 0) - (wishes[b] ?? 0));
  const placed = [...wishes];
  let last = -Infinity;
  for (const i of order) {
    placed[i] = Math.max(wishes[i] ?? 0, last + gap, from);
    last = placed[i] ?? last;
  }
  let limit = to;
  for (const i of order.toReversed()) {
    placed[i] = Math.min(placed[i] ?? 0, limit);
    limit = (placed[i] ?? 0) - gap;
  }
  return placed;
}
