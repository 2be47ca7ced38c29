/** The loss table among an entry's figures, and how far it reaches. Pure. */
import type { Figure } from "@/lib/cables/schema";
import { fitLossTable, type LossFit } from "@/lib/line/loss-table";

/** A row of the table as the entry gives it. */
export interface LossPoint {
  frequencyHz: number;
  lossDbPer100m: number;
  kind: Figure["kind"];
  temperatureC: number;
  source: string;
}

export interface LossTable {
  /** what the cable is said to lose, by frequency */
  points: LossPoint[];
  /** what it loses at most */
  limits: LossPoint[];
}

const usualTemperatureC = 20;

/** A figure of loss at one frequency; a loss of nothing is no row of a table. */
function pointOf({ quantity, valueSi, kind, fromHz, toHz, temperatureC, source }: Figure): LossPoint[] {
  if (quantity !== "lossDbPerM" || fromHz === undefined || (toHz ?? fromHz) !== fromHz || !(valueSi > 0)) return [];
  const conditions = { temperatureC: temperatureC ?? usualTemperatureC, kind, source };
  return [{ frequencyHz: fromHz, lossDbPer100m: valueSi * 100, ...conditions }];
}

/** The loss table of an entry; both lists are empty where it has none. */
export function lossTable(figures: readonly Figure[]): LossTable {
  const all = figures.flatMap(pointOf).sort((a, b) => a.frequencyHz - b.frequencyHz);
  const isLimit = ({ kind }: LossPoint) => kind === "maximum" || kind === "minimum";
  return { points: all.filter((point) => !isLimit(point)), limits: all.filter(({ kind }) => kind === "maximum") };
}

/** Lowest and highest frequency of the table, hertz; null without at least two rows: one row bounds nothing. */
export function tableRange({ points }: LossTable): [number, number] | null {
  const [first, last] = [points[0], points.at(-1)];
  return first && last && first.frequencyHz < last.frequencyHz ? [first.frequencyHz, last.frequencyHz] : null;
}

/**
 * The table as k1·√f + k2·f; undefined where it cannot be fitted: fewer than two frequencies, or rows of several
 * temperatures.
 */
export function tableFit(table: LossTable): LossFit | undefined {
  const temperatures = new Set(table.points.map(({ temperatureC }) => temperatureC));
  if (tableRange(table) === null || temperatures.size > 1) return undefined;
  return fitLossTable(
    table.points.map(({ frequencyHz, lossDbPer100m }) => ({
      frequency: frequencyHz,
      lossDbPerM: lossDbPer100m / 100,
    })),
  );
}
