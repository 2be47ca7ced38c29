/** The one row of a loss table that the others contradict while they agree with each other. Pure. */
import { aboveWords } from "@/lib/cables/checking/check";
import type { Check } from "@/lib/cables/checks";
import { type Facts, tableOf } from "@/lib/cables/checking/facts";
import { fitOf, usualForm, loopOf } from "@/lib/cables/ways/loss-way";
import { frequency, inWords, significantDigits } from "@/lib/format/quantity";
import { nominalFigures, propagation } from "@/lib/line/cable";
import { DB_PER_NEPER } from "@/lib/line/constants";
import { atTemperature } from "@/lib/line/temperature";

export interface OddRow {
  frequencyHz: number;
  givenDbPerM: number;
  /** what the other rows say, dB/m */
  predictedDbPerM: number;
}

/** Fewer rows than these do not tell which one is odd. */
const fewestRows = 4;
/** What rounding and reading off a curve leave of a row, per cent (one sigma), and how many of them make it odd. */
const rowSigma = 1;
const sigmas = 3;

/**
 * How many sigmas a row is from the fit of the others. Error in the fit of all over error in the fit of the rest is 1 − h,
 * h its leverage; the prediction of the rest is less sure by 1/√(1 − h), as at the ends of a table.
 * Source: D. A. Belsley, E. Kuh and R. E. Welsch, Regression Diagnostics, Wiley 1980, section 2.1, deleted residuals.
 */
function suspicion(errorPercent: number, leftOutPercent: number): number {
  const stretch = Math.max(1, leftOutPercent / errorPercent);
  return Number.isFinite(leftOutPercent) ? Math.abs(leftOutPercent) / (rowSigma * Math.sqrt(stretch)) : 0;
}

/** The odd row of an entry; by the model itself, since a table that reaches below the skin corner bends. */
export function oddRow({ rows, fit, model, family, inputs }: Facts): OddRow | undefined {
  if (!fit || rows.length < fewestRows) return undefined;
  const suspicions = fit.table.rows.map(({ errorPercent }, n) =>
    suspicion(errorPercent, fit.leftOut[n]?.errorPercent ?? NaN),
  );
  const worst = suspicions.reduce((most, each, n) => (each > (suspicions[most] ?? 0) ? n : most), 0);
  const [row, size] = [rows[worst], suspicions[worst] ?? 0];
  const others = tableOf(rows.filter((_, n) => n !== worst));
  if (!row || !others || size < sigmas) return undefined;
  const { z0, velocityFactor } = nominalFigures(model);
  const r0 = loopOf(model);
  const rest = fitOf(others, { z0, velocityFactor, r0 }, inputs?.form ?? usualForm(family), null);
  if (!rest || !(rest.refit.rmsPercent < fit.refit.rmsPercent / 2)) return undefined;
  const warm = atTemperature(rest.refit.model, row.temperatureC).model;
  const { gamma } = propagation(warm, { re: 0, im: 2 * Math.PI * row.frequencyHz });
  const predictedDbPerM = gamma.re * DB_PER_NEPER;
  const givenDbPerM = row.lossDbPer100m / 100;
  const stretch = Math.abs((fit.leftOut[worst]?.errorPercent ?? NaN) / size);
  const isOdd = 100 * Math.abs(1 - predictedDbPerM / givenDbPerM) > sigmas * stretch;
  return isOdd ? { frequencyHz: row.frequencyHz, givenDbPerM, predictedDbPerM } : undefined;
}

/** Beyond this share a row is a slip rather than rounding. */
const slip = 0.1;
const loss = (dbPerM: number) => `${significantDigits(100 * dbPerM, 4)} dB/100 m`;

export function rowChecks(facts: Facts): Check[] {
  if (!facts.fit || facts.rows.length < fewestRows) return [];
  const odd = oddRow(facts);
  if (!odd) return [{ check: "lossRow", verdict: "fine", sentence: "Every row goes with the others." }];
  const { frequencyHz, givenDbPerM, predictedDbPerM } = odd;
  const by = givenDbPerM / predictedDbPerM - 1;
  const at = inWords(frequency(frequencyHz));
  const note = facts.inputs?.lossTable?.rows.find((row) => row.frequencyHz === frequencyHz)?.note;
  const kept = note ? `It is kept: ${note}` : "Check the source: correct it, leave it out, or keep it and say why.";
  return [
    {
      ...{ check: "lossRow", verdict: note || Math.abs(by) <= slip ? "look" : "contradiction", percent: 100 * by },
      culprit: `the row at ${at}`,
      sentence: `The row at ${at} gives ${loss(givenDbPerM)}, ${aboveWords(by)} what the other rows say, ${loss(predictedDbPerM)}. ${kept}`,
    },
  ];
}
