"use client";

import { FigureRows, type FigureRow } from "@/components/calculators/figure-rows";
import { InputField } from "@/components/calculators/input-field";
import type { Calculator } from "@/components/calculators/use-calculator";
import { CutDrawing, plainCoax } from "@/components/line/cut-drawing";
import { Section } from "@/components/ui/section";
import type { StubAndSection, stubInputs } from "@/lib/calculators/stub";
import {
  cutLength,
  decibels,
  frequency,
  impedance,
  inWords,
  scaled,
  significantDigits,
  type Figure,
} from "@/lib/format/quantity";

export interface StubColumnProps {
  calculator: Calculator<typeof stubInputs>;
  result: StubAndSection;
}

/** What a given stub is at this frequency. */
export function StubColumn({ calculator, result }: StubColumnProps) {
  const { line, stub } = result;
  const { end } = calculator.values;
  const cable = line.entry ?? plainCoax;
  return (
    <Section title="The stub" note={line.label}>
      <div className="max-w-84">
        <CutDrawing
          elements={[{ kind: "stub", connection: "shunt", end, line: null, lengthM: stub.lengthM }]}
          load="resistor"
          cableOf={() => cable}
          name={`A stub of ${inWords(cutLength(stub.lengthM))}, ${end === "short" ? "shorted" : "open"}`}
        />
      </div>
      <div className="mt-2 flex flex-wrap items-start gap-3">
        <InputField of={calculator} name="length" />
        <InputField of={calculator} name="end" />
        <InputField of={calculator} name="across" />
      </div>
      <FigureRows rows={rowsOf(result)} />
    </Section>
  );
}

/** The part it stands for; where little reactance is left, it is a resistance. */
function partRow({ stub, spot }: StubAndSection): FigureRow[] {
  if (!stub.part || stub.q < 1)
    return [
      {
        label: "Stands for",
        figure: { digits: "resistance", unit: "", spoken: "" },
        note: "little reactance is left at this length",
      },
    ];
  const figure = "lH" in stub.part ? scaled("inductance", stub.part.lH, 3) : scaled("capacitance", stub.part.cF, 3);
  const kind = "lH" in stub.part ? "a coil" : "a capacitor";
  return [{ label: `Stands for ${kind}`, figure, note: `at ${inWords(frequency(spot.frequency))} only` }];
}

function rowsOf(result: StubAndSection): FigureRow[] {
  const { stub } = result;
  const bare = (text: string, unit = ""): Figure => ({ digits: text, unit, spoken: unit });
  const isOpen = stub.impedance.re === Infinity;
  return [
    { label: "Length", figure: cutLength(stub.lengthM), isStrong: true },
    { label: "Electrical length", figure: bare(significantDigits(stub.wavelengths, 4), "λ") },
    { label: "Impedance", figure: isOpen ? bare("open") : impedance(stub.impedance, 2), isStrong: true },
    ...partRow(result),
    ...(stub.q >= 1
      ? [{ label: "Q", figure: bare(stub.q > 1e5 ? "over 100 000" : significantDigits(stub.q, 3)), note: "X over R" }]
      : []),
    {
      label: "Takes from the line",
      figure: decibels(stub.acrossDb),
      note: "across a line of that impedance, between matched ends",
    },
  ];
}
