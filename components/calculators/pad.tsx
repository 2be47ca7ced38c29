"use client";

import { CalculatorFrame, Results } from "@/components/calculators/calculator-frame";
import { Cautions } from "@/components/calculators/cautions";
import { InputField } from "@/components/calculators/input-field";
import { PadColumn } from "@/components/calculators/pad-column";
import { useCalculator, type Calculator, type OpenedCalculator } from "@/components/calculators/use-calculator";
import { Box } from "@/components/line/symbols";
import { LoadSymbol, SourceSymbol } from "@/components/line/end-symbols";
import { CableLengthwise } from "@/components/line/cable-lengthwise";
import { plainCoax } from "@/components/line/cut-drawing";
import { CutWords } from "@/components/line/dimension";
import { Leaf } from "@/components/line/leaf";
import { useMeasuredWidth } from "@/components/plot/measured-width";
import { Button } from "@/components/ui/button";
import { Reading, Readings } from "@/components/ui/reading";
import type { Caution } from "@/lib/calculators/cautions";
import { pad, padInputs, type PadResult } from "@/lib/calculators/pad";
import { newRunAddress } from "@/lib/calculators/start";
import { decibels, digits, inWords, scaled, trimmed, withoutTrailingZeros } from "@/lib/format/quantity";
import { minimumPadLossDb } from "@/lib/line/pad";

const path = "/calculate/pad";

interface Props {
  opened: OpenedCalculator<typeof padInputs>;
  canStartRun: boolean;
}

/** A resistive pad between two resistances. */
export function PadCalculator({ opened, canStartRun }: Props) {
  const calculator = useCalculator({ path, inputs: padInputs, compute: pad }, opened);
  const { values, attempted, texts, result } = calculator;
  const { ref, width } = useMeasuredWidth(1384);
  // Of the resistances as typed: the result may still be that of others.
  const leastDb = minimumPadLossDb(attempted.source, attempted.load);
  const lossDb = result?.isLeast ? result.leastDb : values.loss;
  const start = newRunAddress(
    {},
    {
      source: texts.source ?? "",
      load: texts.load ?? "",
      pad: `${Number(lossDb.toPrecision(8))} dB`,
      power: texts.power ?? "",
    },
  );
  return (
    <CalculatorFrame
      path={path}
      calculator={calculator}
      head={<Head result={result} leastDb={leastDb} />}
      start={canStartRun && result ? start : null}
    >
      <div ref={ref} className="mt-4">
        <PadOnLine width={width} sourceOhm={values.source} loadOhm={values.load} lossDb={lossDb} />
      </div>
      <div className="mt-3">
        <PadFields calculator={calculator} leastDb={leastDb} notchX={padPlace(width).middle} />
      </div>
      {result && (
        <Results calculator={calculator}>
          <div className="grid grid-cols-2 gap-x-10 gap-y-8 folded:grid-cols-1">
            {result.shapes.map((shape) => (
              <PadColumn
                key={shape.topology}
                shape={shape}
                sourceOhm={values.source}
                loadOhm={values.load}
                lossDb={lossDb}
              />
            ))}
          </div>
          <Cautions cautions={cautionsOf(result, values.power)} />
        </Results>
      )}
    </CalculatorFrame>
  );
}

interface PadFieldsProps {
  calculator: Calculator<typeof padInputs, PadResult>;
  leastDb: number;
  notchX: number;
}

function PadFields({ calculator, leastDb, notchX }: PadFieldsProps) {
  const isLeast = calculator.result?.isLeast && calculator.problems.loss === undefined;
  return (
    <Leaf name="The pad" notchX={notchX}>
      <div className="flex flex-wrap items-start gap-3">
        <InputField of={calculator} name="loss" />
        <InputField of={calculator} name="source" />
        <InputField of={calculator} name="load" />
        <InputField of={calculator} name="power" />
        {leastDb > 0 && !isLeast && (
          <Button
            kind="quiet"
            className="self-center"
            onClick={() => calculator.set("loss", String(Number(leastDb.toFixed(3))))}
          >
            Take the least loss, {inWords(decibels(leastDb))}
          </Button>
        )}
      </div>
    </Leaf>
  );
}

function Head({ result, leastDb }: { result: PadResult | null; leastDb: number }) {
  const share = result && result.shapes[0].exact;
  const most = result ? Math.max(...result.shapes.flatMap(({ standard }) => standard.powersW)) : null;
  return (
    <Readings className="min-w-0 flex-1 folded:w-full phone:grid phone:w-full phone:grid-cols-2 phone:gap-y-3">
      <Reading label="Least loss possible" {...decibels(leastDb)} target={result?.isLeast ? "this is it" : undefined} />
      <Reading label="Power in the load" {...scaled("power", share?.loadW, 3)} />
      <Reading label="Hottest resistor" {...scaled("power", most, 3)} target="of the E24 values" />
    </Readings>
  );
}

/** Where the line with the pad begins and ends, and the pad's middle, px. */
function padPlace(width: number) {
  const [fromX, toX] = [58, Math.min(width, 760) - 30];
  return { fromX, toX, middle: (fromX + toX) / 2 };
}

interface PadOnLineProps {
  width: number;
  sourceOhm: number;
  loadOhm: number;
  lossDb: number;
}

/** The pad where it stands: between two lines of the two resistances. */
function PadOnLine({ width, sourceOhm, loadOhm, lossDb }: PadOnLineProps) {
  const { fromX, toX, middle } = padPlace(width);
  const y = 36;
  const ohms = (value: number) => trimmed(scaled("resistance", value, 4));
  return (
    <svg
      width={width}
      height="74"
      role="img"
      aria-label={`A pad of ${digits(lossDb, 2)} decibels between ${inWords(ohms(sourceOhm))} and ${inWords(ohms(loadOhm))}`}
      className="block overflow-visible"
    >
      <SourceSymbol x={fromX} y={y} />
      <CableLengthwise {...plainCoax} fromX={fromX} toX={middle - 40} y={y} mmToPx={2.7} />
      <CableLengthwise {...plainCoax} fromX={middle + 40} toX={toX} y={y} mmToPx={2.7} />
      <Box x={middle} y={y} inside={`${withoutTrailingZeros(digits(lossDb, 2))} dB`} width={80} />
      <LoadSymbol x={toX} y={y} kind="resistor" />
      <CutWords x={(fromX + middle - 40) / 2} y={y + 32} figure={ohms(sourceOhm)} />
      <CutWords x={(middle + 40 + toX) / 2} y={y + 32} figure={ohms(loadOhm)} />
    </svg>
  );
}

function cautionsOf({ isLeast, shapes }: PadResult, watts: number): Caution[] {
  const hottest = Math.max(...shapes.flatMap(({ standard }) => standard.powersW));
  const cautions: Caution[] = [];
  if (watts > 0)
    cautions.push({
      weight: "none",
      text: `Resistors run cool and true at half their rating or less: take at least ${inWords(scaled("power", 2 * hottest, 2))} where the hottest stands.`,
    });
  if (isLeast)
    cautions.push({
      weight: "none",
      text: "At the least loss only two resistors are left, and T and pi are the same.",
    });
  cautions.push({
    weight: "none",
    text: "The E24 figures are those of exact resistors; a tolerance of 5 % can move return loss and loss further than the rounding does.",
  });
  return cautions;
}
