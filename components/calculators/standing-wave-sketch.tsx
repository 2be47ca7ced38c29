"use client";

import { CableLengthwise } from "@/components/line/cable-lengthwise";
import { plainCoax } from "@/components/line/cut-drawing";
import { CutWords } from "@/components/line/dimension";
import { LoadSymbol, SourceSymbol } from "@/components/line/end-symbols";
import { BreakMark } from "@/components/line/symbols";
import { useMeasuredWidth } from "@/components/plot/measured-width";
import type { MismatchResult, PlaneReading } from "@/lib/calculators/mismatch";
import { decibels, scaled, type Figure } from "@/lib/format/quantity";
import { complex } from "@/lib/line/complex";
import { standingVoltage } from "@/lib/line/mismatched-power";

interface Props {
  result: MismatchResult;
  /** matched loss of the line between, dB */
  lossDb: number;
  name: string;
}

const axisY = 66;
const waveTop = 104;
const waveHeight = 84;
const height = waveTop + waveHeight + 24;
/** Wavelengths before the load that are drawn. */
const drawnWaves = 1.5;

interface WavesProps {
  x: number;
  reading: PlaneReading;
  isEnd: boolean;
  isNarrow: boolean;
}

/** A wave toward the load over the line, and one back under it, with their powers. */
function Waves({ x, reading, isEnd, isNarrow }: WavesProps) {
  const reach = isNarrow ? 26 : 62;
  const [from, to] = isEnd ? [x - reach, x] : [x, x + reach];
  const words = isEnd ? "end" : "start";
  const at = isEnd ? from - 6 : to + 6;
  return (
    <g>
      <path d={`M${from} ${axisY - 22}H${to}m-7 -4l7 4l-7 4`} fill="none" stroke="var(--series-1)" strokeWidth="1.75" />
      <CutWords x={at} y={axisY - 18} figure={scaled("power", reading.forwardW, 3)} anchor={words} />
      {reading.magnitude > 0 && (
        <>
          <path
            d={`M${to} ${axisY + 22}H${from}m7 -4l-7 4l7 4`}
            fill="none"
            stroke="var(--series-2)"
            strokeWidth="1.75"
          />
          <CutWords
            x={at}
            y={axisY + 26}
            figure={scaled("power", reading.reflectedW, 3)}
            note={isNarrow ? undefined : "back"}
            anchor={words}
          />
        </>
      )}
    </g>
  );
}

/** The voltage over the last stretch before the load, between its highest and its lowest. */
function Pattern({ result, fromX, toX }: { result: MismatchResult; fromX: number; toX: number }) {
  const { gamma, magnitude, load } = result;
  const greatest = 1 + magnitude;
  const y = (relative: number) => waveTop + waveHeight * (1 - relative / (greatest * 1.08));
  const steps = Array.from({ length: 121 }, (_, k) => k / 120);
  const path = steps
    .map((share) => {
      const relative = standingVoltage(gamma ?? complex(magnitude), drawnWaves * (1 - share));
      return `${(fromX + (toX - fromX) * share).toFixed(1)} ${y(relative).toFixed(1)}`;
    })
    .join("L");
  const mark = (relative: number, figure: Figure, note: string) => (
    <g>
      <path d={`M${fromX} ${y(relative).toFixed(1)}H${toX}`} stroke="var(--line)" strokeDasharray="2 3" />
      <CutWords x={fromX - 8} y={Number(y(relative).toFixed(1)) + 4} figure={figure} note={note} anchor="end" />
    </g>
  );
  return (
    <g>
      <path d={`M${fromX} ${y(0).toFixed(1)}H${toX}`} stroke="var(--rule)" />
      {mark(greatest, scaled("voltage", load.extremes.highestV, 3), "rms")}
      {magnitude > 0.04 && mark(1 - magnitude, scaled("voltage", load.extremes.lowestV, 3), "rms")}
      <path d={`M${path}`} fill="none" stroke="var(--series-1)" strokeWidth="1.75" />
      <text x={toX} y={height - 4} textAnchor="end">
        {gamma ? "voltage over the last 1.5 λ" : "voltage over 1.5 λ; where the maxima lie depends on the load"}
      </text>
    </g>
  );
}

/** A line with a mismatch at its end: the powers at both ends, and the standing wave before the load. */
export function StandingWaveSketch({ result, lossDb, name }: Props) {
  const { ref, width } = useMeasuredWidth(1384);
  const isNarrow = width < 600;
  const [fromX, toX] = [46, width - 40];
  const breakX = fromX + (toX - fromX) * (isNarrow ? 0.44 : 0.3);
  return (
    <div ref={ref}>
      <svg width={width} height={height} role="img" aria-label={name} className="block overflow-visible">
        <SourceSymbol x={fromX} y={axisY} />
        <CableLengthwise {...plainCoax} fromX={fromX} toX={toX} y={axisY} mmToPx={2.7} />
        <LoadSymbol x={toX} y={axisY} kind="resistor" />
        {lossDb > 0 && (
          <g>
            <BreakMark x={breakX} y={axisY} half={8} />
            <CutWords x={breakX} y={axisY - 34} figure={decibels(lossDb)} note="one way" />
          </g>
        )}
        <text x={fromX} y="16" className="key">
          near end
        </text>
        <text x={toX + 16} y="16" textAnchor="end" className="key">
          load
        </text>
        <Waves x={fromX + 4} reading={result.near} isEnd={false} isNarrow={isNarrow} />
        <Waves x={toX - 4} reading={result.load} isEnd isNarrow={isNarrow} />
        <Pattern result={result} fromX={isNarrow ? fromX + 64 : breakX + 40} toX={toX} />
      </svg>
    </div>
  );
}
