/** The small drawings of the calculators' index: the thing each of them is about. Decoration beside its name. */
import type { ReactNode } from "react";
import { CableLengthwise } from "@/components/line/cable-lengthwise";
import { plainCoax } from "@/components/line/cut-drawing";
import { LoadSymbol, SourceSymbol } from "@/components/line/end-symbols";
import { Box, SeriesPart, ShuntPart, Tee } from "@/components/line/symbols";
import type { CalculatorPath } from "@/lib/calculators/places";
import { complex } from "@/lib/line/complex";
import { powerShare } from "@/lib/line/decibels";
import { standingVoltage } from "@/lib/line/mismatched-power";

const [width, height] = [330, 92];
const mmToPx = 2.4;
const steps = Array.from({ length: 61 }, (_, k) => k / 60);

/** A curve of a function of 0 to 1 between two places. */
function Curve({ from, to, y }: { from: number; to: number; y: (share: number) => number }) {
  const points = steps.map((share) => `${(from + (to - from) * share).toFixed(1)} ${y(share).toFixed(1)}`);
  return <path d={`M${points.join("L")}`} fill="none" stroke="var(--copper)" strokeWidth="1.75" />;
}

function Ends({ from, to, y }: { from: number; to: number; y: number }) {
  return <path d={`M${from} ${y - 4}v8M${to} ${y - 4}v8M${from} ${y}H${to}`} stroke="var(--ink)" fill="none" />;
}

const drawings: Record<CalculatorPath, ReactNode> = {
  "/calculate/per-length": (
    <>
      <Ends from={20} to={310} y={12} />
      <CableLengthwise {...plainCoax} fromX={20} toX={310} y={30} mmToPx={mmToPx} />
      <path d="M20 58H91M149 58H310" stroke="var(--ink)" strokeWidth="1.6" />
      <SeriesPart x={120} y={58} part="coil" />
      <ShuntPart x={220} y={58} part="capacitor" half={0} />
    </>
  ),
  "/calculate/attenuation": (
    <>
      <CableLengthwise {...plainCoax} fromX={20} toX={310} y={22} mmToPx={mmToPx} />
      <path
        d={`M20 86L${steps.map((share) => `${(20 + 290 * share).toFixed(1)} ${(86 - 46 * powerShare(6 * share)).toFixed(1)}`).join("L")}L310 86Z`}
        fill="var(--copper-wash)"
      />
      <Curve from={20} to={310} y={(share) => 86 - 46 * powerShare(6 * share)} />
    </>
  ),
  "/calculate/mismatch": (
    <>
      <CableLengthwise {...plainCoax} fromX={20} toX={292} y={22} mmToPx={mmToPx} />
      <LoadSymbol x={292} y={22} kind="antenna" />
      <Curve from={20} to={292} y={(share) => 88 - 26 * standingVoltage(complex(-0.5), 1.6 * (1 - share))} />
      <path d="M20 88H292" stroke="var(--rule)" />
    </>
  ),
  "/calculate/length": (
    <>
      <Ends from={20} to={310} y={10} />
      <CableLengthwise {...plainCoax} fromX={20} toX={310} y={28} mmToPx={mmToPx} />
      <path d="M20 66H310" stroke="var(--rule)" />
      <Curve from={20} to={310} y={(share) => 66 - 20 * Math.sin(2.5 * Math.PI * share)} />
    </>
  ),
  "/calculate/stub": (
    <>
      <CableLengthwise {...plainCoax} fromX={20} toX={300} y={24} mmToPx={mmToPx} />
      <g transform="rotate(90 170 24)">
        <CableLengthwise {...plainCoax} fromX={176} toX={226} y={24} mmToPx={mmToPx} />
      </g>
      <path d="M160 76h20" stroke="var(--ink)" strokeWidth="3" />
      <Tee x={170} y={24} />
      <LoadSymbol x={300} y={24} kind="resistor" />
    </>
  ),
  "/calculate/pad": (
    <>
      <SourceSymbol x={62} y={46} />
      <CableLengthwise {...plainCoax} fromX={62} toX={130} y={46} mmToPx={mmToPx} />
      <CableLengthwise {...plainCoax} fromX={200} toX={296} y={46} mmToPx={mmToPx} />
      <Box x={165} y={46} inside="10 dB" width={70} />
      <LoadSymbol x={296} y={46} kind="resistor" />
    </>
  ),
};

export function Vignette({ path }: { path: CalculatorPath }) {
  return (
    <svg viewBox={`0 0 ${width} ${height}`} width="100%" aria-hidden="true" className="block max-w-90 overflow-visible">
      {drawings[path]}
    </svg>
  );
}
