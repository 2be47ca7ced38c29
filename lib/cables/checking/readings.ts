/** What a meter read of a sample against what it should read on the model, at its own frequency. Pure. */
import { aboveWords, verdictOf, withinWords } from "@/lib/cables/checking/check";
import type { Check } from "@/lib/cables/checks";
import type { Facts } from "@/lib/cables/checking/facts";
import { modelAt } from "@/lib/cables/warm-model";
import { unlessRefused } from "@/lib/cables/ways/unless-refused";
import { usualMeterHz } from "@/lib/cables/ways/readings-way";
import { frequency, inWords, scaled } from "@/lib/format/quantity";
import { nominalFigures } from "@/lib/line/cable";
import { sampleReading } from "@/lib/line/sample-meter";

interface Compared {
  check: string;
  what: string;
  read: number | undefined;
  should: number;
  shown: (value: number) => string;
}

/** Of a meter and its fittings: 3 and 6 per cent, of resistance 6 and 15 since the sample's temperature is rarely known. */
const resistanceLimits = { fine: 0.06, look: 0.15 };

function explained({ model }: Facts, { check, should }: Compared, lengthM: number): string {
  if (check !== "meterInductance") return "";
  const beyond = should / (model.lInfHPerM * lengthM) - 1;
  if (Math.abs(beyond) < 0.01) return "";
  return ` That is ${aboveWords(beyond)} the high-frequency figure, since current still fills the copper there.`;
}

export function readingChecks(facts: Facts): Check[] {
  const readings = facts.inputs?.readings;
  if (!readings) return [];
  const { lengthM, meterHz = usualMeterHz, temperatureC = 20, oneWayDelayS, roundTripS } = readings;
  const warm = modelAt(facts.model, temperatureC);
  const meter = warm && unlessRefused(() => sampleReading(warm.model, lengthM, meterHz));
  if (!meter) return [];
  const delay = oneWayDelayS ?? (roundTripS === undefined ? undefined : roundTripS / 2);
  const all: Compared[] = [
    {
      ...{ check: "meterCapacitance", what: "capacitance", read: readings.openCapacitanceF },
      ...{ should: meter.openCapacitance, shown: (value) => inWords(scaled("capacitance", value)) },
    },
    {
      ...{ check: "meterInductance", what: "inductance", read: readings.shortInductanceH },
      ...{ should: meter.shortInductance, shown: (value) => inWords(scaled("inductance", value)) },
    },
    {
      ...{ check: "meterResistance", what: "resistance", read: readings.shortResistanceOhm },
      ...{ should: meter.shortResistance, shown: (value) => inWords(scaled("resistance", value)) },
    },
    {
      ...{ check: "delay", what: "delay", read: delay },
      ...{ should: nominalFigures(facts.model).delay * lengthM, shown: (value) => inWords(scaled("time", value)) },
    },
  ];
  return all.flatMap((each): Check[] => {
    const { check, what, read, should, shown } = each;
    if (read === undefined || !(should > 0)) return [];
    const by = read / should - 1;
    const verdict = verdictOf(by, check === "meterResistance" ? resistanceLimits : undefined);
    const at = check === "delay" ? "" : ` at ${inWords(frequency(meterHz))}`;
    const expected = `The model’s sample should read ${shown(should)}${at}`;
    const sentence =
      verdict === "fine"
        ? `The meter’s ${what} is within ${withinWords(by)} of what the model’s sample reads${at}.${explained(facts, each, lengthM)}`
        : `${expected}; the meter’s ${what} is ${aboveWords(by)} that.${explained(facts, each, lengthM)}`;
    return [
      { check, verdict, percent: 100 * by, sentence, ...(verdict !== "fine" && { culprit: `the meter’s ${what}` }) },
    ];
  });
}
