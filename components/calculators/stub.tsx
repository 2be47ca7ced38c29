"use client";

import { CalculatorFrame, Results } from "@/components/calculators/calculator-frame";
import { Cautions } from "@/components/calculators/cautions";
import { HalfWaveStrip } from "@/components/calculators/half-wave-strip";
import { InputField } from "@/components/calculators/input-field";
import { LineFields } from "@/components/calculators/line-fields";
import { ReactanceColumn } from "@/components/calculators/reactance-column";
import { SectionColumn } from "@/components/calculators/section-column";
import { StubColumn } from "@/components/calculators/stub-column";
import { useCalculator, type OpenedCalculator } from "@/components/calculators/use-calculator";
import { Leaf } from "@/components/line/leaf";
import { Reading, Readings } from "@/components/ui/reading";
import { entryCautions, modelCautions } from "@/lib/calculators/cautions";
import { newRunAddress } from "@/lib/calculators/start";
import { stubAndSection, stubInputs, type StubAndSection } from "@/lib/calculators/stub";
import { cutLength, decibels, frequency, impedance, inWords, scaled } from "@/lib/format/quantity";

const path = "/calculate/stub";

interface Props {
  opened: OpenedCalculator<typeof stubInputs>;
  canStartRun: boolean;
}

/** A stub of a cable, the stub for a reactance, and a quarter-wave section. */
export function StubCalculator({ opened, canStartRun }: Props) {
  const calculator = useCalculator({ path, inputs: stubInputs, compute: stubAndSection }, opened);
  const { texts, values, result } = calculator;
  const start = newRunAddress(texts, {
    frequency: texts.frequency ?? "",
    source: texts.across ?? "",
    load: texts.across ?? "",
    stub: result ? `${Number(result.stub.lengthM.toPrecision(6))} m` : "",
    stubEnd: values.end,
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
          <HalfWaveStrip line={result.line} wavelengthM={result.spot.wavelengthM} name={spoken(result)} />
        </div>
      )}
      <div className="mt-3">
        <Leaf name="The cable" notchX={160}>
          <div className="flex flex-wrap items-start gap-3">
            <LineFields of={calculator} />
            <InputField of={calculator} name="frequency" />
            <InputField of={calculator} name="temperature" />
          </div>
        </Leaf>
      </div>
      {result && (
        <Results calculator={calculator}>
          <div className="grid grid-cols-3 gap-x-8 gap-y-8 folded:grid-cols-2 phone:grid-cols-1">
            <StubColumn calculator={calculator} result={result} />
            <ReactanceColumn calculator={calculator} result={result} />
            <SectionColumn calculator={calculator} result={result} />
          </div>
          <Cautions
            cautions={[
              ...entryCautions(result.line, values.frequency, values.temperature),
              ...modelCautions(result.line, result.spot),
              {
                weight: "none",
                text: "An open end radiates a little and counts for a little more length; keep it capped.",
              },
            ]}
          />
        </Results>
      )}
    </CalculatorFrame>
  );
}

function spoken({ line, spot }: StubAndSection): string {
  return `A half wave of ${line.label} at ${inWords(frequency(spot.frequency))} is ${inWords(cutLength(spot.wavelengthM / 2))}, a quarter ${inWords(cutLength(spot.wavelengthM / 4))}`;
}

function Head({ result }: { result: StubAndSection | null }) {
  const { stub, section } = result ?? {};
  return (
    <Readings className="min-w-0 flex-1 folded:w-full phone:grid phone:w-full phone:grid-cols-2 phone:gap-y-3">
      <Reading label="Stub" {...cutLength(stub?.lengthM)} />
      <Reading label="Its impedance" {...impedance(stub?.impedance, 2)} />
      <Reading label="Takes from the line" {...decibels(stub?.acrossDb)} target="between matched ends" />
      <Reading label="Section needed" {...scaled("resistance", section?.neededOhm, 3)} />
    </Readings>
  );
}
