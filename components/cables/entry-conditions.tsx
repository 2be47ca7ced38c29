"use client";

import { frequencyText } from "@/components/cables/catalogue-facets";
import type { ChangeLook } from "@/components/cables/use-entry-address";
import { QuantityField } from "@/components/ui/quantity-field";
import { StateNote } from "@/components/ui/state-mark";
import type { EntryAsked } from "@/lib/cables/entry-address";
import type { Cable, Limits } from "@/lib/cables/schema";
import { modelAt } from "@/lib/cables/warm-model";
import { digits } from "@/lib/format/quantity";
import { COPPER_TEMPERATURE_COEFFICIENT } from "@/lib/line/constants";
import type { ModelAtTemperature } from "@/lib/line/temperature";

interface Props {
  cable: Cable;
  warm: ModelAtTemperature;
  asked: EntryAsked;
  change: ChangeLook;
}

const celsius = (value: number) => `${digits(value, Number.isInteger(value) ? 0 : 1).replace("\u2212", "-")} °C`;

/** Which rule gave the figures at this temperature, with what it made of them. */
function slopeWords(
  { model }: Cable,
  { slope, temperatureC, resistivityRatio, lossRatio }: ModelAtTemperature,
): string {
  if (temperatureC === 20) return "20 °C is what every model is stated at.";
  const perK = (100 * (model.temperatureCoefficientPerK ?? COPPER_TEMPERATURE_COEFFICIENT)).toPrecision(3);
  const dc = `dc resistance ×${digits(resistivityRatio, 3)} by the resistivity, ${perK} %/K`;
  if (slope === "resistivity")
    return `Slope used: that of the resistivity. ${dc[0]?.toUpperCase()}${dc.slice(1)}; the conductors’ part of the loss by its root, ×${digits(Math.sqrt(resistivityRatio), 3)}.`;
  const slopes = (model.lossSlopes ?? [])
    .map(
      ({ fromC, toC, perK: share }) =>
        `${Number((share * 100).toPrecision(3))} %/K from ${digits(fromC, 0)} to ${digits(toC, 0)} °C`,
    )
    .join(", ");
  return `Slope used: the one this entry declares for its loss, ${slopes}: ×${digits(lossRatio, 3)}; ${dc}.`;
}

function isOutside(value: number, { minTemperatureC = -Infinity, maxTemperatureC = Infinity }: Limits): boolean {
  return value < minTemperatureC || value > maxTemperatureC;
}

function ratedWords({ minTemperatureC, maxTemperatureC }: Limits): string {
  const ends = [minTemperatureC, maxTemperatureC].map((end) => (end === undefined ? "…" : digits(end, 0)));
  return `${ends[0]} to ${ends[1]} °C`;
}

/** What the figures are given at: frequency and temperature, and what temperature did to them. */
export function EntryConditions({ cable, warm, asked, change }: Props) {
  return (
    <div>
      <div className="flex flex-wrap items-start gap-3">
        <QuantityField
          label="Loss at"
          kind="frequency"
          value={asked.lossAtHz}
          text={frequencyText}
          onValue={(lossAtHz) => lossAtHz !== undefined && change({ lossAtHz })}
          refuse={(hertz) => (hertz > 0 ? (hertz < 1e12 ? undefined : "Below 1000 GHz.") : "More than 0.")}
          className="w-30 phone:w-40"
        />
        <QuantityField
          label="Temperature"
          kind="temperature"
          value={asked.temperatureC}
          text={celsius}
          onValue={(temperatureC) => temperatureC !== undefined && change({ temperatureC })}
          refuse={(value) => {
            if (value < -200 || value > 400) return "From −200 to 400 °C.";
            return modelAt(cable.model, value) ? undefined : "The model does not reach that far.";
          }}
          className="w-26 phone:w-36"
        />
        <p className="min-w-52 flex-1 self-end pb-1 text-label text-ink-2">{slopeWords(cable, warm)}</p>
      </div>
      {isOutside(warm.temperatureC, cable.limits) && (
        <StateNote state="warn" className="mt-1.5">
          Beyond the data: the cable is rated for {ratedWords(cable.limits)}.
        </StateNote>
      )}
    </div>
  );
}
