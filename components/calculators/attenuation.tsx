"use client";

import { AttenuationCurve } from "@/components/calculators/attenuation-curve";
import { CalculatorFrame, Results } from "@/components/calculators/calculator-frame";
import { Cautions } from "@/components/calculators/cautions";
import { FigureRows, type FigureRow } from "@/components/calculators/figure-rows";
import { InputField } from "@/components/calculators/input-field";
import { LineFields } from "@/components/calculators/line-fields";
import { percentOf, PowerAlong } from "@/components/calculators/power-along";
import { useCalculator, type OpenedCalculator } from "@/components/calculators/use-calculator";
import { Leaf } from "@/components/line/leaf";
import { Reading, Readings } from "@/components/ui/reading";
import { Section } from "@/components/ui/section";
import { attenuation, attenuationInputs, type AttenuationResult } from "@/lib/calculators/attenuation";
import { entryCautions, modelCautions } from "@/lib/calculators/cautions";
import { newRunAddress } from "@/lib/calculators/start";
import {
  decibels,
  digits,
  frequency,
  impedance,
  inWords,
  metres,
  scaled,
  significantDigits,
  type Figure,
} from "@/lib/format/quantity";

const path = "/calculate/attenuation";
const metresPerFoot = 0.3048;

interface Props {
  opened: OpenedCalculator<typeof attenuationInputs>;
  canStartRun: boolean;
}

/** What a length of cable loses, and what else it does, at one frequency and temperature. */
export function AttenuationCalculator({ opened, canStartRun }: Props) {
  const calculator = useCalculator({ path, inputs: attenuationInputs, compute: attenuation }, opened);
  const { texts, values, result } = calculator;
  const start = newRunAddress(texts, {
    length: texts.length ?? "",
    frequency: texts.frequency ?? "",
    temperature: texts.temperature ?? "",
  });
  return (
    <CalculatorFrame
      path={path}
      calculator={calculator}
      head={<Head result={result} />}
      start={canStartRun ? start : null}
    >
      {result && (
        <div className="mt-4">
          <PowerAlong
            cable={result.line.entry}
            lengthM={values.length}
            lossDb={result.whole.lossDb}
            name={`${inWords(metres(values.length))} of ${result.line.label} lose ${inWords(decibels(result.whole.lossDb))}`}
          />
        </div>
      )}
      <div className="mt-3">
        <Leaf name="The length of cable" notchX={160}>
          <div className="flex flex-wrap items-start gap-3">
            <LineFields of={calculator} />
            <InputField of={calculator} name="length" />
            <InputField of={calculator} name="frequency" />
            <InputField of={calculator} name="temperature" />
            <InputField of={calculator} name="current" />
          </div>
        </Leaf>
      </div>
      {result && (
        <Results calculator={calculator}>
          <div className="grid grid-cols-[minmax(0,1fr)_448px] gap-x-10 gap-y-6 folded:grid-cols-1">
            <AttenuationCurve calculator={calculator} result={result} />
            <div>
              <Figures result={result} />
              <Cautions
                cautions={[
                  ...entryCautions(result.line, values.frequency, values.temperature),
                  ...modelCautions(result.line, result.spot),
                ]}
              />
            </div>
          </div>
        </Results>
      )}
    </CalculatorFrame>
  );
}

function Head({ result }: { result: AttenuationResult | null }) {
  const { whole, share } = result ?? {};
  return (
    <Readings className="min-w-0 flex-1 folded:w-full phone:grid phone:w-full phone:grid-cols-2 phone:gap-y-3">
      <Reading label="Attenuation" {...decibels(whole?.lossDb)} target="between matched ends" />
      <Reading label="Power that arrives" digits={share === undefined ? "–" : percentOf(share)} unit="%" />
      <Reading label="Delay" {...scaled("time", whole?.phaseDelayS)} />
      <Reading
        label="Loop resistance, dc"
        {...scaled("resistance", whole?.dcResistanceOhm, 3)}
        target="both conductors"
      />
    </Readings>
  );
}

/** The rule that gave the loss at this temperature, in a sentence. */
function slopeWords({ spot, line }: AttenuationResult): string {
  const { slope, lossRatio, resistivityRatio, temperatureC } = spot.temperature;
  if (temperatureC === 20) return "at 20 °C, where the cable's figures hold";
  if (slope === "declared") return `by the slope that ${line.label} declares, ×${digits(lossRatio, 3)}`;
  return `by the resistivity of the conductors, ×${digits(resistivityRatio, 3)}; loss of the conductors by its root above the skin corner, ×${digits(lossRatio, 3)}`;
}

function rowsOf(result: AttenuationResult): FigureRow[] {
  const { spot, whole, reference, dropV, skinDepthM } = result;
  const per = (value: number, unit: string): Figure => ({ digits: significantDigits(value, 4), unit, spoken: unit });
  const { temperatureC } = spot.temperature;
  const added = whole.lossDb - reference.lossDb;
  const rows: FigureRow[] = [
    {
      label: "Loss of the length",
      figure: decibels(whole.lossDb, 3),
      note: slopeWords(result),
      isStrong: true,
    },
    ...(temperatureC === 20
      ? []
      : [{ label: "of which for the temperature", figure: decibels(added, 3), note: "more than at 20 °C" }]),
    { label: "Attenuation", figure: per(spot.attenuationDbPerM * 100, "dB/100 m") },
    { label: "per 100 feet", figure: per(spot.attenuationDbPerM * 100 * metresPerFoot, "dB/100 ft") },
    { label: "in nepers", figure: per(spot.attenuationNpPerM * 1000, "Np/km") },
    { label: "Phase", figure: { digits: digits((whole.phaseRad * 180) / Math.PI, 1), unit: "°", spoken: "degrees" } },
    { label: "Electrical length", figure: per(whole.wavelengths, "λ") },
    { label: "Phase delay", figure: scaled("time", whole.phaseDelayS, 5) },
    { label: "Group delay", figure: scaled("time", whole.groupDelayS, 5) },
    { label: "Velocity factor here", figure: { digits: digits(spot.velocityFactor, 4), unit: "", spoken: "" } },
    { label: "Impedance here", figure: impedance(spot.zc, 2) },
    { label: "Resistance at this frequency", figure: per(spot.resistanceOhmPerM * 1000, "Ω/km") },
    { label: "Skin depth of copper", figure: per(skinDepthM * 1e6, "µm") },
    ...(dropV === null
      ? []
      : [{ label: "Drop of the direct current", figure: scaled("voltage", dropV, 3), note: "out and back" }]),
  ];
  return rows;
}

function Figures({ result }: { result: AttenuationResult }) {
  const { spot } = result;
  return (
    <Section
      title="What the length does"
      note={`${inWords(frequency(spot.frequency))}, ${significantDigits(spot.temperature.temperatureC, 3)}\u00a0°C`}
    >
      <FigureRows rows={rowsOf(result)} />
    </Section>
  );
}
