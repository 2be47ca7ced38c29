"use client";

import type { Route } from "next";
import Link from "next/link";
import { Agreement } from "@/components/calculators/agreement";
import { CalculatorFrame, Results } from "@/components/calculators/calculator-frame";
import { InputField } from "@/components/calculators/input-field";
import { MetreDrawing } from "@/components/calculators/metre-drawing";
import { useCalculator, type OpenedCalculator } from "@/components/calculators/use-calculator";
import { Leaf } from "@/components/line/leaf";
import { Reading, Readings } from "@/components/ui/reading";
import { Section } from "@/components/ui/section";
import { Cell, HeadCell, RowHead, Table } from "@/components/ui/table";
import { perLength, perLengthInputs, type PerLength as Result } from "@/lib/calculators/per-length";
import { typedLineAddress } from "@/lib/calculators/start";
import { digits, significantDigits } from "@/lib/format/quantity";
import type { NominalFigures } from "@/lib/line/cable";
import { coaxRatio, pairRatio } from "@/lib/line/proportions";

const path = "/calculate/per-length";
const names = ["z0", "vf", "delay", "c", "l"] as const;
const metresPerFoot = 0.3048;

interface Props {
  opened: OpenedCalculator<typeof perLengthInputs>;
  canStartRun: boolean;
}

/** Any two of a line's five figures give the rest. */
export function PerLengthCalculator({ opened, canStartRun }: Props) {
  const calculator = useCalculator({ path, inputs: perLengthInputs, compute: perLength }, opened);
  const { result } = calculator;
  const figures = result?.agreement.figures ?? null;
  return (
    <CalculatorFrame
      path={path}
      calculator={calculator}
      head={<Head figures={figures} />}
      start={canStartRun && figures ? `/runs/new?${typedLineAddress(figures)}` : null}
    >
      {figures && (
        <div className="mt-4">
          <MetreDrawing figures={figures} name={spokenMetre(figures)} />
        </div>
      )}
      <div className="mt-4">
        <Leaf name="What is known of the line" notchX={120}>
          <div className="flex flex-wrap items-start gap-3">
            {names.map((name) => (
              <InputField key={name} of={calculator} name={name} />
            ))}
            <p className="max-w-80 self-center text-note text-ink-3">
              Two of them are enough. The velocity may be a fraction, a percentage or 1/VF.
            </p>
          </div>
        </Leaf>
      </div>
      {result && (
        <Results calculator={calculator}>
          <div className="grid grid-cols-[minmax(0,1fr)_minmax(0,1fr)] gap-x-10 gap-y-6 folded:grid-cols-1">
            <Derived result={result} />
            <Agreement result={result} />
          </div>
          <WaysOn figures={result.agreement.figures} />
        </Results>
      )}
    </CalculatorFrame>
  );
}

function spokenMetre({ z0, velocityFactor, delay, capacitance, inductance }: NominalFigures): string {
  const say = (value: number) => significantDigits(value, 4);
  return `A metre of line of ${say(z0)} ohms and velocity factor ${say(velocityFactor)}: ${say(delay * 1e9)} nanoseconds, ${say(inductance * 1e9)} nanohenries, ${say(capacitance * 1e12)} picofarads`;
}

function Head({ figures }: { figures: NominalFigures | null }) {
  const say = (value: number | undefined) => significantDigits(value, 4);
  const scaled = (value: number | undefined, scale: number) => say(value === undefined ? undefined : value * scale);
  return (
    <Readings className="min-w-0 flex-1 folded:w-full phone:grid phone:w-full phone:grid-cols-2 phone:gap-y-3">
      <Reading label="Impedance" digits={say(figures?.z0)} unit="Ω" spoken="ohms" />
      <Reading label="Velocity factor" digits={say(figures?.velocityFactor)} />
      <Reading label="Delay" digits={scaled(figures?.delay, 1e9)} unit="ns/m" spoken="nanoseconds per metre" />
      <Reading
        label="Capacitance"
        digits={scaled(figures?.capacitance, 1e12)}
        unit="pF/m"
        spoken="picofarads per metre"
      />
    </Readings>
  );
}

interface Row {
  name: string;
  perMetre: string;
  perFoot: string;
  unit: string;
}

function rowsOf({ agreement: { figures }, permittivity }: Result): Row[] {
  const say = (value: number) => significantDigits(value, 4);
  const perLength = (name: string, value: number, unit: string) => ({
    name,
    perMetre: say(value),
    perFoot: say(value * metresPerFoot),
    unit,
  });
  const bare = (name: string, text: string, unit = "") => ({ name, perMetre: text, perFoot: "", unit });
  const { z0, velocityFactor } = figures;
  return [
    bare("Impedance", say(z0), "Ω"),
    bare("Velocity factor", say(velocityFactor)),
    bare("as a percentage", digits(velocityFactor * 100, 1), "%"),
    bare("as shortening factor, 1/VF", say(1 / velocityFactor)),
    perLength("Delay", figures.delay * 1e9, "ns"),
    perLength("Capacitance", figures.capacitance * 1e12, "pF"),
    perLength("Inductance", figures.inductance * 1e9, "nH"),
    bare("Permittivity, relative", say(permittivity)),
    bare("As a coaxial cable: bore over inner", say(coaxRatio(z0, velocityFactor))),
    bare("As a pair: spacing over wire", say(pairRatio(z0, velocityFactor))),
  ];
}

function Derived({ result }: { result: Result }) {
  return (
    <Section title="What follows" note="without loss, at high frequency">
      <Table className="mt-1">
        <thead>
          <tr>
            <HeadCell>Figure</HeadCell>
            <HeadCell isRight>per metre</HeadCell>
            <HeadCell isRight>per foot</HeadCell>
            <HeadCell aria-label="Unit" className="w-8" />
          </tr>
        </thead>
        <tbody>
          {rowsOf(result).map(({ name, perMetre, perFoot, unit }) => (
            <tr key={name}>
              <RowHead>{name}</RowHead>
              <Cell isRight className="figures">
                {perMetre}
              </Cell>
              <Cell isRight className="figures">
                {perFoot}
              </Cell>
              <Cell className="pl-1.5">
                <span className="unit">{unit}</span>
              </Cell>
            </tr>
          ))}
        </tbody>
      </Table>
    </Section>
  );
}

/** The same line in the other calculators, and cables like it. */
function WaysOn({ figures }: { figures: NominalFigures }) {
  const line = typedLineAddress(figures);
  const ways = [
    [`/calculate/attenuation?${line}`, "its attenuation"],
    [`/calculate/length?${line}`, "a length of it"],
    [`/calculate/stub?${line}`, "a stub of it"],
    [`/cables?q=${encodeURIComponent(`${Math.round(figures.z0)} ohm`)}`, `cables of ${Math.round(figures.z0)} Ω`],
  ] as const;
  return (
    <p className="mt-5 text-label text-ink-2">
      Go on with this line:{" "}
      {ways.map(([href, words], i) => (
        <span key={href}>
          {i > 0 && ", "}
          <Link href={href as Route} className="link">
            {words}
          </Link>
        </span>
      ))}
      .
    </p>
  );
}
