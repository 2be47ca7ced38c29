/** Electrical length and the length to cut. Pure. */
import { temperatureRefusal } from "@/lib/calculators/attenuation";
import { readGivenLength, type GivenLength } from "@/lib/calculators/electrical-length";
import { chosenLine, lineInputs, type ChosenLine } from "@/lib/calculators/line-inputs";
import { fault, found, quantity, typed, type Outcome, type Values } from "@/lib/calculators/input";
import type { CableLine } from "@/lib/cables/line";
import {
  frequencyPerLength,
  lengthFigures,
  spotFigures,
  type LengthFigures,
  type SpotFigures,
} from "@/lib/line/spot-figures";

export const lengthInputs = {
  ...lineInputs,
  frequency: quantity("frequency", "Frequency", "100 MHz", { isPositive: true, most: 1e12 }),
  temperature: quantity("temperature", "Temperature", "20", { least: -200, most: 400 }),
  wanted: typed("Length wanted, or cut", "90°", readGivenLength, { width: "wide" }),
  ends: quantity("length", "Less for the ends", "0 mm", { isNotNegative: true, most: 1e3 }),
};

export interface LengthResult {
  line: ChosenLine;
  spot: SpotFigures;
  given: GivenLength;
  /** cable and ends together, metre */
  totalM: number;
  /** what the ends count for, metre of cable */
  endsM: number;
  cutM: number;
  whole: LengthFigures;
  /** hertz per metre of cable more, below 0 */
  frequencyPerM: number;
  /** the same phase but for whole turns, a half and a whole wavelength longer, metre to cut */
  longer: { half: number; whole: number };
  /** metre, electrical, nothing taken off */
  waves: { quarter: number; half: number; whole: number };
}

export function electricalLength(
  values: Values<typeof lengthInputs>,
  entries: ReadonlyMap<string, CableLine>,
): Outcome<LengthResult> {
  const line = chosenLine(values, entries);
  if (!line) return fault("cable", "This cable is on its way.");
  const { frequency, temperature, wanted, ends } = values;
  const refusal = temperatureRefusal(line, temperature);
  if (refusal) return fault("temperature", refusal);
  const spot = spotFigures(line.model, frequency, temperature);
  const totalM = totalLength(spot, wanted, ends);
  const cutM = wanted.kind === "length" ? wanted.metres : totalM - ends;
  if (!(cutM > 0)) return fault("ends", "The ends alone are that long: nothing is left to cut.");
  if (!(totalM < 1e9)) return fault("wanted", "Longer than a million kilometres.");
  return found({
    line,
    spot,
    given: wanted,
    totalM,
    endsM: ends,
    cutM,
    whole: lengthFigures(spot, totalM),
    frequencyPerM: frequencyPerLength(spot, totalM),
    longer: { half: cutM + spot.wavelengthM / 2, whole: cutM + spot.wavelengthM },
    waves: { quarter: spot.wavelengthM / 4, half: spot.wavelengthM / 2, whole: spot.wavelengthM },
  });
}

function totalLength(spot: SpotFigures, wanted: GivenLength, ends: number): number {
  if (wanted.kind === "length") return wanted.metres + ends;
  return wanted.kind === "angle" ? wanted.radians / spot.phaseRadPerM : wanted.seconds / spot.phaseDelaySPerM;
}
