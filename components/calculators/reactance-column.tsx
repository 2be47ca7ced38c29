"use client";

import { InputField } from "@/components/calculators/input-field";
import type { StubColumnProps } from "@/components/calculators/stub-column";
import { CutDrawing, plainCoax } from "@/components/line/cut-drawing";
import { Figure } from "@/components/ui/figure";
import { Section } from "@/components/ui/section";
import { StateNote } from "@/components/ui/state-mark";
import { Cell, HeadCell, RowHead, Table } from "@/components/ui/table";
import type { CutStub, StubAndSection } from "@/lib/calculators/stub";
import { cutLength, impedance, inWords, scaled, significantDigits } from "@/lib/format/quantity";
import type { StubEnd } from "@/lib/line/stub";

const endWords: Record<StubEnd, string> = { open: "Open", short: "Shorted" };

/** The stubs that have a wanted reactance, shortest first. */
export function ReactanceColumn({ calculator, result }: StubColumnProps) {
  const { line, cuts } = result;
  const cable = line.entry ?? plainCoax;
  const ordered = [...cuts].sort((a, b) => a.lengthM - b.lengthM);
  const shortest = ordered[0];
  return (
    <Section title="A stub for a reactance" note={line.label}>
      {shortest && (
        <div className="max-w-84">
          <CutDrawing
            elements={[{ kind: "stub", connection: "shunt", end: shortest.end, line: null, lengthM: shortest.lengthM }]}
            load="resistor"
            cableOf={() => cable}
            name={`The shortest: ${inWords(cutLength(shortest.lengthM))}, ${endWords[shortest.end].toLowerCase()}`}
          />
        </div>
      )}
      <div className="mt-2 flex flex-wrap items-start gap-3">
        <InputField of={calculator} name="wanted" />
        <p className="max-w-44 self-center text-note text-ink-3">Ohms, or the coil or capacitor it shall stand for.</p>
      </div>
      {ordered.length > 0 && <Cuts cuts={ordered} />}
      <NotReached result={result} />
    </Section>
  );
}

function Cuts({ cuts }: { cuts: readonly CutStub[] }) {
  return (
    <Table className="mt-1">
      <thead>
        <tr>
          <HeadCell>Far end</HeadCell>
          <HeadCell isRight>cut</HeadCell>
          <HeadCell isRight>impedance</HeadCell>
          <HeadCell isRight>Q</HeadCell>
        </tr>
      </thead>
      <tbody>
        {cuts.map(({ end, lengthM, impedance: z }, i) => (
          <tr key={`${end} ${i}`}>
            <RowHead>{endWords[end]}</RowHead>
            <Cell isRight>
              <Figure {...cutLength(lengthM)} unitSlot={2} />
            </Cell>
            <Cell isRight>
              <Figure {...impedance(z, 2)} />
            </Cell>
            <Cell isRight className="figures">
              {z.re > 0 ? significantDigits(Math.abs(z.im) / z.re, 3) : "–"}
            </Cell>
          </tr>
        ))}
      </tbody>
    </Table>
  );
}

const reactanceWords = (ohm: number) =>
  `${ohm < 0 ? "\u2212" : "+"}j${inWords(scaled("resistance", Math.abs(ohm), 3))}`;

/** What the cable's loss keeps out of reach. */
function NotReached({ result: { cuts, reach, wantedOhm } }: { result: StubAndSection }) {
  const missing = (["short", "open"] as const).filter((end) => !cuts.some((cut) => cut.end === end));
  return missing.map((end) => {
    const isInductive = wantedOhm >= 0;
    const most = isInductive ? reach[end].inductive : reach[end].capacitive;
    const kind = isInductive ? "inductive" : "capacitive";
    return (
      <StateNote key={end} state="warn" className="mt-2">
        {most > 0 === isInductive && most !== 0
          ? `${endWords[end]}, this cable reaches at most ${reactanceWords(most)}: its loss keeps it from more.`
          : `${endWords[end]}, this cable is never ${kind} at this frequency: its loss is too great.`}
      </StateNote>
    );
  });
}
