"use client";

import { CableLengthwise, thickness } from "@/components/line/cable-lengthwise";
import { plainCoax } from "@/components/line/cut-drawing";
import { Dimension } from "@/components/line/dimension";
import { useMeasuredWidth } from "@/components/plot/measured-width";
import type { ChosenLine } from "@/lib/calculators/line-inputs";
import { cutLength } from "@/lib/format/quantity";

interface Props {
  line: ChosenLine;
  wavelengthM: number;
  name: string;
}

const cableY = 54;
const height = 100;

/** Half a wavelength of the cable, and a quarter of one on it. */
export function HalfWaveStrip({ line, wavelengthM, name }: Props) {
  const { ref, width } = useMeasuredWidth(1384);
  const cable = line.entry ?? plainCoax;
  const [fromX, toX] = [28, Math.min(width, 1100) - 28];
  const mmToPx = Math.min(2.7, 34 / (cable.outerDiameterMm ?? 5));
  const half = thickness(cable, mmToPx) / 2;
  const middle = (fromX + toX) / 2;
  return (
    <div ref={ref}>
      <svg width={width} height={height} role="img" aria-label={name} className="block overflow-visible">
        <CableLengthwise {...cable} fromX={fromX} toX={toX} y={cableY} mmToPx={mmToPx} />
        <path d={`M${middle} ${cableY - half - 4}v${2 * half + 8}`} stroke="var(--ink)" strokeDasharray="2 3" />
        <Dimension
          fromX={fromX}
          toX={middle}
          y={cableY - half - 12}
          figure={cutLength(wavelengthM / 4)}
          note="quarter wave"
        />
        <Dimension
          fromX={fromX}
          toX={toX}
          y={cableY + half + 12}
          figure={cutLength(wavelengthM / 2)}
          note="half wave"
          isBelow
        />
      </svg>
    </div>
  );
}
