"use client";

import { CableLengthwise, thickness } from "@/components/line/cable-lengthwise";
import { plainCoax } from "@/components/line/cut-drawing";
import { Dimension } from "@/components/line/dimension";
import { material } from "@/components/line/materials";
import { useMeasuredWidth } from "@/components/plot/measured-width";
import type { LengthResult } from "@/lib/calculators/length";
import { cutLength, significantDigits, withoutTrailingZeros } from "@/lib/format/quantity";

interface Props {
  result: LengthResult;
  name: string;
}

const cableY = 62;
const waveY = 128;
const amplitude = 26;
const height = 196;
/** Above this many wavelengths the wave is drawn as the band it fills. */
const mostWaves = 40;
/** Quarter marks are set while they are this far apart, px. */
const leastMarkPx = 26;

/** The band that too many waves to be told apart fill. */
function Envelope({ fromX, toX }: { fromX: number; toX: number }) {
  return (
    <g>
      <rect
        x={fromX}
        y={waveY - amplitude}
        width={toX - fromX}
        height={2 * amplitude}
        fill="var(--copper-wash)"
        stroke="var(--copper)"
      />
      <text x={(fromX + toX) / 2} y={waveY + 4} textAnchor="middle">
        too many waves to draw: the band they fill
      </text>
    </g>
  );
}

/** A sine from one end of the cable to the other, zero at its near end. */
function Wave({ fromX, toX, waves }: { fromX: number; toX: number; waves: number }) {
  if (waves > mostWaves) return <Envelope fromX={fromX} toX={toX} />;
  const count = Math.max(24, Math.ceil(waves * 24));
  const points = Array.from({ length: count + 1 }, (_, k) => {
    const share = k / count;
    const y = waveY - amplitude * Math.sin(2 * Math.PI * waves * share);
    return `${(fromX + (toX - fromX) * share).toFixed(1)} ${y.toFixed(1)}`;
  });
  return <path d={`M${points.join("L")}`} fill="none" stroke="var(--copper)" strokeWidth="1.75" />;
}

/** Marks at every quarter of a wavelength, named where there is room. */
function QuarterMarks({ fromX, toX, waves }: { fromX: number; toX: number; waves: number }) {
  const perQuarter = (toX - fromX) / (waves * 4);
  if (perQuarter < leastMarkPx) return null;
  const names = ["", "λ/4", "λ/2", "3λ/4"];
  return Array.from({ length: Math.floor(waves * 4 + 1e-9) }, (_, k) => {
    const [x, quarter] = [(fromX + perQuarter * (k + 1)).toFixed(1), k + 1];
    const word = quarter % 4 === 0 ? `${quarter === 4 ? "" : quarter / 4}λ` : quarter < 4 ? names[quarter] : "";
    return (
      <g key={quarter}>
        <path d={`M${x} ${waveY - amplitude}V${waveY + amplitude}`} stroke="var(--line)" />
        <text x={x} y={waveY - amplitude - 4} textAnchor="middle">
          {word}
        </text>
      </g>
    );
  });
}

/** The cable to cut, what its ends count for, and the wave it holds. */
export function CutLengthSketch({ result, name }: Props) {
  const { ref, width } = useMeasuredWidth(1384);
  const { line, cutM, endsM, totalM, whole } = result;
  const cable = line.entry ?? plainCoax;
  const [fromX, toX] = [28, Math.min(width, 1100) - 28];
  const endPx = endsM > 0 ? Math.max(9, ((endsM / totalM) * (toX - fromX)) / 2) : 0;
  const [cutFrom, cutTo] = [fromX + endPx, toX - endPx];
  const mmToPx = Math.min(2.7, 36 / (cable.outerDiameterMm ?? 5));
  const half = thickness(cable, mmToPx) / 2;
  const short = (value: number) => withoutTrailingZeros(significantDigits(value, 4));
  const degrees = short((whole.phaseRad * 180) / Math.PI);
  return (
    <div ref={ref}>
      <svg width={width} height={height} role="img" aria-label={name} className="block overflow-visible">
        <CableLengthwise {...cable} fromX={cutFrom} toX={cutTo} y={cableY} mmToPx={mmToPx} />
        {endsM > 0 &&
          [fromX, cutTo].map((x) => (
            <rect
              key={x}
              x={x}
              y={cableY - half}
              width={endPx}
              height={2 * half}
              fill={material.hatch}
              stroke="var(--rule)"
            />
          ))}
        <Dimension fromX={cutFrom} toX={cutTo} y={cableY - half - 14} figure={cutLength(cutM)} note="to cut" />
        <path d={`M${fromX} ${waveY}H${toX}`} stroke="var(--rule)" />
        <QuarterMarks fromX={fromX} toX={toX} waves={whole.wavelengths} />
        <Wave fromX={fromX} toX={toX} waves={whole.wavelengths} />
        <Dimension
          fromX={fromX}
          toX={toX}
          y={waveY + amplitude + 12}
          figure={{ digits: degrees, unit: "°" }}
          note={`${short(whole.wavelengths)} λ${endsM > 0 ? ", ends and all" : ""}`}
          isBelow
        />
      </svg>
    </div>
  );
}
