"use client";

import { decadesAround } from "@/components/plot/axes";
import { ChartFrame } from "@/components/plot/chart-frame";
import { CurvePlot } from "@/components/plot/curve-plot";
import { ResidualStrip } from "@/components/plot/residual-strip";
import { fitWords } from "@/components/cables/attenuation";
import { useEntryForm } from "@/components/cables/editor/entry-form";
import { StateNote } from "@/components/ui/state-mark";
import { lossDbPer100m } from "@/lib/cables/model";
import { modelAt } from "@/lib/cables/warm-model";
import { digits, frequency, inWords, megahertz, significantDigits } from "@/lib/format/quantity";

const perDecade = 16;
const fine = 2;

/** Places evenly over a log axis. */
function placesOn(low: number, high: number): number[] {
  const count = Math.max(8, Math.ceil(perDecade * Math.log10(high / low)));
  return Array.from({ length: count + 1 }, (_, i) => low * (high / low) ** (i / count));
}

/** The rows, the model that follows from them, and what it leaves over of each. */
export function FitPlot() {
  const { edited, isBehind } = useEntryForm();
  const { worked, read, checks } = edited;
  const table = read.inputs.lossTable;
  const warm = worked.model && modelAt(worked.model, table?.temperatureC ?? 20);
  const rows = table?.rows ?? [];
  if (!warm) return <p className="self-center text-label text-ink-2">{worked.missing}</p>;
  const [low, high] = rows.length > 0 ? decadesAround(rows.map(({ frequencyHz }) => frequencyHz)) : [1e6, 1e9];
  const xs = placesOn(low, high);
  const values = xs.map((hertz) => lossDbPer100m(warm.model, hertz));
  const given = rows.map(({ lossDbPerM }) => lossDbPerM * 100);
  const residuals = rows.map(({ frequencyHz, lossDbPerM }) => ({
    x: frequencyHz,
    percent: 100 * (1 - lossDbPer100m(warm.model, frequencyHz) / (lossDbPerM * 100)),
  }));
  const range =
    rows.length > 1
      ? ([Math.min(...rows.map((r) => r.frequencyHz)), Math.max(...rows.map((r) => r.frequencyHz))] as const)
      : null;
  const fit = worked.fit?.table;
  const rms = worked.fit?.refit.rmsPercent;
  const odd = checks.find(({ check, verdict }) => check === "lossRow" && verdict !== "fine");
  const words = rows.length > 0 ? `${rows.length} rows` : "the model alone";
  return (
    <div className={`min-w-0 ${isBehind ? "opacity-60" : ""}`}>
      <ChartFrame
        title="Attenuation"
        note={<>dB per 100 m at {digits(warm.temperatureC, 0)} °C</>}
        summary={`Loss over frequency, ${words}, ${inWords(frequency(low))} to ${inWords(frequency(high))}`}
        figures={{
          head: ["MHz", "given", "model", "%"],
          rows: rows.map(({ frequencyHz }, i) => [
            ...[megahertz(frequencyHz), significantDigits(given[i], 4)],
            ...[significantDigits(lossDbPer100m(warm.model, frequencyHz), 4), digits(residuals[i]?.percent, 1)],
          ]),
        }}
      >
        <CurvePlot
          xs={xs}
          series={[{ id: "model", label: "model", look: 1, values, data: range }]}
          xDomain={[low, high]}
          yDomain={decadesAround([...values, ...given])}
          points={rows.map(({ frequencyHz }, i) => ({ x: frequencyHz, y: given[i] ?? NaN, shape: "ring" }))}
          formatX={megahertz}
          formatY={(value) => significantDigits(value, 1)}
          readY={(value) => significantDigits(value, 3)}
          readX={(value) => inWords(frequency(value))}
          labelRoom={58}
          firstWidth={360}
        />
        <ResidualStrip
          residuals={residuals}
          xDomain={[low, high]}
          formatX={megahertz}
          xUnit="MHz"
          words={["residual", ...(rms === undefined ? [] : [`rms ${digits(rms, 1)} %`])]}
          fine={fine}
          labelRoom={58}
          firstWidth={360}
        />
      </ChartFrame>
      {fit && (
        <p className="mt-1 text-label text-ink-2">
          Fitted by <span className="figures text-ink">{fitWords(fit)}</span> dB/100 m, f in MHz; beyond the rows the
          curve is dotted.
        </p>
      )}
      {odd && (
        <StateNote state={odd.verdict === "look" ? "warn" : "fail"} className="mt-1.5">
          {odd.sentence}
        </StateNote>
      )}
    </div>
  );
}
