"use client";

import { decadesAround } from "@/components/plot/axes";
import { ChartFrame } from "@/components/plot/chart-frame";
import { CurvePlot } from "@/components/plot/curve-plot";
import { Figure } from "@/components/ui/figure";
import { tableRange, type LossTable } from "@/lib/cables/loss-rows";
import { digits, frequency, inWords, significantDigits } from "@/lib/format/quantity";
import type { LineModel } from "@/lib/line/element";
import { lineFigures, type LineFigures } from "@/lib/line/line-figures";
import { REFERENCE_TEMPERATURE_C } from "@/lib/line/temperature";

interface Props {
  /** at the temperature asked */
  model: LineModel;
  table: LossTable;
  temperatureC: number;
  lossAtHz: number;
}

type Swept = "rOhmPerM" | "lHPerM" | "cFPerM" | "gSPerM";

interface Small {
  letter: string;
  name: string;
  unit: string;
  of: Swept;
  /** the unit in SI */
  perSi: number;
  yKind: "log" | "linear";
}

const smalls: readonly Small[] = [
  { letter: "R", name: "series resistance", unit: "mΩ/m", of: "rOhmPerM", perSi: 1e3, yKind: "log" },
  { letter: "L", name: "series inductance", unit: "nH/m", of: "lHPerM", perSi: 1e9, yKind: "linear" },
  { letter: "C", name: "capacitance", unit: "pF/m", of: "cFPerM", perSi: 1e12, yKind: "linear" },
  { letter: "G", name: "leakage", unit: "µS/m", of: "gSPerM", perSi: 1e6, yKind: "log" },
];

const span = [1e3, 1e9] as const;
const perDecade = 16;
const frequencies = Array.from({ length: 6 * perDecade + 1 }, (_, i) => span[0] * 10 ** (i / perDecade));
const axisWords: Record<number, string> = { 1e3: "1k", 1e6: "1M", 1e9: "1G" };

/** Ends of a linear axis with some room, never narrower than a few per cent of what is shown. */
function linearEnds(values: readonly number[]): [number, number] {
  const [least, most] = [Math.min(...values), Math.max(...values)];
  const room = Math.max((most - least) * 0.25, most * 0.02);
  return [least - room, most + room];
}

function SmallPlot({ small, swept, spot, table, lossAtHz }: SmallPlotProps) {
  const { letter, unit, of, perSi, yKind, name } = small;
  const values = Array.from(swept[of], (value) => value * perSi);
  const yDomain = yKind === "log" ? decadesAround(values) : linearEnds(values);
  const decimals = Math.max(0, Math.ceil(-Math.log10((yDomain[1] - yDomain[0]) / 4)));
  const isNothing = values.every((value) => value === 0);
  return (
    <div className="min-w-0">
      <p className="flex items-baseline justify-between gap-2 text-label">
        <span>
          <b className="text-ink">{letter}</b>{" "}
          <span className="text-ink-2" title={name}>
            {unit}
          </span>
        </span>
        <span className="text-ink-2">
          <Figure digits={significantDigits((spot[of][0] ?? NaN) * perSi, 3)} className="text-ink" /> at{" "}
          {inWords(frequency(lossAtHz))}
        </span>
      </p>
      {isNothing ? (
        <p className="mt-2 text-note text-ink-3">The model has none.</p>
      ) : (
        <CurvePlot
          xs={frequencies}
          series={[{ id: letter, label: "", look: 1, values, data: tableRange(table) }]}
          xDomain={span}
          yDomain={yDomain}
          yKind={yKind}
          yTicks={yKind === "log" ? decades(yDomain) : undefined}
          xTicks={[1e3, 1e6, 1e9]}
          formatX={(f) => axisWords[f] ?? ""}
          formatY={(value) => (yKind === "log" ? significantDigits(value, 1) : digits(value, decimals))}
          readX={(f) => inWords(frequency(Number(f.toPrecision(3))))}
          readY={(value) => `${significantDigits(value, 3)} ${unit}`}
          mark={lossAtHz}
          xUnit=" "
          height={126}
          labelRoom={8}
          firstWidth={262}
        />
      )}
    </div>
  );
}

interface SmallPlotProps {
  small: Small;
  swept: LineFigures;
  spot: LineFigures;
  table: LossTable;
  lossAtHz: number;
}

/** Decades inside a logarithmic axis, three of them at most. */
function decades([low, high]: readonly [number, number]): number[] {
  const first = Math.ceil(Math.log10(low) - 1e-9);
  const last = Math.floor(Math.log10(high) + 1e-9);
  const step = Math.max(1, Math.ceil((last - first) / 3));
  return Array.from({ length: Math.max(0, Math.floor((last - first) / step) + 1) }, (_, i) => 10 ** (first + i * step));
}

/** The four figures of a metre over six decades. */
export function PerMetre({ model, table, temperatureC, lossAtHz }: Props) {
  // The model has been warmed already: at its own temperature nothing more happens to it.
  const swept = lineFigures(model, frequencies, REFERENCE_TEMPERATURE_C);
  const spot = lineFigures(model, [lossAtHz], REFERENCE_TEMPERATURE_C);
  const rows = frequencies
    .map((f, k) => [
      inWords(frequency(Number(f.toPrecision(3)))),
      ...smalls.map(({ of, perSi }) => significantDigits((swept[of][k] ?? NaN) * perSi, 4)),
    ])
    .filter((_, k) => k % 4 === 0);
  return (
    <ChartFrame
      title="Per-metre figures"
      note={`loop values at ${digits(temperatureC, 0)} °C; dotted beyond the data`}
      summary={`Resistance, inductance, capacitance and leakage of a metre from 1 kilohertz to 1 gigahertz at ${digits(temperatureC, 0)} °C`}
      figures={{ head: ["Frequency", ...smalls.map(({ letter, unit }) => `${letter}, ${unit}`)], rows }}
    >
      <div className="mt-1 grid grid-cols-2 gap-x-6 gap-y-2 phone:grid-cols-1">
        {smalls.map((small) => (
          <SmallPlot key={small.letter} {...{ small, swept, spot, table, lossAtHz }} />
        ))}
      </div>
    </ChartFrame>
  );
}
