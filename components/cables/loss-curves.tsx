"use client";

import { ChartFrame } from "@/components/plot/chart-frame";
import { CurvePlot } from "@/components/plot/curve-plot";
import { decadesAround } from "@/components/plot/axes";
import type { CurveSeries } from "@/components/plot/curve-paths";
import type { SeriesLook } from "@/components/plot/series";
import { lossTable, tableRange } from "@/lib/cables/loss-rows";
import { lossDbPer100m } from "@/lib/cables/model";
import type { Cable } from "@/lib/cables/schema";
import { digits, frequency, inWords, megahertz, significantDigits } from "@/lib/format/quantity";

interface Props {
  cables: readonly { cable: Cable; look: SeriesLook }[];
  lossAtHz: number;
  height: number;
  level?: 2 | 3;
}

const span = [1e6, 1e9] as const;
const perDecade = 16;
const frequencies = Array.from(
  { length: perDecade * Math.log10(span[1] / span[0]) + 1 },
  (_, i) => span[0] * 10 ** (i / perDecade),
);

const longest = 12;
const shortened = (name: string) => (name.length > longest ? `${name.slice(0, longest - 1)}…` : name);

/** Loss of several cables over three decades, with the figures behind it; beyond a cable's own table it is dotted. */
export function LossCurves({ cables, lossAtHz, height, level = 3 }: Props) {
  const series = cables.map(({ cable, look }): CurveSeries => ({
    id: cable.id,
    label: shortened(cable.designation),
    look,
    values: frequencies.map((f) => lossDbPer100m(cable.model, f)),
    data: tableRange(lossTable(cable.figures)),
  }));
  const yDomain = decadesAround(series.flatMap(({ values }) => values));
  const at = inWords(frequency(lossAtHz));
  const summary = `Loss in dB per 100 m from 1 MHz to 1 GHz; at ${at} ${cables
    .map(({ cable }) => `${cable.designation} ${digits(lossDbPer100m(cable.model, lossAtHz), 2)}`)
    .join(", ")}`;
  return (
    <ChartFrame
      level={level}
      title="dB/100 m"
      note="20 °C"
      summary={summary}
      figures={{
        head: ["MHz", ...cables.map(({ cable }) => cable.designation)],
        rows: frequencies
          .map((f, i) => [
            significantDigits(f / 1e6, 3),
            ...series.map(({ values }) => significantDigits(values[i], 3)),
          ])
          .filter((_, i) => i % 4 === 0),
      }}
    >
      <CurvePlot
        xs={frequencies}
        series={series}
        xDomain={span}
        yDomain={yDomain}
        formatX={megahertz}
        readX={(f) => inWords(frequency(Number(f.toPrecision(3))))}
        formatY={(value) => significantDigits(value, 1)}
        readY={(value) => significantDigits(value, 3)}
        mark={lossAtHz}
        xUnit="MHz"
        height={height}
        firstWidth={380}
        labelRoom={84}
      />
    </ChartFrame>
  );
}
