"use client";

import { NumberField } from "@/components/runs/number-field";
import type { Drawing } from "@/components/runs/use-draws";
import { Checkbox } from "@/components/ui/checkbox";

const mostPercent = { value: 50, message: "At most 50 %." };
const mostLength = { value: 10, message: "At most 10 m." };
const mostDraws = { value: 20_000, message: "At most 20 000 draws." };
const mostSeed = { value: 2 ** 32 - 1, message: "At most 4 294 967 295." };

const percents = [
  { key: "z0Percent", label: "Impedance ±" },
  { key: "velocityFactorPercent", label: "Velocity factor ±" },
  { key: "lossPercent", label: "Loss ±" },
  { key: "partPercent", label: "Parts ±" },
] as const;

/** How far each kind of figure may be off. */
export function ToleranceConditions({ drawing: { choices, choose } }: { drawing: Drawing }) {
  return (
    <div className="mt-4 flex flex-wrap items-start gap-3">
      <NumberField
        label="Lengths ±"
        kind="length"
        value={choices.lengthM}
        canBeEmpty
        most={mostLength}
        set={(lengthM) => choose({ lengthM })}
      />
      {percents.map(({ key, label }) => (
        <NumberField
          key={key}
          label={label}
          kind="number"
          unit="%"
          value={choices[key]}
          canBeEmpty
          most={mostPercent}
          set={(percent) => choose({ [key]: percent })}
        />
      ))}
      <NumberField
        label="Draws"
        kind="number"
        value={choices.draws}
        most={mostDraws}
        set={(draws) => draws !== undefined && choose({ draws: Math.max(1, Math.round(draws)) })}
      />
      <NumberField
        label="Seed"
        kind="number"
        value={choices.seed}
        most={mostSeed}
        set={(seed) => seed !== undefined && choose({ seed: Math.round(seed) })}
      />
      <span className="self-center pt-4">
        <Checkbox checked={choices.anyPhase} onChange={(event) => choose({ anyPhase: event.target.checked })}>
          The load with any phase
        </Checkbox>
      </span>
    </div>
  );
}
