"use client";

import { CalculatorFrame, Results } from "@/components/calculators/calculator-frame";
import { Cautions } from "@/components/calculators/cautions";
import { FigureRows, type FigureRow } from "@/components/calculators/figure-rows";
import { InputField } from "@/components/calculators/input-field";
import { PlaneTable } from "@/components/calculators/plane-table";
import { StandingWaveSketch } from "@/components/calculators/standing-wave-sketch";
import { useCalculator, type OpenedCalculator } from "@/components/calculators/use-calculator";
import { Leaf } from "@/components/line/leaf";
import { Reading, Readings } from "@/components/ui/reading";
import { Section } from "@/components/ui/section";
import { voltageCautions, type Caution } from "@/lib/calculators/cautions";
import { mismatch, mismatchInputs, type MismatchResult } from "@/lib/calculators/mismatch";
import { newRunAddress } from "@/lib/calculators/start";
import { decibels, digits, ratio, scaled, significantDigits, type Figure } from "@/lib/format/quantity";
import { arg } from "@/lib/line/complex";

const path = "/calculate/mismatch";

interface Props {
  opened: OpenedCalculator<typeof mismatchInputs>;
  canStartRun: boolean;
}

/** One mismatch in all its figures. */
export function MismatchCalculator({ opened, canStartRun }: Props) {
  const calculator = useCalculator({ path, inputs: mismatchInputs, compute: mismatch }, opened);
  const { values, texts, result } = calculator;
  if (!result) return null;
  const loadText = values.given === "load" ? (texts.load ?? "") : significantDigits(result.resistances.high, 4);
  const canStart = canStartRun && Number.isFinite(result.resistances.high);
  const start = newRunAddress({}, { source: texts.reference ?? "", load: loadText, power: texts.power ?? "" });
  return (
    <CalculatorFrame
      path={path}
      calculator={calculator}
      head={<Head result={result} />}
      start={canStart ? start : null}
    >
      <div className="mt-4">
        <StandingWaveSketch result={result} lossDb={values.loss} name={spoken(result)} />
      </div>
      <div className="mt-3">
        <Leaf name="The mismatch" notchX={160}>
          <div className="flex flex-wrap items-start gap-3">
            <InputField of={calculator} name="given" />
            <InputField of={calculator} name="vswr" />
            <InputField of={calculator} name="returnLoss" />
            <InputField of={calculator} name="gamma" />
            <InputField of={calculator} name="load" />
            <InputField of={calculator} name="reference" />
            <InputField of={calculator} name="loss" />
            <InputField of={calculator} name="power" />
            <InputField of={calculator} name="as" />
          </div>
        </Leaf>
      </div>
      <Results calculator={calculator}>
        <div className="grid grid-cols-[448px_minmax(0,1fr)] gap-x-10 gap-y-6 folded:grid-cols-1">
          <Section title="The mismatch" note="at the load">
            <FigureRows rows={rowsOf(result)} />
          </Section>
          <div>
            <PlaneTable result={result} lossDb={values.loss} given={values.as} />
            <Cautions cautions={cautionsOf(result, values.as)} />
          </div>
        </div>
      </Results>
    </CalculatorFrame>
  );
}

function spoken({ near, load }: MismatchResult): string {
  return `A line whose load has a VSWR of ${ratio(load.vswr).digits}; at the near end it reads ${ratio(near.vswr).digits}`;
}

/** Return loss of nothing reflected has no figure. */
const returnLoss = (value: number): Figure => decibels(Number.isFinite(value) ? value : null, 2);

function Head({ result: { load, near, magnitude, mismatchLossDb } }: { result: MismatchResult }) {
  const isHidden = near.magnitude < magnitude;
  return (
    <Readings className="min-w-0 flex-1 folded:w-full phone:grid phone:w-full phone:grid-cols-2 phone:gap-y-3">
      <Reading
        label="VSWR at the load"
        {...ratio(load.vswr)}
        target={isHidden ? `${ratio(near.vswr).digits} at the near end` : undefined}
      />
      <Reading
        label="Return loss"
        {...returnLoss(load.returnLossDb)}
        target={isHidden ? `${returnLoss(near.returnLossDb).digits} dB at the near end` : undefined}
      />
      <Reading
        label="Reflection"
        digits={digits(magnitude, 3)}
        target={`${digits(magnitude * magnitude * 100, 2)} % of the power`}
      />
      <Reading label="Mismatch loss" {...decibels(mismatchLossDb, 3)} />
    </Readings>
  );
}

const bare = (text: string, unit = ""): Figure => ({ digits: text, unit, spoken: unit });

function rowsOf(result: MismatchResult): FigureRow[] {
  const { gamma, magnitude, resistances, rating, maximumAt, load, mismatchLossDb, rippleDb } = result;
  const angle = gamma && magnitude > 0 ? (arg(gamma) * 180) / Math.PI : null;
  const rows: FigureRow[] = [
    { label: "VSWR", figure: ratio(load.vswr, 3), isStrong: true },
    { label: "Return loss", figure: returnLoss(load.returnLossDb), isStrong: true },
    { label: "Reflection coefficient", figure: bare(digits(magnitude, 4)), isStrong: true },
    ...(angle === null ? [] : [{ label: "its angle", figure: bare(digits(angle, 1), "°") }]),
    { label: "Reflected power", figure: bare(digits(magnitude * magnitude * 100, 3), "%") },
    { label: "Mismatch loss", figure: decibels(mismatchLossDb, 3), note: "of what a matched load would take" },
    { label: "Resistive load above the line", figure: scaled("resistance", resistances.high) },
    { label: "and below it", figure: scaled("resistance", resistances.low) },
    ...(maximumAt === null
      ? []
      : [{ label: "First voltage maximum", figure: bare(digits(maximumAt, 4), "λ"), note: "before the load" }]),
    {
      label: "Ripple between two of these",
      figure: decibels(rippleDb, 3),
      note: "most that a transmission swings over frequency",
    },
    {
      label: "Rating left, of forward power",
      figure: bare(digits(rating.forward * 100, 1), "%"),
      note: "for the highest voltage of a matched line, 1/(1 + Γ)²",
    },
    { label: "Rating left, of net power", figure: bare(digits(rating.net * 100, 1), "%"), note: "the same, 1/VSWR" },
  ];
  return rows;
}

function cautionsOf({ near, load, magnitude }: MismatchResult, as: "forward" | "net"): Caution[] {
  const highest = Math.max(near.extremes.highestV, load.extremes.highestV);
  const total: Caution[] =
    as === "net" && !Number.isFinite(near.forwardW)
      ? [{ weight: "fail", text: "A line that reflects everything takes no net power: give the forward power." }]
      : [];
  const hidden: Caution[] =
    magnitude - near.magnitude > 0.05
      ? [
          {
            weight: "warn",
            text: `The near end shows ${ratio(near.vswr).digits} only because the loss of the line hides a load of ${ratio(load.vswr).digits}.`,
          },
        ]
      : [];
  return [...total, ...hidden, ...(Number.isFinite(highest) ? voltageCautions(highest, "on the line") : [])];
}
