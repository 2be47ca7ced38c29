"use client";

import { NumberField } from "@/components/runs/number-field";
import type { Timing } from "@/components/runs/use-time";
import { Field } from "@/components/ui/field";
import { Select } from "@/components/ui/select";

const mostVolts = { value: 1e6, message: "At most 1 MV." };
const mostSeconds = { value: 1, message: "At most a second." };

/** What the source does, and how long one looks. */
export function TimeConditions({ timing }: { timing: Timing }) {
  const { choices, choose, drive, windowS } = timing;
  return (
    <div className="mt-4 flex flex-wrap items-start gap-3">
      <Select
        label="The source gives"
        value={choices.kind}
        className="w-32"
        onChange={(event) => choose({ kind: event.target.value as typeof choices.kind })}
      >
        <option value="step">a step</option>
        <option value="pulse">a pulse</option>
        <option value="bits">bits</option>
      </Select>
      <NumberField
        label="Height"
        kind="voltage"
        value={choices.amplitudeV}
        most={mostVolts}
        set={(amplitudeV) => amplitudeV !== undefined && choose({ amplitudeV })}
      />
      <NumberField
        key={`edge ${choices.riseS === undefined ? drive?.riseS : ""}`}
        label="Edge, 0–100 %"
        kind="time"
        value={choices.riseS ?? drive?.riseS}
        most={mostSeconds}
        set={(riseS) => riseS !== undefined && choose({ riseS })}
      />
      {choices.kind === "pulse" && (
        <NumberField
          label="Width"
          kind="time"
          value={choices.widthS ?? (drive?.kind === "pulse" ? drive.widthS : undefined)}
          most={mostSeconds}
          set={(widthS) => widthS !== undefined && choose({ widthS })}
        />
      )}
      {choices.kind === "bits" && <BitFields timing={timing} />}
      <NumberField
        key={`window ${choices.windowS === undefined ? windowS : ""}`}
        label="Show"
        kind="time"
        value={choices.windowS ?? (windowS > 0 ? windowS : undefined)}
        most={mostSeconds}
        set={(next) => next !== undefined && choose({ windowS: next })}
      />
    </div>
  );
}

function BitFields({ timing: { choices, choose, drive } }: { timing: Timing }) {
  const isReadable = /^[01]{1,1024}$/.test(choices.bits);
  return (
    <>
      <Field
        label="Bits"
        isFigure
        defaultValue={choices.bits}
        error={isReadable ? undefined : "Write 0s and 1s."}
        className="w-40"
        onChange={({ target }) => /^[01]{1,1024}$/.test(target.value) && choose({ bits: target.value })}
      />
      <NumberField
        label="Time of a bit"
        kind="time"
        value={choices.bitS ?? (drive?.kind === "bits" ? drive.bitS : undefined)}
        most={mostSeconds}
        set={(bitS) => bitS !== undefined && choose({ bitS })}
      />
    </>
  );
}
