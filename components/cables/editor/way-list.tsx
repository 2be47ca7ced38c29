"use client";

import { useEntryForm } from "@/components/cables/editor/entry-form";
import { Select } from "@/components/ui/select";
import { StateMark, type MarkedState } from "@/components/ui/state-mark";
import type { SourceWay } from "@/lib/cables/editor/texts";
import { wayStates, type WayState } from "@/lib/cables/editor/way-states";

const marks: Record<WayState["state"], MarkedState> = {
  none: "none",
  fine: "pass",
  look: "warn",
  contradiction: "fail",
};

interface Props {
  open: readonly SourceWay[];
  toggle: (way: SourceWay) => void;
}

const wayNames = {
  construction: "Construction",
  nominal: "Nominal figures",
  lossTable: "Loss table",
  readings: "Meter readings",
  sweep: "Sweep of a sample",
  smoothCopper: "the loss, as smooth copper",
} as const;

const choices = {
  impedance: ["nominal", "construction", "readings", "sweep"],
  loss: ["lossTable", "sweep", "construction", "nominal"],
  resistance: ["nominal", "construction", "readings", "sweep"],
} as const;
const labels = { impedance: "Z and velocity", loss: "Loss", resistance: "Dc resistance" } as const;

/** Which way rules, and where that one says nothing, which one was taken. */
function Ruling() {
  const { form, edited } = useEntryForm();
  const { ruled } = edited.worked;
  const taken = { impedance: ruled?.impedance, loss: ruled?.loss, resistance: ruled?.resistance };
  const chosen = edited.read.inputs.ruling;
  return (
    <div className="mt-5 border-t border-rule pt-2">
      <h2>Which one rules?</h2>
      <p className="mb-2 text-label text-ink-2">Where ways disagree, runs use the ruling one.</p>
      {(Object.keys(choices) as (keyof typeof choices)[]).map((what) => {
        const now = taken[what];
        const isOther = now && now !== chosen?.[what];
        return (
          <Select
            key={what}
            label={labels[what]}
            controlSize="small"
            className="mb-2"
            hint={isOther ? `says nothing; taken from ${wayNames[now]}` : undefined}
            {...form.register(`ruling.${what}`)}
          >
            {choices[what].map((way) => (
              <option key={way} value={way}>
                {wayNames[way]}
              </option>
            ))}
          </Select>
        );
      })}
      <Select label="Form of the conductor" controlSize="small" {...form.register("form")}>
        <option value="">As usual for the family</option>
        <option value="round">Round</option>
        <option value="sqrt">Square root</option>
      </Select>
    </div>
  );
}

/** The four ways to describe a cable, what has been given of each, and which one rules. */
export function WayList({ open, toggle }: Props) {
  const { edited } = useEntryForm();
  return (
    <nav aria-label="Ways to describe the cable" className="min-w-0">
      <p className="border-t-[1.5px] border-ink py-1.75 text-label text-ink-2">
        Four ways to describe one cable. Give any; the rest is worked out and compared.
      </p>
      <ol>
        {wayStates(edited).map(({ way, title, words, state }, i) => {
          const isOpen = open.includes(way);
          return (
            <li key={way} className="border-b border-line">
              <button
                type="button"
                aria-expanded={isOpen}
                aria-controls={`way-${way}`}
                onClick={() => toggle(way)}
                className={`grid w-full grid-cols-[18px_1fr_auto] items-start gap-x-2 border-l-2 px-2 py-2 text-left phone:min-h-11 ${isOpen ? "border-copper bg-copper-wash" : "border-transparent hover:bg-sailcloth"}`}
              >
                <span className="figures text-ink-3">{i + 1}</span>
                <span className="min-w-0">
                  <span className="block font-[560]">{title}</span>
                  <span className="block text-label text-ink-2">{words}</span>
                </span>
                <StateMark state={marks[state]} />
              </button>
            </li>
          );
        })}
      </ol>
      <Ruling />
    </nav>
  );
}
