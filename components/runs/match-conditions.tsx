"use client";

import { CablePicker } from "@/components/runs/cable-picker";
import { BandConditions, FrequencyCondition } from "@/components/runs/conditions";
import { MatchPlace } from "@/components/runs/match-place";
import { NumberField } from "@/components/runs/number-field";
import type { Matching } from "@/components/runs/use-matches";

const mostCut = { value: 0.1, message: "At most 100 mm. Write the unit, 5 mm." };
const mostPart = { value: 50, message: "At most 50 %." };

/** What the matches are worked out for. */
export function MatchConditions({ matching }: { matching: Matching }) {
  const { choices, choose, stubLine } = matching;
  const { tolerance } = choices;
  return (
    <div className="mt-4 flex flex-wrap items-start gap-3">
      <MatchPlace place={choices.place} choose={(place) => choose({ place })} />
      <NumberField
        label="Match to"
        kind="resistance"
        unit="Ω"
        value={choices.targetOhm}
        set={(targetOhm) => targetOhm && choose({ targetOhm })}
      />
      <NumberField
        label="Return loss asked"
        kind="loss"
        unit="dB"
        value={choices.returnLossDb}
        set={(returnLossDb) => returnLossDb && choose({ returnLossDb })}
      />
      <CablePicker
        label="Cut stubs from"
        cableId={stubLine?.cableId ?? ""}
        choose={(stubCableId) => choose({ stubCableId })}
        isAlwaysOpen
      />
      <NumberField
        label="Cut to within ±"
        kind="length"
        value={tolerance.lengthM}
        canBeEmpty
        most={mostCut}
        set={(lengthM) => choose({ tolerance: { ...tolerance, lengthM } })}
      />
      <NumberField
        label="Parts within ±"
        kind="number"
        unit="%"
        value={tolerance.valuePercent}
        canBeEmpty
        most={mostPart}
        set={(valuePercent) => choose({ tolerance: { ...tolerance, valuePercent } })}
      />
      <NumberField
        label="Q of coils"
        kind="number"
        value={choices.coilQ}
        canBeEmpty
        set={(coilQ) => choose({ coilQ })}
      />
      <NumberField
        label="Q of capacitors"
        kind="number"
        value={choices.capacitorQ}
        canBeEmpty
        set={(capacitorQ) => choose({ capacitorQ })}
      />
      <FrequencyCondition />
      <BandConditions />
    </div>
  );
}
