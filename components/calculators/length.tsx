"use client";

import { CalculatorFrame, Results } from "@/components/calculators/calculator-frame";
import { Cautions } from "@/components/calculators/cautions";
import { CutLengthSketch } from "@/components/calculators/cut-length-sketch";
import { FigureRows, type FigureRow } from "@/components/calculators/figure-rows";
import { InputField } from "@/components/calculators/input-field";
import { LineFields } from "@/components/calculators/line-fields";
import { useCalculator, type Calculator, type OpenedCalculator } from "@/components/calculators/use-calculator";
import { Leaf } from "@/components/line/leaf";
import { Reading, Readings } from "@/components/ui/reading";
import { Section } from "@/components/ui/section";
import { StateNote } from "@/components/ui/state-mark";
import { entryCautions, modelCautions } from "@/lib/calculators/cautions";
import { electricalLength, lengthInputs, type LengthResult } from "@/lib/calculators/length";
import { newRunAddress } from "@/lib/calculators/start";
import {
  cutLength,
  decibels,
  digits,
  frequency,
  inWords,
  scaled,
  significantDigits,
  trimmed,
  withoutTrailingZeros,
  type Figure,
} from "@/lib/format/quantity";

const path = "/calculate/length";
const metresPerInch = 0.0254;

interface Props {
  opened: OpenedCalculator<typeof lengthInputs>;
  canStartRun: boolean;
}

/** Electrical length of a cable and the length to cut, either from the other. */
export function LengthCalculator({ opened, canStartRun }: Props) {
  const calculator = useCalculator({ path, inputs: lengthInputs, compute: electricalLength }, opened);
  const { texts, result } = calculator;
  const start = newRunAddress(texts, {
    length: result ? `${Number(result.cutM.toPrecision(6))} m` : "",
    frequency: texts.frequency ?? "",
    temperature: texts.temperature ?? "",
  });
  return (
    <CalculatorFrame
      path={path}
      calculator={calculator}
      head={<Head result={result} />}
      start={canStartRun && result ? start : null}
    >
      {result && (
        <div className="mt-4">
          <CutLengthSketch result={result} name={spoken(result)} />
        </div>
      )}
      <div className="mt-3">
        <LengthFields calculator={calculator} />
      </div>
      {result && (
        <Results calculator={calculator}>
          <LengthResults result={result} />
        </Results>
      )}
    </CalculatorFrame>
  );
}

function LengthFields({ calculator }: { calculator: Calculator<typeof lengthInputs> }) {
  return (
    <Leaf name="The length" notchX={160}>
      <div className="flex flex-wrap items-start gap-3">
        <LineFields of={calculator} />
        <InputField of={calculator} name="frequency" />
        <InputField of={calculator} name="wanted" />
        <InputField of={calculator} name="ends" />
        <InputField of={calculator} name="temperature" />
        <p className="max-w-90 self-center text-note text-ink-3">
          Degrees, wavelengths or time for what it shall be; metres or feet for what is cut already. The ends take off
          what plugs, tees and caps count for, as cable.
        </p>
      </div>
    </Leaf>
  );
}

function LengthResults({ result }: { result: LengthResult }) {
  const { spot } = result;
  return (
    <>
      <Trim result={result} />
      <div className="mt-5 grid grid-cols-3 gap-x-10 gap-y-6 folded:grid-cols-1">
        <Section title="The length" note={`at ${inWords(frequency(spot.frequency))}`}>
          <FigureRows rows={wholeRows(result)} />
        </Section>
        <Section title="To cut" note={`of ${result.line.label}`}>
          <FigureRows rows={cutRows(result)} />
        </Section>
        <Section title="When it is off" note="small errors, each alone">
          <FigureRows rows={offRows(result)} />
        </Section>
      </div>
      <Cautions
        cautions={[
          ...entryCautions(result.line, spot.frequency, spot.temperature.temperatureC),
          ...modelCautions(result.line, spot),
        ]}
      />
    </>
  );
}

const short = (value: number | undefined, significant: number) =>
  withoutTrailingZeros(significantDigits(value, significant));
const degreesOf = (radians: number) => (radians * 180) / Math.PI;
const bare = (text: string, unit: string): Figure => ({ digits: text, unit, spoken: unit });

function spoken({ cutM, whole, line }: LengthResult): string {
  return `${inWords(cutLength(cutM))} of ${line.label}: ${significantDigits(degreesOf(whole.phaseRad), 4)} degrees, ${significantDigits(whole.wavelengths, 4)} wavelengths`;
}

function Head({ result }: { result: LengthResult | null }) {
  const { whole, cutM } = result ?? {};
  return (
    <Readings className="min-w-0 flex-1 folded:w-full phone:grid phone:w-full phone:grid-cols-2 phone:gap-y-3">
      <Reading label="To cut" {...cutLength(cutM)} />
      <Reading label="Phase" digits={short(whole && degreesOf(whole.phaseRad), 6)} unit="°" spoken="degrees" />
      <Reading label="Wavelengths" digits={short(whole?.wavelengths, 5)} unit="λ" spoken="wavelengths" />
      <Reading label="Delay" {...scaled("time", whole?.phaseDelayS)} />
    </Readings>
  );
}

/** Which way trimming goes, and by how much. */
function Trim({ result: { frequencyPerM, spot, cutM } }: { result: LengthResult }) {
  const off = cutM < 0.5 ? 0.001 : 0.01;
  const moved = inWords(scaled("frequency", Math.abs(frequencyPerM) * off, 3));
  return (
    <StateNote state="none">
      <b>Cut long, then trim:</b> too long is right at too low a frequency. Each {inWords(cutLength(off))} taken off
      moves it up by {moved} from {inWords(frequency(spot.frequency))}.
    </StateNote>
  );
}

function wholeRows({ whole, spot, totalM }: LengthResult): FigureRow[] {
  return [
    { label: "Phase", figure: bare(short(degreesOf(whole.phaseRad), 7), "°"), isStrong: true },
    { label: "less whole turns", figure: bare(withoutTrailingZeros(digits(degreesOf(whole.phaseRad) % 360, 2)), "°") },
    { label: "Wavelengths", figure: bare(short(whole.wavelengths, 7), "λ"), isStrong: true },
    { label: "Phase delay", figure: trimmed(scaled("time", whole.phaseDelayS, 6)), isStrong: true },
    { label: "Group delay", figure: trimmed(scaled("time", whole.groupDelayS, 6)) },
    { label: "Length, ends and all", figure: cutLength(totalM) },
    { label: "Matched loss", figure: decibels(whole.lossDb, 3) },
    { label: "Velocity factor here", figure: bare(digits(spot.velocityFactor, 4), "") },
  ];
}

function cutRows({ cutM, endsM, longer, waves }: LengthResult): FigureRow[] {
  return [
    { label: "Cut", figure: cutLength(cutM), isStrong: true },
    { label: "in inches", figure: bare(digits(cutM / metresPerInch, 2), "in") },
    { label: "Less for the ends", figure: cutLength(endsM) },
    { label: "Half a wavelength more", figure: cutLength(longer.half), note: "the same impedance, opposite phase" },
    { label: "A wavelength more", figure: cutLength(longer.whole), note: "the same phase" },
    { label: "Quarter wave of this cable", figure: cutLength(waves.quarter), note: "nothing taken off" },
    { label: "Half wave", figure: cutLength(waves.half) },
    {
      label: "Twentieth of a wave",
      figure: cutLength(waves.whole / 20),
      note: "below it an LCR meter reads the cable true",
    },
  ];
}

function offRows({ spot, whole, cutM, frequencyPerM }: LengthResult): FigureRow[] {
  const perMm = spot.phaseRadPerM / 1000;
  const onePerCent = 0.01;
  return [
    { label: "1 mm", figure: bare(significantDigits(degreesOf(perMm), 3), "°") },
    { label: "1 mm", figure: scaled("time", spot.phaseDelaySPerM / 1000, 3) },
    { label: "1°", figure: bare(significantDigits(1 / degreesOf(perMm), 3), "mm") },
    { label: "1 mm more", figure: bare(`\u2212${significantDigits(Math.abs(frequencyPerM) / 1e6, 3)}`, "kHz") },
    {
      label: "Velocity 1 % off",
      figure: bare(`±${significantDigits(degreesOf(whole.phaseRad) * onePerCent, 3)}`, "°"),
      note: "published velocities are seldom better",
    },
    { label: "the same", figure: bare(`±${significantDigits(cutM * onePerCent * 1000, 3)}`, "mm") },
  ];
}
