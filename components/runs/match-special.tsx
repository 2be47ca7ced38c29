"use client";

import { NumberField } from "@/components/runs/number-field";
import type { Matching } from "@/components/runs/use-matches";

const mostSections = { value: 10, message: "At most 10 sections." };
const underHalfWave = { value: 0.499, message: "Less than half a wavelength." };
const mostEnds = { value: 1, message: "At most 1 m. Write the unit, 12 mm." };

/** What only some ways of matching ask; empty, each has its usual value. */
export function MatchSpecial({ matching }: { matching: Matching }) {
  const { choices, choose } = matching;
  return (
    <details className="mt-3">
      <summary className="link w-fit text-label">Notch, two stubs, transformers, ends</summary>
      <div className="mt-3 flex flex-wrap items-start gap-3">
        <NumberField
          label="Notch at"
          kind="frequency"
          value={choices.notchHz}
          canBeEmpty
          set={(notchHz) => choose({ notchHz })}
        />
        <NumberField
          label="Stub to stub"
          kind="number"
          unit="λ"
          value={choices.spacingWavelengths}
          canBeEmpty
          most={underHalfWave}
          set={(spacingWavelengths) => choose({ spacingWavelengths })}
        />
        <NumberField
          label="First stub from load"
          kind="number"
          unit="λ"
          value={choices.firstDistanceWavelengths}
          canBeEmpty
          most={underHalfWave}
          set={(firstDistanceWavelengths) => choose({ firstDistanceWavelengths })}
        />
        <NumberField
          label="Sections"
          kind="number"
          value={choices.sections}
          canBeEmpty
          most={mostSections}
          set={(sections) => choose({ sections: sections && Math.max(1, Math.round(sections)) })}
        />
        <NumberField
          label="Ends add"
          kind="length"
          value={choices.endAllowanceM}
          canBeEmpty
          most={mostEnds}
          set={(endAllowanceM) => choose({ endAllowanceM })}
        />
      </div>
      <p className="mt-2 max-w-140 text-note text-ink-3">
        Left empty: no notch, stubs 0.125 λ apart with the first at the load, as few sections as keep the band, nothing
        taken off for ends.
      </p>
    </details>
  );
}
