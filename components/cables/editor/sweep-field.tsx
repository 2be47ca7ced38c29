"use client";

import { useId, useState, type ChangeEvent } from "react";
import { useWatch } from "react-hook-form";
import { useEntryForm } from "@/components/cables/editor/entry-form";
import { StateNote } from "@/components/ui/state-mark";
import { usualForm } from "@/lib/cables/ways/loss-way";
import { digits } from "@/lib/format/quantity";
import { nominalFigures } from "@/lib/line/cable";

const largestBytes = 25e6;

/** A sweep of the sample, read in the browser: the line it makes is kept among the inputs. */
export function SweepField() {
  const { form, edited } = useEntryForm();
  const id = useId();
  const sweep = useWatch({ control: form.control, name: "sweep" });
  const [said, setSaid] = useState<{ isWrong: boolean; sentences: string[] } | null>(null);
  const lengthM = edited.read.inputs.readings?.lengthM;

  async function take(event: ChangeEvent<HTMLInputElement>) {
    const [file] = event.target.files ?? [];
    event.target.value = "";
    if (!file) return;
    const wrong = (sentence: string) => setSaid({ isWrong: true, sentences: [sentence] });
    if (lengthM === undefined) return wrong("Type the length of the sample first.");
    if (file.size > largestBytes) return wrong("The file is larger than 25 MB.");
    // The reader of such files is fetched when somebody has one.
    const { readSweep } = await import("@/lib/cables/editor/read-sweep");
    const conductor = edited.read.inputs.form ?? usualForm(form.getValues("family"));
    const read = readSweep(file.name, await file.text(), lengthM, conductor);
    if (!read.ok) return wrong(read.message);
    setSaid({ isWrong: false, sentences: read.warnings });
    form.setValue("sweep", read.sweep, { shouldDirty: true });
  }
  const figures = sweep?.model && nominalFigures(sweep.model);
  return (
    <div className="mt-3">
      <label htmlFor={id} className="block text-note text-ink-2">
        A sweep of the sample through both ends, a .s2p file
      </label>
      <input
        id={id}
        type="file"
        accept=".s2p,.ts"
        onChange={(event) => void take(event)}
        className="text-label phone:min-h-11"
      />
      <div role="status">
        {sweep && figures && (
          <p className="mt-1 text-label">
            {sweep.fileName ?? "The sweep"} of {sweep.lengthM} m gives {digits(figures.z0, 1)} Ω and a velocity factor
            of {digits(figures.velocityFactor, 3)}.{" "}
            <button
              type="button"
              className="link min-h-6"
              onClick={() => form.setValue("sweep", null, { shouldDirty: true })}
            >
              Take it out
            </button>
          </p>
        )}
        {sweep && lengthM !== undefined && lengthM !== sweep.lengthM && (
          <StateNote state="warn">
            The sweep was read for {sweep.lengthM} m: read it again for another length.
          </StateNote>
        )}
        {said?.sentences.map((sentence) => (
          <StateNote key={sentence} state={said.isWrong ? "fail" : "warn"}>
            {sentence}
          </StateNote>
        ))}
      </div>
    </div>
  );
}
