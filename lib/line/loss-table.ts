/** One row of a loss table. */
export interface LossRow {
  /** hertz, above 0 */
  frequency: number;
  /** attenuation, dB/m, above 0 */
  lossDbPerM: number;
  /** how much the row counts, above 0; default 1 */
  weight?: number;
}

export interface FittedRow extends LossRow {
  fittedDbPerM: number;
  /** 100·(given − fitted)/given */
  errorPercent: number;
}

/** Attenuation as k1·√f + k2·f. */
export interface LossFit {
  /** part of the conductors, dB/m per √Hz, at least 0 */
  k1: number;
  /** part of the dielectric, dB/m per Hz, at least 0 */
  k2: number;
  /** in the order given */
  rows: FittedRow[];
  rmsPercent: number;
  /** the largest error of a row, without its sign */
  worstPercent: number;
  /** lowest and highest frequency of the table, hertz: the fit says nothing beyond */
  range: [number, number];
}

/** Sums of the normal equations of a table, x and y being √f and f over the given loss: w·xx, w·xy, w·yy, w·x, w·y. */
export type FitSums = readonly [number, number, number, number, number];

/** What one row adds to the sums. */
export function sumsOf({ frequency, lossDbPerM, weight = 1 }: LossRow): FitSums {
  const x = Math.sqrt(frequency) / lossDbPerM;
  const y = frequency / lossDbPerM;
  return [weight * x * x, weight * x * y, weight * y * y, weight * x, weight * y];
}

export function addSums(first: FitSums, second: FitSums): FitSums {
  return first.map((value, i) => value + (second[i] ?? NaN)) as unknown as FitSums;
}

export const noSums: FitSums = [0, 0, 0, 0, 0];

/** k1 and k2 of the least Σ w·(k1·x + k2·y − 1)², both at least 0. */
export function coefficientsOf([a, b, c, d, e]: FitSums): { k1: number; k2: number } {
  const determinant = a * c - b * b;
  // With one frequency only the two parts cannot be told apart: it is all put down to the conductors.
  if (!(determinant > 1e-12 * a * c)) return { k1: d / a, k2: 0 };
  const [k1, k2] = [(c * d - b * e) / determinant, (a * e - b * d) / determinant];
  if (k2 < 0) return { k1: d / a, k2: 0 };
  return k1 < 0 ? { k1: 0, k2: e / c } : { k1, k2 };
}

/**
 * Fits α = k1·√f + k2·f to a loss table by least squares on the relative error, both at least 0: where one would come out
 * negative it is 0 and the other is fitted alone.
 * @param rows - the table, one temperature throughout
 * @returns undefined for a table of no rows
 * @throws RangeError when a frequency, a loss or a weight is not positive
 * Source: copper loss in √f and dielectric loss in f, D. M. Pozar, Microwave Engineering, 4th ed., section 2.7; normal
 * equations of weighted least squares.
 */
export function fitLossTable(rows: readonly LossRow[]): LossFit | undefined {
  if (rows.length === 0) return undefined;
  for (const { frequency, lossDbPerM, weight = 1 } of rows)
    for (const [name, value] of Object.entries({ frequency, lossDbPerM, weight }))
      if (!(value > 0 && value < Infinity))
        throw new RangeError(`fitLossTable: ${name} must be positive, got ${value}`);
  const { k1, k2 } = coefficientsOf(rows.map(sumsOf).reduce(addSums, noSums));
  const fitted = rows.map((row): FittedRow => {
    const fittedDbPerM = k1 * Math.sqrt(row.frequency) + k2 * row.frequency;
    return { ...row, fittedDbPerM, errorPercent: (100 * (row.lossDbPerM - fittedDbPerM)) / row.lossDbPerM };
  });
  const squares = fitted.reduce((sum, { errorPercent }) => sum + errorPercent * errorPercent, 0);
  const frequencies = rows.map(({ frequency }) => frequency);
  return {
    k1,
    k2,
    rows: fitted,
    rmsPercent: Math.sqrt(squares / fitted.length),
    worstPercent: Math.max(...fitted.map(({ errorPercent }) => Math.abs(errorPercent))),
    range: [Math.min(...frequencies), Math.max(...frequencies)],
  };
}
