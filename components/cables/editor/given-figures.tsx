"use client";

import { useEntryForm } from "@/components/cables/editor/entry-form";
import { Figure } from "@/components/ui/figure";
import { lossDbPer100m } from "@/lib/cables/model";
import { digits, frequency, inWords, significantDigits } from "@/lib/format/quantity";

/** Where losses are compared where no table says. */
export const usualHz = 100e6;

/** What the construction alone gives. */
export function GivenFigures() {
  const { edited, isBehind } = useEntryForm();
  const way = edited.worked.ways.construction;
  if (!way?.model || !way.z0 || !way.velocityFactor || !way.capacitance || !way.inductance) return null;
  const figures = [
    { label: "Impedance", digits: digits(way.z0.value, 1), unit: "Ω" },
    { label: "Velocity", digits: digits(way.velocityFactor.value, 3), unit: "" },
    { label: "C", digits: digits(way.capacitance.value * 1e12, 1), unit: "pF/m" },
    { label: "L", digits: digits(way.inductance.value * 1e9, 0), unit: "nH/m" },
    {
      label: `Loss, ${inWords(frequency(usualHz))}`,
      digits: significantDigits(lossDbPer100m(way.model, usualHz), 3),
      unit: "dB/100 m",
    },
  ];
  return (
    <>
      <div
        className={`mt-2 flex flex-wrap gap-x-5 gap-y-1 border-t border-rule pt-1.5 ${isBehind ? "opacity-60" : ""}`}
      >
        <p className="font-[560]">gives</p>
        <dl className="contents">
          {figures.map(({ label, ...figure }) => (
            <div key={label}>
              <dt className="text-label text-ink-2">{label}</dt>
              <dd>
                <Figure {...figure} />
              </dd>
            </div>
          ))}
        </dl>
      </div>
      {way.notes.map((note) => (
        <p key={note} className="mt-0.5 text-note text-ink-3">
          {note}
        </p>
      ))}
    </>
  );
}
