"use client";

import { AxisY, axisScale, roundedFromZero, type AxisScale } from "@/components/plot/axes";
import { greatestIndex, nearestIndex, polyline, type Values } from "@/components/plot/curve";
import { usePlotPointer } from "@/components/plot/plot-pointer";
import { Readout } from "@/components/plot/readout";
import { envelope, isTooDense, rippleCount, type EnvelopePoint } from "@/components/plot/ripple";
import type { LineAxis } from "@/components/plot/line-axis";

export interface StandingWavePlotProps {
  /** the strip's own scale */
  scale: LineAxis;
  width: number;
  height?: number;
  /** metres from the source, ascending; a place where a part stands may come twice, before and behind it */
  distancesM: readonly number[];
  voltageV: Values;
  /** already times `referenceOhm`, so that both share one axis */
  currentTimesReferenceV: Values;
  /** "Current × 50 Ω" */
  currentName: string;
  /** "40.2 V", "0.80 A" */
  greatestVoltage: string;
  greatestCurrent: string;
  /** figures at one place: value, volts and volts of the current, to the words of the read-out */
  readout: (index: number) => string[];
  format: (value: number) => string;
}

type Point = { x: number; y: number } | null;

/** Where the values of a wave stand. Of two samples at one place the first stands before the part there. */
function placeWave(scale: LineAxis, y: AxisScale, distancesM: readonly number[], values: Values) {
  const at = (index: number, valueIndex = index): Point => {
    const [m, value] = [distancesM[index], values[valueIndex]];
    if (m === undefined || value === null || value === undefined) return null;
    return { x: distancesM[index + 1] === m ? scale.xBefore(m) : scale.x(m), y: y(value) };
  };
  const isDense = isTooDense(values, scale.endX - scale.startX);
  const { upper, lower } = envelope(values);
  const line = (points: EnvelopePoint[]) => points.map(({ atIndex, valueIndex }) => at(atIndex, valueIndex));
  const top = isDense ? line(upper) : values.map((_, i) => at(i));
  return { at, isDense, top, bottom: isDense ? line(lower) : [] };
}

type PlacedWave = ReturnType<typeof placeWave>;

function Wave({ wave, colour, isThin }: { wave: PlacedWave; colour: string; isThin: boolean }) {
  if (!wave.isDense)
    return (
      <path
        d={polyline(wave.top)}
        fill="none"
        stroke={colour}
        strokeWidth={isThin ? 1.1 : 1.75}
        opacity={isThin ? 0.85 : 1}
        strokeLinejoin="round"
      />
    );
  return (
    <g fill="none" stroke={colour} strokeWidth={isThin ? 1 : 1.5} strokeDasharray={isThin ? "7 3" : undefined}>
      {!isThin && (
        <path
          d={`${polyline([...wave.top, ...wave.bottom.toReversed()])}Z`}
          fill={colour}
          stroke="none"
          opacity="0.18"
        />
      )}
      <path d={polyline(wave.top)} />
      <path d={polyline(wave.bottom)} />
    </g>
  );
}

interface SeriesNameProps {
  x: number;
  y: number;
  colour: string;
  name: string;
  greatest: string;
}

function SeriesName({ x, y, colour, name, greatest }: SeriesNameProps) {
  return (
    <>
      <text x={x} y={y} style={{ fill: colour, fontWeight: 600 }}>
        {name}
      </text>
      <text x={x} y={y + 14}>
        <tspan className="figures">{greatest.split(" ")[0]}</tspan> {greatest.split(" ").slice(1).join(" ")} max
      </text>
    </>
  );
}

/** Voltage and current along the line, on the strip's own x-axis. */
export function StandingWavePlot(props: StandingWavePlotProps) {
  const { scale, width, height = 146, distancesM, voltageV, currentTimesReferenceV, format } = props;
  const [top, bottom] = [8, height - 5];
  const domain = roundedFromZero([...voltageV, ...currentTimesReferenceV]);
  const y = axisScale("linear", domain, [bottom, top]);
  const voltage = placeWave(scale, y, distancesM, voltageV);
  const current = placeWave(scale, y, distancesM, currentTimesReferenceV);
  const greatest = voltage.at(greatestIndex(voltageV));
  const { cursor, handlers } = usePlotPointer("distance", {
    fromPx: scale.startX,
    toPx: scale.endX,
    toValue: scale.m,
    toPxOf: scale.x,
    width,
  });
  const pointed = cursor === null ? -1 : nearestIndex(distancesM, cursor);
  const area = polyline(voltage.top).replaceAll("M", "L");
  return (
    <svg
      {...handlers}
      tabIndex={0}
      width="100%"
      height={height}
      viewBox={`0 0 ${width} ${height}`}
      className="block touch-pan-y overflow-visible"
    >
      {scale.boundariesX.map((x) => (
        <path key={x} d={`M${x} 0V${height}`} stroke="var(--line)" />
      ))}
      <AxisY scale={y} ticks={y.ticks(5)} format={format} fromX={scale.startX} toX={scale.endX} />
      {area && (
        <path
          d={`M${scale.startX} ${bottom}${area}L${scale.endX} ${bottom}Z`}
          fill="var(--copper-wash)"
          opacity="0.55"
        />
      )}
      <Wave wave={current} colour="var(--series-2)" isThin />
      <Wave wave={voltage} colour="var(--series-1)" isThin={false} />
      {voltage.isDense && (
        <text x={scale.startX + 8} y={bottom - 8}>
          {rippleCount(voltageV)} ripples; drawn as the curves that hold them
        </text>
      )}
      {greatest && (
        <circle
          cx={greatest.x}
          cy={greatest.y}
          r="3.2"
          fill="var(--paper)"
          stroke="var(--series-1)"
          strokeWidth="1.6"
        />
      )}
      <SeriesName x={scale.endX + 8} y={18} colour="var(--series-1)" name="Voltage" greatest={props.greatestVoltage} />
      <SeriesName
        x={scale.endX + 8}
        y={54}
        colour="var(--series-2)"
        name={props.currentName}
        greatest={props.greatestCurrent}
      />
      {pointed >= 0 && cursor !== null && (
        <Readout
          x={scale.x(cursor)}
          fromY={0}
          toY={height}
          limits={[scale.startX, scale.endX]}
          words={props.readout(pointed)}
        />
      )}
    </svg>
  );
}
