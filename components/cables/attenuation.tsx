"use client";

import { decadesAround } from "@/components/plot/axes";
import { ChartFrame } from "@/components/plot/chart-frame";
import type { CurveSeries } from "@/components/plot/curve-paths";
import { CurvePlot } from "@/components/plot/curve-plot";
import { ResidualStrip } from "@/components/plot/residual-strip";
import { withinWords } from "@/lib/cables/checking/check";
import { tableFit, tableRange, type LossTable } from "@/lib/cables/loss-rows";
import { lossDbPer100m } from "@/lib/cables/model";
import type { Cable } from "@/lib/cables/schema";
import { modelAt } from "@/lib/cables/warm-model";
import { digits, frequency, inWords, megahertz, significantDigits } from "@/lib/format/quantity";
import type { LineModel } from "@/lib/line/element";
import type { LossFit } from "@/lib/line/loss-table";

interface Props {
  cable: Cable;
  table: LossTable;
  /** at the temperature asked */
  model: LineModel;
  temperatureC: number;
  lossAtHz: number;
}

const perDecade = 24;
const fine = 2;
const tableTemperatureC = 20;

/** Whole decades that hold the table, the highest rated frequency and the one asked. */
function domainOf({ cable, table, lossAtHz }: Pick<Props, "cable" | "table" | "lossAtHz">): [number, number] {
  const places = [
    lossAtHz,
    ...(tableRange(table) ?? [1e6, 1e9]),
    ...table.points.map(({ frequencyHz }) => frequencyHz),
    ...(cable.limits.maxFrequencyHz === undefined ? [] : [cable.limits.maxFrequencyHz]),
  ];
  const low = 10 ** Math.floor(Math.log10(Math.min(...places)) + 1e-9);
  const high = 10 ** Math.ceil(Math.log10(Math.max(...places)) - 1e-9);
  return [low, Math.max(high, low * 10)];
}

/** Places from one end of an axis to the other, the ends of the data and the frequency asked among them. */
function placesOn([low, high]: [number, number], among: readonly number[]): number[] {
  const count = Math.ceil(perDecade * Math.log10(high / low));
  const even = Array.from({ length: count + 1 }, (_, i) => low * (high / low) ** (i / count));
  return [...new Set([...even, ...among.filter((place) => place > low && place < high)])].sort((a, b) => a - b);
}

/** The fit in words: "0.395 √f + 0.0017 f". */
export function fitWords({ k1, k2 }: LossFit): string {
  // per 100 m, with f in MHz
  const parts = [
    ...(k1 > 0 ? [`${significantDigits(k1 * 1e3 * 100, 4)} √f`] : []),
    ...(k2 > 0 ? [`${significantDigits(k2 * 1e6 * 100, 3)} f`] : []),
  ];
  return parts.join(" + ");
}

interface SentenceProps {
  table: LossTable;
  fit: LossFit | undefined;
  modelRms: number | null;
  isLossless: boolean;
}

function Sentence({ table, fit, modelRms, isLossless }: SentenceProps) {
  const range = tableRange(table);
  if (isLossless) return <>The model has no loss at any frequency.</>;
  if (table.points.length === 0)
    return <>No loss table is stored with this entry: the curve is the model’s alone, dotted throughout.</>;
  if (!range || !fit)
    return (
      <>
        The table cannot be fitted: it has{" "}
        {table.points.length === 1 ? "one row" : "rows of one frequency or of several temperatures"}.
      </>
    );
  const from = `${inWords(frequency(range[0]))} to ${inWords(frequency(range[1]))}`;
  return (
    <>
      Table of {table.points.length} rows, {from}, fitted by <span className="figures text-ink">{fitWords(fit)}</span>{" "}
      dB/100 m, f in MHz. The curve is the model that runs are worked out with
      {modelRms !== null && <>; it is within {withinWords(modelRms / 100)} rms of the table</>}.
    </>
  );
}

/** What the model leaves over of each row, at the row's own temperature. */
function modelResiduals(cable: Cable, { points }: LossTable) {
  return points.flatMap(({ frequencyHz, lossDbPer100m: given, temperatureC }) => {
    const warm = modelAt(cable.model, temperatureC);
    if (!warm) return [];
    return [{ x: frequencyHz, percent: 100 * (1 - lossDbPer100m(warm.model, frequencyHz) / given) }];
  });
}

const rms = (residuals: readonly { percent: number }[]) =>
  residuals.length === 0
    ? null
    : Math.sqrt(residuals.reduce((sum, { percent }) => sum + percent * percent, 0) / residuals.length);

function seriesOf({ cable, table, model, temperatureC }: Props, xs: readonly number[]): CurveSeries[] {
  const data = tableRange(table);
  const loss = (of: LineModel) => xs.map((f) => lossDbPer100m(of, f));
  const warm = { id: "model", label: `${digits(temperatureC, 0)} °C`, look: 1 as const, values: loss(model), data };
  if (temperatureC === tableTemperatureC) return [{ ...warm, label: "the model" }];
  return [warm, { id: "usual", label: "20 °C", look: 5, values: loss(cable.model), data }];
}

/** Loss over frequency: the rows of the table, the model through them, and what is left over. */
export function Attenuation(props: Props) {
  const { cable, table, temperatureC, lossAtHz, model } = props;
  const xDomain = domainOf(props);
  const range = tableRange(table);
  const xs = placesOn(xDomain, [lossAtHz, ...(range ?? [])]);
  const series = seriesOf(props, xs);
  const fit = tableFit(table);
  const left = modelResiduals(cable, table);
  const rated = cable.limits.maxFrequencyHz;
  const given = [...table.points, ...table.limits].map(({ lossDbPer100m: loss }) => loss);
  const beyond = range && range[1] < xDomain[1] ? Math.sqrt(range[1] * xDomain[1]) : null;
  const at = inWords(frequency(lossAtHz));
  const isLossless = series.every(({ values }) => values.every((value) => value === 0)) && given.length === 0;
  return (
    <ChartFrame
      title="Attenuation"
      note={`dB per 100 m at ${digits(temperatureC, 0)} °C`}
      summary={`Loss at ${digits(temperatureC, 0)} °C: ${digits(lossDbPer100m(model, lossAtHz), 2)} decibels per 100 metres at ${at}; ${table.points.length} rows of a loss table`}
      figures={{
        head: ["MHz", "table", "at most", "fitted", `model, ${digits(temperatureC, 0)} °C`],
        rows: table.points.map(({ frequencyHz, lossDbPer100m: loss }, i) => [
          megahertz(frequencyHz),
          significantDigits(loss, 4),
          significantDigits(table.limits.find((limit) => limit.frequencyHz === frequencyHz)?.lossDbPer100m, 4),
          significantDigits(fit ? (fit.rows[i]?.fittedDbPerM ?? NaN) * 100 : null, 4),
          significantDigits(lossDbPer100m(model, frequencyHz), 4),
        ]),
      }}
    >
      {!isLossless && (
        <CurvePlot
          xs={xs}
          series={series}
          xDomain={xDomain}
          yDomain={decadesAround([...series.flatMap(({ values }) => values), ...given])}
          formatX={megahertz}
          formatY={(value) => significantDigits(value, 1)}
          readX={(f) => inWords(frequency(Number(f.toPrecision(3))))}
          readY={(value) => significantDigits(value, 3)}
          points={[
            ...table.limits.map((row) => ({ x: row.frequencyHz, y: row.lossDbPer100m, shape: "bar" as const })),
            ...table.points.map((row) => ({ x: row.frequencyHz, y: row.lossDbPer100m, shape: "ring" as const })),
          ]}
          mark={lossAtHz}
          limit={rated === undefined ? undefined : { x: rated, label: `rated to ${inWords(frequency(rated))}` }}
          note={beyond === null ? undefined : { x: beyond, label: "beyond the data" }}
          xUnit={fit ? undefined : "MHz"}
          height={fit ? 236 : 262}
          labelRoom={84}
        />
      )}
      {fit && (
        <ResidualStrip
          residuals={fit.rows.map(({ frequency: x, errorPercent }) => ({ x, percent: errorPercent }))}
          others={left}
          xDomain={xDomain}
          formatX={megahertz}
          xUnit="MHz"
          words={["residual, %", `fit ${digits(fit.rmsPercent, 1)} rms ●`, `model ${digits(rms(left), 1)} ○`]}
          fine={fine}
          labelRoom={84}
        />
      )}
      <p className="mt-1 text-label text-ink-2">
        <Sentence table={table} fit={fit} modelRms={rms(left)} isLossless={isLossless} />
      </p>
    </ChartFrame>
  );
}
