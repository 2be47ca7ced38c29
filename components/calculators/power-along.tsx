"use client";

import { CableLengthwise, thickness } from "@/components/line/cable-lengthwise";
import { plainCoax } from "@/components/line/cut-drawing";
import { Dimension } from "@/components/line/dimension";
import { LoadSymbol, SourceSymbol } from "@/components/line/end-symbols";
import { useMeasuredWidth } from "@/components/plot/measured-width";
import type { CableLine } from "@/lib/cables/line";
import { digits, metres, significantDigits, trimmed } from "@/lib/format/quantity";
import { powerShare } from "@/lib/line/decibels";

interface Props {
  cable: CableLine | null;
  lengthM: number;
  lossDb: number;
  name: string;
}

const cableY = 60;
const areaTop = 96;
const areaHeight = 76;
const height = areaTop + areaHeight + 22;
const mostMarks = 6;

/** What arrives of a power, per cent, to three digits; next to nothing is said so. */
export function percentOf(share: number): string {
  const percent = share * 100;
  return percent < 0.01 ? "under 0.01" : significantDigits(percent, 3);
}

/** Losses at which a mark stands: round ones, few enough to be read. */
function marksOf(lossDb: number): number[] {
  const step = [1, 3, 10, 30, 100, 300, 1000, 3000].find((db) => lossDb / db <= mostMarks) ?? 10_000;
  const count = Math.floor(lossDb / step + 1e-9);
  return Array.from({ length: count }, (_, k) => (k + 1) * step);
}

/** A length of cable, and under it the power that is left of what goes in. */
export function PowerAlong({ cable, lengthM, lossDb, name }: Props) {
  const { ref, width } = useMeasuredWidth(1384);
  const drawn = cable ?? plainCoax;
  const isNarrow = width < 600;
  const [fromX, toX] = [isNarrow ? 46 : 68, width - (isNarrow ? 28 : 82)];
  const span = Math.max(1, toX - fromX);
  const mmToPx = Math.min(2.7, 40 / (drawn.outerDiameterMm ?? 5));
  const shareAt = (share: number) => powerShare(lossDb * share);
  const y = (share: number) => areaTop + areaHeight * (1 - shareAt(share));
  const steps = Array.from({ length: 241 }, (_, k) => k / 240);
  const edge = steps.map((share) => `${(fromX + span * share).toFixed(1)} ${y(share).toFixed(1)}`).join("L");
  const bottom = areaTop + areaHeight;
  const marks = marksOf(lossDb);
  return (
    <div ref={ref}>
      <svg width={width} height={height} role="img" aria-label={name} className="block overflow-visible">
        <SourceSymbol x={fromX} y={cableY} />
        <CableLengthwise {...drawn} fromX={fromX} toX={toX} y={cableY} mmToPx={mmToPx} />
        <LoadSymbol x={toX} y={cableY} kind="resistor" />
        <Dimension
          fromX={fromX}
          toX={toX}
          y={cableY - thickness(drawn, mmToPx) / 2 - 12}
          figure={trimmed(metres(lengthM, 3))}
          note={cable?.designation ?? "typed cable"}
        />
        <path d={`M${fromX} ${bottom}L${edge}L${toX} ${bottom}Z`} fill="var(--copper-wash)" />
        <path d={`M${edge}`} fill="none" stroke="var(--copper)" strokeWidth="1.75" />
        <path d={`M${fromX} ${bottom}H${toX}`} stroke="var(--rule)" />
        {marks.map((db) => {
          const x = (fromX + (span * db) / lossDb).toFixed(1);
          return (
            <g key={db}>
              <path d={`M${x} ${y(db / lossDb).toFixed(1)}V${bottom + 4}`} stroke="var(--rule)" />
              <text x={x} y={bottom + 16} textAnchor="middle" className="figures">
                {digits(db, 0)} dB
              </text>
            </g>
          );
        })}
        <text x={fromX - 6} y={areaTop + 6} textAnchor="end" className="figures">
          100 %
        </text>
        <text x={toX} y={Math.min(y(1) - 6, bottom - 6)} textAnchor="end" className="figures key">
          {percentOf(shareAt(1))} %
        </text>
      </svg>
    </div>
  );
}
