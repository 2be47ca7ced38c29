import type { KnownLine } from "@/lib/line/closed-mapping";
import type { LeftOut } from "@/lib/line/leave-one-out";
import type { LossFit, LossRow } from "@/lib/line/loss-table";
import { agreementLimits } from "@/lib/line/per-length";
import { lossOf, type Refit } from "@/lib/line/refit";

/** What somebody should look at before believing a fit; rows are counted from 0. */
export type FitWarning =
  | {
      warning: "oddRow";
      row: number;
      frequency: number;
      givenDbPerM: number;
      predictedDbPerM: number;
      rmsPercent: number;
    }
  | { warning: "poorFit"; worstPercent: number; refitRmsPercent: number }
  | { warning: "belowDcFloor"; row: number; frequency: number; floorDbPerM: number }
  | { warning: "belowSmooth"; ratio: number }
  | { warning: "noConductorLoss" }
  | { warning: "noDielectricLoss" }
  | { warning: "noResistance" }
  | { warning: "narrowRange"; ratio: number }
  | { warning: "oneFrequency" }
  | { warning: "lossyDielectric"; lossTangent: number }
  | { warning: "atBound" }
  | { warning: "fasterThanLight"; velocityFactor: number };

interface Fitted {
  known: KnownLine;
  rows: readonly LossRow[];
  table: LossFit;
  leftOut: readonly LeftOut[];
  refit: Refit;
  /** the least each row can be, dB/m */
  floorsDbPerM: readonly number[];
  k1OverSmooth: number | undefined;
  /** the model refitted to other rows */
  refitTo: (rows: readonly LossRow[]) => Refit;
  temperatureC: number;
}

/** Highest over lowest frequency below which the two parts of a loss are told apart poorly. */
const narrow = 4;
/** Loss tangent from which the model's own dielectric is off a straight line by some per cent. */
const lossy = 0.01;
/** Rounding of k1 against smooth conductors, and of a row against its floor. */
const smoothSlack = 0.99;
const floorSlack = 0.99;

export function fitWarnings(fitted: Fitted): FitWarning[] {
  const { known, rows, table, refit, floorsDbPerM, k1OverSmooth } = fitted;
  const [low, high] = table.range;
  const odd = oddRow(fitted);
  const below = rows.findIndex(({ lossDbPerM }, n) => lossDbPerM < floorSlack * (floorsDbPerM[n] ?? 0));
  const lossTangent = refit.model.lossTangent ?? 0;
  const warnings: (FitWarning | false)[] = [
    odd ?? false,
    !odd &&
      table.worstPercent > 100 * agreementLimits.look && {
        warning: "poorFit",
        worstPercent: table.worstPercent,
        refitRmsPercent: refit.rmsPercent,
      },
    below >= 0 && {
      warning: "belowDcFloor",
      row: below,
      frequency: rows[below]?.frequency ?? NaN,
      floorDbPerM: floorsDbPerM[below] ?? NaN,
    },
    k1OverSmooth !== undefined && k1OverSmooth < smoothSlack && { warning: "belowSmooth", ratio: k1OverSmooth },
    table.k1 === 0 && { warning: "noConductorLoss" },
    table.k2 === 0 && low < high && { warning: "noDielectricLoss" },
    known.r0 === 0 && { warning: "noResistance" },
    low === high && { warning: "oneFrequency" },
    low < high && high < narrow * low && { warning: "narrowRange", ratio: high / low },
    lossTangent > lossy && { warning: "lossyDielectric", lossTangent },
    refit.isAtBound && { warning: "atBound" },
    known.velocityFactor > 1 && { warning: "fasterThanLight", velocityFactor: known.velocityFactor },
  ];
  return warnings.filter((each) => each !== false);
}

/**
 * The one row that the others contradict while they agree with each other, by the model itself: a table that reaches
 * below the skin corner bends, and its last row is not odd for that. undefined where there is none.
 */
function oddRow({ rows, leftOut, refitTo, temperatureC }: Fitted): FitWarning | undefined {
  const errors = leftOut.map(({ errorPercent }) => Math.abs(errorPercent));
  const row = errors.reduce((most, error, n) => (error > (errors[most] ?? 0) ? n : most), 0);
  const suspect = rows[row];
  if (rows.length < 4 || !suspect || !((errors[row] ?? 0) > 100 * agreementLimits.look)) return undefined;
  const others = rows.filter((_, n) => n !== row);
  const refit = refitTo(others);
  const worst = Math.max(
    ...others.map(({ lossDbPerM }, n) => Math.abs(1 - (refit.fittedDbPerM[n] ?? NaN) / lossDbPerM)),
  );
  const [predicted = NaN] = lossOf(refit.model, [suspect.frequency], temperatureC);
  const isInside =
    others.some(({ frequency }) => frequency < suspect.frequency) &&
    others.some(({ frequency }) => frequency > suspect.frequency);
  const allowed = (isInside ? 1 : 2) * agreementLimits.look;
  if (worst > agreementLimits.fine || !(Math.abs(1 - predicted / suspect.lossDbPerM) > allowed)) return undefined;
  const { frequency, lossDbPerM: givenDbPerM } = suspect;
  const predictedDbPerM = leftOut[row]?.predictedDbPerM ?? NaN;
  return { warning: "oddRow", row, frequency, givenDbPerM, predictedDbPerM, rmsPercent: refit.rmsPercent };
}
