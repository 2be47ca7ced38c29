"use client";

import { CableLengthwise } from "@/components/line/cable-lengthwise";
import type { DrawnCable } from "@/components/line/cable-shape";
import { CutWords, Dimension } from "@/components/line/dimension";
import { SeriesPart, ShuntPart } from "@/components/line/symbols";
import { useMeasuredWidth } from "@/components/plot/measured-width";
import { scaled, significantDigits } from "@/lib/format/quantity";
import type { NominalFigures } from "@/lib/line/cable";
import { permittivityOf } from "@/lib/line/per-length";
import { coaxRatio } from "@/lib/line/proportions";

/** px */
const height = 176;
const margin = 46;
const cableY = 52;
const railY = 112;

/** The coaxial line that has these figures, in its own proportions; a dashed one where no coaxial cable could be so. */
function drawn(figures: NominalFigures): DrawnCable {
  const ratio = coaxRatio(figures.z0, figures.velocityFactor);
  const isBuildable = ratio > 1.3 && ratio < 40;
  return {
    construction: isBuildable
      ? {
          kind: "coax",
          innerMm: 6 / ratio,
          dielectricMm: 6,
          relativePermittivity: permittivityOf(figures.velocityFactor),
          lossTangent: 0,
        }
      : null,
    build: null,
    outerDiameterMm: 8,
  };
}

/** One metre of a line: as a cable with its delay, and as the coil and the capacitor that every metre of it is. */
export function MetreDrawing({ figures, name }: { figures: NominalFigures; name: string }) {
  const { ref, width } = useMeasuredWidth(900);
  const [fromX, toX] = [margin, Math.min(width, 980) - margin];
  const span = toX - fromX;
  const [coilX, capacitorX] = [fromX + span * 0.36, fromX + span * 0.68];
  const delay = significantDigits(figures.delay * 1e9, 4);
  return (
    <div ref={ref}>
      <svg width={width} height={height} role="img" aria-label={name} className="block overflow-visible">
        <Dimension fromX={fromX} toX={toX} y={24} figure={{ digits: "1", unit: "m" }} note={`${delay} ns`} />
        <CableLengthwise {...drawn(figures)} fromX={fromX} toX={toX} y={cableY} mmToPx={3.4} />
        <path
          d={`M${fromX} ${railY}H${coilX - 29}M${coilX + 29} ${railY}H${toX}M${fromX} ${railY + 44}H${toX}`}
          stroke="var(--ink)"
          strokeWidth="1.6"
        />
        <path
          d={`M${fromX} ${cableY + 20}V${railY + 44}M${toX} ${cableY + 20}V${railY + 44}`}
          stroke="var(--line)"
          strokeDasharray="2 3"
        />
        <SeriesPart x={coilX} y={railY} part="coil" />
        <CutWords x={coilX} y={railY - 16} figure={scaled("inductance", figures.inductance, 4)} />
        <ShuntPart x={capacitorX} y={railY} part="capacitor" half={0} />
        <path d={`M${capacitorX} ${railY + 34}v10`} stroke="var(--ink)" strokeWidth="1.8" />
        <CutWords
          x={capacitorX + 16}
          y={railY + 24}
          figure={scaled("capacitance", figures.capacitance, 4)}
          anchor="start"
        />
        <text x={fromX} y={height - 4}>
          what a metre of it is, without loss
        </text>
      </svg>
    </div>
  );
}
