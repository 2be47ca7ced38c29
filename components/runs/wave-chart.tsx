"use client";

import type { LineScale } from "@/components/line/line-scale";
import { Ruler } from "@/components/line/ruler";
import { ChartFrame } from "@/components/plot/chart-frame";
import { StandingWavePlot } from "@/components/plot/standing-wave-plot";
import { SpotConditions } from "@/components/runs/conditions";
import { useRunEditor } from "@/components/runs/run-editor";
import { decimalsFor, digits, inWords, metres, scaled, significantDigits } from "@/lib/format/quantity";
import type { StandingWave } from "@/lib/line/standing-wave";
import { plotted, thinned } from "@/lib/runs/curves";

interface Props {
  wave: StandingWave | null;
  scale: LineScale;
  width: number;
}

/** The real reference that makes a current comparable with a voltage: the source's resistance. */
function referenceOf(re: number | null): number {
  return re !== null && re > 0 ? re : 50;
}

/** Volts of an axis: whole from 10 up. */
export const voltTick = (value: number) =>
  digits(value, value !== 0 && Math.abs(value) < 10 ? decimalsFor(value, 2) : 0);

/** Voltage and current along the line, under the strip, on its own axis. */
export function WaveChart({ wave, scale, width }: Props) {
  const { draft } = useRunEditor();
  const { availablePowerW, sourceName, circuit } = draft;
  if (!wave || availablePowerW === null)
    return (
      <div className="flex flex-wrap items-center gap-x-2 gap-y-1 text-label text-ink-2">
        <h3 className="text-ink">Standing wave</h3> at <SpotConditions isInline /> Give the available power of a source
        with resistance, and the volts along the line stand here.
      </div>
    );
  const reference = referenceOf(circuit.source.kind === "constant" ? circuit.source.reOhm : null);
  const voltage = plotted(wave.voltageV);
  const current = plotted(wave.currentA);
  const distances = Array.from(wave.positionM);
  const greatestVoltage = inWords(scaled("voltage", wave.maxVoltageV, 3));
  const greatestCurrent = inWords(scaled("current", wave.maxCurrentA, 3));
  const rows = distances.map((m, i) => [
    digits(m, 3),
    significantDigits(voltage[i], 4),
    significantDigits(current[i], 4),
  ]);
  return (
    <ChartFrame
      title="Standing wave"
      note={
        <span className="inline-flex flex-wrap items-center gap-x-2 gap-y-1">
          at <SpotConditions isInline /> rms volts against distance from {sourceName}
        </span>
      }
      summary={`Voltage along the line is greatest, ${greatestVoltage} rms, ${inWords(metres(wave.maxVoltageAtM))} from ${sourceName}; current is greatest, ${greatestCurrent}, at ${inWords(metres(wave.maxCurrentAtM))}`}
      figures={{ head: ["m", "V rms", "A rms"], rows: thinned(rows, 200) }}
    >
      <StandingWavePlot
        scale={scale}
        width={width}
        distancesM={distances}
        voltageV={voltage}
        currentTimesReferenceV={current.map((value) => (value === null ? null : value * reference))}
        currentName={`Current × ${significantDigits(reference, 2)} Ω`}
        greatestVoltage={greatestVoltage.replace("\u00a0", " ")}
        greatestCurrent={greatestCurrent.replace("\u00a0", " ")}
        readout={(i) => [
          inWords(metres(distances[i])),
          inWords(scaled("voltage", voltage[i], 3)),
          inWords(scaled("current", current[i], 3)),
        ]}
        format={voltTick}
      />
      <svg width="100%" height="18" viewBox={`0 0 ${width} 18`} aria-hidden="true" className="block overflow-visible">
        <Ruler scale={scale} y={1} />
      </svg>
    </ChartFrame>
  );
}
