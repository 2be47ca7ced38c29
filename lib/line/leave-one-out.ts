import { addSums, coefficientsOf, type FitSums, type LossRow, noSums, sumsOf } from "@/lib/line/loss-table";

/** Fewer rows than these say nothing about one of them. */
const fewestRows = 3;

/** A row as the others would have it. */
export interface LeftOut {
  k1: number;
  k2: number;
  /** dB/m; NaN where the table has fewer than three rows, or the others have one frequency only */
  predictedDbPerM: number;
  /** 100·(given − predicted)/given */
  errorPercent: number;
}

/**
 * Each row of a loss table against the fit of all the others, so that a mistyped one cannot hide by pulling the fit
 * towards itself. Cost grows with the rows only: sums before and after a row make the sums without it.
 * @param rows - as `fitLossTable` takes them
 * Source: leave-one-out cross-validation, D. M. Allen, Technometrics 16 (1974) 125.
 */
export function leaveOneOut(rows: readonly LossRow[]): LeftOut[] {
  const sums = rows.map(sumsOf);
  const after: FitSums[] = Array.from({ length: rows.length + 1 }, () => noSums);
  for (let n = rows.length - 1; n >= 0; n--) after[n] = addSums(after[n + 1] ?? noSums, sums[n] ?? noSums);
  let before = noSums;
  return rows.map((row, n) => {
    const { k1, k2 } = coefficientsOf(addSums(before, after[n + 1] ?? noSums));
    before = addSums(before, sums[n] ?? noSums);
    const isEnough = rows.length >= fewestRows && othersDiffer(rows, n);
    const predictedDbPerM = isEnough ? k1 * Math.sqrt(row.frequency) + k2 * row.frequency : NaN;
    const errorPercent = (100 * (row.lossDbPerM - predictedDbPerM)) / row.lossDbPerM;
    return { k1, k2, predictedDbPerM, errorPercent };
  });
}

/** Whether the rows other than one have two frequencies at least; two looks, not a walk, for all but odd tables. */
function othersDiffer(rows: readonly LossRow[], left: number): boolean {
  const first = rows[left === 0 ? 1 : 0]?.frequency;
  return rows.some(({ frequency }, n) => n !== left && frequency !== first);
}
