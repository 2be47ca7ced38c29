import { digits, frequency, inWords, significantDigits } from "@/lib/format/quantity";
import type { FitWarning } from "@/lib/line/fit-warnings";

const loss = (dbPerM: number) => `${significantDigits(100 * dbPerM, 4)} dB/100 m`;
const hertz = (value: number) => inWords(frequency(value));

/** A warning of a fit in a sentence. */
export function warningSentence(warning: FitWarning): string {
  switch (warning.warning) {
    case "oddRow":
      return (
        `The row at ${hertz(warning.frequency)} does not go with the others: it gives ${loss(warning.givenDbPerM)}, ` +
        `they predict ${loss(warning.predictedDbPerM)} and agree among themselves to ${digits(warning.rmsPercent, 2)} %. Look for a slip.`
      );
    case "poorFit":
      return (
        `The table is no sum of a part in √f and a part in f: a row is ${digits(warning.worstPercent, 1)} % off; ` +
        `the refitted model follows it to ${digits(warning.refitRmsPercent, 1)} % rms.`
      );
    case "belowDcFloor":
      return (
        `The row at ${hertz(warning.frequency)} is below ${loss(warning.floorDbPerM)}, ` +
        "which the dc resistance alone loses."
      );
    case "belowSmooth":
      return `The conductors would lose ${digits(warning.ratio, 2)} times what smooth ones of this size lose; below 1 is impossible.`;
    case "noConductorLoss":
      return "No part in √f was found: the table rises in proportion to frequency, as no conductor does.";
    case "noDielectricLoss":
      return "No part in f was found: the loss tangent is 0, or the table is too coarse to tell it.";
    case "noResistance":
      return "Without dc resistance the model has no conductor loss; only the loss tangent was fitted.";
    case "narrowRange":
      return `The table spans a ratio of ${digits(warning.ratio, 1)} only; conductor and dielectric are told apart poorly.`;
    case "oneFrequency":
      return "All points are at one frequency: the loss was put down to the conductors.";
    case "lossyDielectric":
      return `A loss tangent of ${digits(warning.lossTangent, 4)} is high for a cable; the dielectric's loss then bends by some per cent.`;
    case "atBound":
      return "The refit ended at a bound: the table asks for more than this form can do.";
    case "fasterThanLight":
      return `A velocity factor of ${digits(warning.velocityFactor, 3)} is above that of light.`;
  }
}
