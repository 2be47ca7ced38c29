"use client";

import { AxisY, axisScale, roundedFromZero, type AxisScale } from "@/components/plot/axes";
import { greatestIndex, nearestIndex, type Values } from "@/components/plot/curve";
import type { LineAxis } from "@/components/plot/line-axis";
import { usePlotPointer } from "@/components/plot/plot-pointer";
import { Readout } from "@/components/plot/readout";
import { rippleCount } from "@/components/plot/ripple";
import { GreatestRing, waveForm, WavePath } from "@/components/plot/wave-path";

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

/** Where a value stands. Of two samples at one distance the first stands before the part there. */
function placer(scale: LineAxis, y: AxisScale, distancesM: readonly number[], values: Values) {
  return (index: number, valueIndex = index) => {
    const [m, value] = [distancesM[index], values[valueIndex]];
    if (m === undefined || value === null || value === undefined) return null;
    return { x: distancesM[index + 1] === m ? scale.xBefore(m) : scale.x(m), y: y(value) };
  };
}

interface WavesProps {
  props: StandingWavePlotProps;
  y: AxisScale;
  bottom: number;
}

/** Both waves over the wash of the voltage. */
function Waves({ props, y, bottom }: WavesProps) {
  const { scale, distancesM, voltageV, currentTimesReferenceV } = props;
  const lengthPx = scale.endX - scale.startX;
  const atVoltage = placer(scale, y, distancesM, voltageV);
  const voltage = waveForm(voltageV, lengthPx, atVoltage);
  const current = waveForm(currentTimesReferenceV, lengthPx, placer(scale, y, distancesM, currentTimesReferenceV));
  const wash = `M${scale.startX} ${bottom}${voltage.upper.replaceAll("M", "L")}L${scale.endX} ${bottom}Z`;
  return (
    <g>
      {voltage.upper && <path d={wash} fill="var(--copper-wash)" opacity="0.55" />}
      <WavePath form={current} colour="var(--series-2)" isSecond />
      <WavePath form={voltage} colour="var(--series-1)" />
      {voltage.isDense && (
        <text x={scale.startX + 8} y={bottom - 8}>
          {rippleCount(voltageV)} ripples; drawn as the curves that hold them
        </text>
      )}
      <GreatestRing at={atVoltage(greatestIndex(voltageV))} />
    </g>
  );
}

function Names({ props: { scale, currentName, greatestVoltage, greatestCurrent } }: { props: StandingWavePlotProps }) {
  const x = scale.endX + 8;
  return (
    <g>
      <SeriesName x={x} y={18} colour="var(--series-1)" name="Voltage" greatest={greatestVoltage} />
      <SeriesName x={x} y={54} colour="var(--series-2)" name={currentName} greatest={greatestCurrent} />
    </g>
  );
}

/** Voltage and current along the line, on the strip's own x-axis. */
export function StandingWavePlot(props: StandingWavePlotProps) {
  const { scale, width, height = 146, distancesM, voltageV, currentTimesReferenceV, format } = props;
  const { startX, endX } = scale;
  const bottom = height - 5;
  const y = axisScale("linear", roundedFromZero([...voltageV, ...currentTimesReferenceV]), [bottom, 8]);
  const span = { fromPx: startX, toPx: endX, toValue: scale.m, toPxOf: scale.x, width };
  const { cursor, handlers } = usePlotPointer("distance", span);
  const pointed = cursor === null ? -1 : nearestIndex(distancesM, cursor);
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
      <AxisY scale={y} ticks={y.ticks(5)} format={format} fromX={startX} toX={endX} />
      <Waves props={props} y={y} bottom={bottom} />
      <Names props={props} />
      {pointed >= 0 && cursor !== null && (
        <Readout x={scale.x(cursor)} fromY={0} toY={height} limits={[startX, endX]} words={props.readout(pointed)} />
      )}
    </svg>
  );
}
