/** What a loss table says of itself, of the dc resistance, of the conductors and of the insulation. Pure. */
import { percentWords, verdictOf, withinWords } from "@/lib/cables/checking/check";
import type { Check } from "@/lib/cables/checks";
import type { Facts } from "@/lib/cables/checking/facts";
import { usualInsulation } from "@/lib/cables/checking/insulation";
import { tableRange } from "@/lib/cables/loss-rows";
import { digits, frequency, inWords, significantDigits } from "@/lib/format/quantity";
import { lossTangentOf } from "@/lib/line/closed-mapping";
import type { FitWarning } from "@/lib/line/fit-warnings";
import { agreementLimits } from "@/lib/line/per-length";
import { nominalFigures } from "@/lib/line/cable";

const hertz = (value: number) => inWords(frequency(value));
const loss = (dbPerM: number) => `${significantDigits(100 * dbPerM, 4)} dB/100 m`;
const FEET_PER_METRE = 1 / 0.3048;

type Warning<W extends FitWarning["warning"]> = Extract<FitWarning, { warning: W }>;

function warned<W extends FitWarning["warning"]>({ fit }: Facts, wanted: W): Warning<W> | undefined {
  return fit?.warnings.find((each): each is Warning<W> => each.warning === wanted);
}

/** Loss never falls with frequency. */
export function risingChecks({ rows }: Facts): Check[] {
  if (rows.length < 2) return [];
  const fallen = rows.findIndex(({ lossDbPer100m, frequencyHz }, i) => {
    const before = rows[i - 1];
    return before !== undefined && frequencyHz > before.frequencyHz && lossDbPer100m < before.lossDbPer100m;
  });
  const row = rows[fallen];
  if (!row) return [{ check: "lossRises", verdict: "fine", sentence: "Loss rises with frequency at every row." }];
  const at = hertz(row.frequencyHz);
  const sentence = `At ${at} less is lost than at the row before: loss only rises with frequency.`;
  return [{ check: "lossRises", verdict: "contradiction", culprit: `the row at ${at}`, sentence }];
}

/** Conductors cannot lose less than their dc resistance does. */
export function floorChecks(facts: Facts): Check[] {
  const { fit, loop, rows } = facts;
  if (!fit || !(fit.dcFloorDbPerM > 0)) return [];
  const below = warned(facts, "belowDcFloor");
  const lowest = rows[0];
  if (!below)
    return lowest
      ? [
          {
            check: "dcFloor",
            verdict: "fine",
            sentence: `No row is below ${loss(fit.dcFloorDbPerM)}, which the dc resistance alone loses.`,
          },
        ]
      : [];
  const at = hertz(below.frequency);
  const sentence = `At ${at} less is lost than the dc resistance alone loses, ${loss(below.floorDbPerM)}: the row or the resistance is wrong.`;
  const culprit = loop === undefined ? `the row at ${at}` : `the row at ${at}, or the loop resistance`;
  return [{ check: "dcFloor", verdict: "contradiction", culprit, sentence }];
}

/** Solid conductors with foil stand at 1.0 to 1.1 of smooth copper, stranded ones with braid at up to 1.8. */
const roughest = 2;
/** Sizes are known to a per cent or two and k1 is read off rows near the skin corner too: so much below 1 is explained. */
const smoothLimits = { fine: 0.95, look: 0.9 };
/** Silver conducts better than copper: √(15.9/17.24). */
const silver = 0.96;

/** k1 over that of smooth conductors for which the table is in dB/100 ft but was read per 100 m, or the other way. */
function unitSlip(ratio: number): "feetAsMetres" | "metresAsFeet" | undefined {
  if (ratio < 0.75 && ratio * FEET_PER_METRE >= 0.97 && ratio * FEET_PER_METRE <= roughest) return "feetAsMetres";
  if (ratio > 3 && ratio / FEET_PER_METRE >= 0.97 && ratio / FEET_PER_METRE <= roughest) return "metresAsFeet";
  return undefined;
}

export function smoothChecks({ fit, build }: Facts): Check[] {
  const metal = /silver/i.test(build?.conductor ?? "") ? silver : 1;
  const ratio = fit?.k1OverSmooth === undefined ? undefined : fit.k1OverSmooth / metal;
  if (ratio === undefined || !(ratio > 0)) return [];
  const base = { check: "smoothCopper", percent: 100 * (ratio - 1) };
  const times = `${digits(ratio, 2)} times what smooth ${metal === 1 ? "copper" : "silver"} of this size loses`;
  const slip = unitSlip(ratio);
  if (slip) {
    const sentence =
      slip === "feetAsMetres"
        ? `The conductors would lose ${times}, which is impossible; times 3.28 it fits. The table is likely in dB/100 ft and was read as dB/100 m.`
        : `The conductors would lose ${times}; divided by 3.28 it fits. The table is likely in dB/100 m and was read as dB/100 ft.`;
    return [{ ...base, check: "lossUnit", verdict: "contradiction", culprit: "the unit of the loss table", sentence }];
  }
  if (ratio < smoothLimits.fine) {
    const verdict = ratio < smoothLimits.look ? "contradiction" : "look";
    const sentence = `The conductors would lose ${times}; less than a smooth conductor is impossible.`;
    return [{ ...base, verdict, culprit: "the loss table", sentence }];
  }
  if (ratio > roughest)
    return [
      {
        ...base,
        verdict: "look",
        culprit: "the loss table",
        sentence: `The conductors lose ${times}; stranded and braided ones rarely lose 1.8.`,
      },
    ];
  return [{ ...base, verdict: "fine", sentence: `The conductors lose ${times}.` }];
}

/** The part of the loss in f against what the insulation usually has. */
export function dielectricChecks({ fit, model, build, rows }: Facts): Check[] {
  const usual = usualInsulation(build);
  if (!fit || !usual || tableRange({ points: rows, limits: [] }) === null || !(fit.table.k1 > 0)) return [];
  // The refit knows the bend of the conductors' loss; the straight fit does not, so the smaller of the two is held against it.
  const straight = lossTangentOf(nominalFigures(model).velocityFactor, fit.table.k2);
  const tangent = Math.min(fit.refit.model.lossTangent ?? 0, straight);
  const shown = significantDigits(tangent, 2);
  const [likely, most] = usual.lossTangent;
  const base = { check: "lossTangent", culprit: "the rows of highest frequency" };
  if (tangent <= likely)
    return [{ check: "lossTangent", verdict: "fine", sentence: `A loss tangent of ${shown} goes with ${usual.name}.` }];
  if (tangent <= most)
    return [{ ...base, verdict: "look", sentence: `A loss tangent of ${shown} is high for ${usual.name}.` }];
  const sentence = `A loss tangent of ${shown} does not go with ${usual.name}: that is PVC, moisture, or a slip in the table.`;
  return [{ ...base, verdict: "contradiction", sentence }];
}

/** The whole table against the model that runs are worked out with. */
export function tableChecks(rms: number | undefined): Check[] {
  if (rms === undefined) return [];
  const verdict = verdictOf(rms);
  const sentence =
    verdict === "fine"
      ? `The model is within ${withinWords(rms)} rms of the loss table.`
      : `The model is ${percentWords(rms)} rms from the loss table, more than the ${percentWords(agreementLimits.fine)} that rounding explains.`;
  return [{ check: "lossTable", verdict, percent: 100 * rms, sentence }];
}
