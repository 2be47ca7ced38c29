/** What should be known before a figure of a cable is relied on. Sentences, most pressing first. Pure. */
import type { ChosenLine } from "@/lib/calculators/line-inputs";
import { isUsable } from "@/lib/cables/model";
import type { CableState } from "@/lib/cables/schema";
import { frequency as frequencyFigure, impedance, inWords, scaled, significantDigits } from "@/lib/format/quantity";
import { coaxCutoff } from "@/lib/line/coax-cutoff";
import { abs } from "@/lib/line/complex";
import type { SpotFigures } from "@/lib/line/spot-figures";
import { nominalFigures } from "@/lib/line/cable";

export interface Caution {
  weight: "fail" | "warn" | "none";
  text: string;
}

const refusals: Partial<Record<CableState, string>> = {
  draft: "is a draft: nobody has approved its figures",
  inReview: "is in review: nobody has approved its figures yet",
  quarantined: "is quarantined: not for new use",
  superseded: "is superseded",
  withdrawn: "is withdrawn: not for new use",
};

const at = (hertz: number) => inWords(frequencyFigure(hertz));

/** Of the entry alone: its state, its condition, its limits. */
export function entryCautions({ entry }: ChosenLine, frequency: number, temperatureC: number): Caution[] {
  if (!entry) return [];
  const { designation, state, condition, limits } = entry;
  const found: Caution[] = [];
  if (!isUsable(state)) found.push({ weight: "fail", text: `${designation} ${refusals[state] ?? "is not approved"}.` });
  if (state === "restricted" && condition)
    found.push({ weight: "warn", text: `${designation} is restricted. ${condition}` });
  if (limits.maxFrequencyHz !== undefined && frequency > limits.maxFrequencyHz)
    found.push({
      weight: "warn",
      text: `${at(frequency)} is beyond the data: the entry goes up to ${at(limits.maxFrequencyHz)}.`,
    });
  const { minTemperatureC: low = -Infinity, maxTemperatureC: high = Infinity } = limits;
  if (temperatureC < low || temperatureC > high)
    found.push({
      weight: "warn",
      text: `${significantDigits(temperatureC, 3)}\u00a0°C is outside what ${designation} is rated for.`,
    });
  return [...found, ...modeCautions(entry.construction, frequency)];
}

function modeCautions(construction: NonNullable<ChosenLine["entry"]>["construction"], frequency: number): Caution[] {
  if (construction?.kind !== "coax") return [];
  const { innerMm, dielectricMm, relativePermittivity } = construction;
  if (!(dielectricMm > innerMm && relativePermittivity >= 1)) return [];
  const cutoff = coaxCutoff(innerMm / 1e3, dielectricMm / 1e3, relativePermittivity);
  if (frequency <= cutoff) return [];
  return [
    {
      weight: "fail",
      text: `Above about ${at(cutoff)} a cable of this bore carries other modes: no figure here holds.`,
    },
  ];
}

/** A lumped conductor term is up to 6 % low within this factor of its corner. */
const nearCorner = 8;
/** Reactance of Zc over its size from which the nominal impedance says little. */
const leaning = 0.1;

/** Of the model: what its simplifications cost at this frequency. */
export function modelCautions({ model, label }: ChosenLine, spot: SpotFigures): Caution[] {
  const found: Caution[] = [];
  const omega = 2 * Math.PI * spot.frequency;
  const near = model.conductors.find(({ form, r0OhmPerM, skinCornerRadPerS: corner }) => {
    const ratio = omega / (corner ?? NaN);
    return form === "sqrt" && r0OhmPerM > 0 && ratio > 1 / nearCorner && ratio < nearCorner;
  });
  if (near?.skinCornerRadPerS !== undefined)
    found.push({
      weight: "none",
      text: `Around its skin corner, ${at(near.skinCornerRadPerS / (2 * Math.PI))}, the resistance of ${label} may be up to 6\u00a0% more than shown: it is known as one lumped term.`,
    });
  if (model.conductors.some(({ form, r0OhmPerM }) => form === "constant" && r0OhmPerM > 0))
    found.push({
      weight: "warn",
      text: "Without a skin corner the resistance stays at its dc value at every frequency.",
    });
  if (Math.abs(spot.zc.im) > leaning * abs(spot.zc))
    found.push({
      weight: "none",
      text: `At ${at(spot.frequency)} the impedance of ${label} is ${inWords(impedance(spot.zc, 0))}, not the ${inWords(scaled("resistance", nominalFigures(model).z0, 3))} of high frequency.`,
    });
  return found;
}

/** Above this, rms, ends and probes are to be treated as live: the usual limit of extra-low voltage, ac. */
const touchLimitV = 50;

/** Of a voltage on a line, volt rms; and against the rating of the cable where it has one. */
export function voltageCautions(highestRmsV: number, where: string): Caution[] {
  if (!(highestRmsV > touchLimitV)) return [];
  return [
    {
      weight: "warn",
      text: `High voltage: up to ${inWords(scaled("voltage", highestRmsV, 3))} rms ${where}, above the ${touchLimitV}\u00a0V of extra-low voltage. Treat open ends, stubs and probes as live; radio frequency burns.`,
    },
  ];
}
