"use client";

import { FigureRows, type FigureRow } from "@/components/calculators/figure-rows";
import { InputField } from "@/components/calculators/input-field";
import { SectionCables } from "@/components/calculators/section-cables";
import type { StubColumnProps } from "@/components/calculators/stub-column";
import { CutDrawing, plainCoax } from "@/components/line/cut-drawing";
import { Section } from "@/components/ui/section";
import type { StubAndSection } from "@/lib/calculators/stub";
import { cutLength, decibels, digits, inWords, scaled, type Figure } from "@/lib/format/quantity";

/** A quarter-wave section between two resistances, and the team's cables for it. */
export function SectionColumn({ calculator, result }: StubColumnProps) {
  const { line, section } = result;
  const { source, load } = calculator.values;
  const cable = line.entry ?? plainCoax;
  return (
    <Section title="A quarter-wave section" note="between two resistances">
      <div className="max-w-84">
        <CutDrawing
          elements={[{ kind: "cable", line: null, lengthM: section.lengthM }]}
          load="resistor"
          cableOf={() => cable}
          name={`A quarter-wave section, ${inWords(cutLength(section.lengthM))} of ${line.label}`}
        />
      </div>
      <div className="mt-2 flex flex-wrap items-start gap-3">
        <InputField of={calculator} name="source" />
        <InputField of={calculator} name="load" />
      </div>
      <FigureRows rows={rowsOf(result)} />
      <h3 className="mt-4">Do your cables have it?</h3>
      <SectionCables neededOhm={section.neededOhm} sourceOhm={source} loadOhm={load} />
    </Section>
  );
}

function rowsOf({ section, line }: StubAndSection): FigureRow[] {
  const bare = (text: string, unit = ""): Figure => ({ digits: text, unit, spoken: unit });
  const { bandwidth, alternating, ownReturnLossDb } = section;
  return [
    { label: "Impedance needed", figure: scaled("resistance", section.neededOhm, 4), isStrong: true },
    {
      label: `With ${line.label}`,
      figure: Number.isFinite(ownReturnLossDb) ? decibels(ownReturnLossDb, 1) : bare("exact"),
      note: "return loss it reaches at this frequency, without loss",
    },
    { label: `Quarter wave of ${line.label}`, figure: cutLength(section.lengthM) },
    {
      label: "Band of an exact one",
      figure: bandwidth >= 2 ? bare("every frequency") : bare(digits(bandwidth * 100, 1), "%"),
      note: "of the frequency, 20 dB and better",
    },
    ...(alternating === null
      ? []
      : [
          {
            label: "Or two short sections",
            figure: bare(digits(alternating, 4), "λ each"),
            note: "of the two impedances themselves, crossed over",
          },
        ]),
  ];
}
