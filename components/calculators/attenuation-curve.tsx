"use client";

import dynamic from "next/dynamic";
import { InputField } from "@/components/calculators/input-field";
import type { Calculator } from "@/components/calculators/use-calculator";
import { roundedFromZero } from "@/components/plot/axes";
import { ChartFrame } from "@/components/plot/chart-frame";
import { CursorProvider } from "@/components/plot/cursor";
import type { SweepSeries } from "@/components/plot/series";
import type { attenuationInputs, AttenuationResult, Curve } from "@/lib/calculators/attenuation";
import { decibels, digits, frequency, inWords, significantDigits, withoutTrailingZeros } from "@/lib/format/quantity";

const SweepPlot = dynamic(() => import("@/components/plot/sweep-plot").then((file) => file.SweepPlot), {
  ssr: false,
  loading: () => <div className="h-72.5" />,
});

interface Props {
  calculator: Calculator<typeof attenuationInputs>;
  result: AttenuationResult;
}

/** Every n-th of the curve's points, for a table. */
const everyRow = 8;

const short = (hertz: number) => inWords(frequency(Number(hertz.toPrecision(3)))).replace("\u00a0", " ");

/** Loss of the length over frequency, between two frequencies that are typed under it. */
export function AttenuationCurve({ calculator, result }: Props) {
  return (
    <CursorProvider>
      <div className="min-w-0">
        <Chart curve={result.curve} result={result} />
        <div className="mt-1 flex flex-wrap items-start gap-3">
          <InputField of={calculator} name="from" />
          <InputField of={calculator} name="to" />
        </div>
      </div>
    </CursorProvider>
  );
}

/** At the temperature and at 20 °C; dotted beyond what the entry covers. */
function seriesOf({ frequenciesHz: xs, lossDb, referenceDb }: Curve, limitHz: number, celsius: string | null) {
  const within = (values: number[]) => values.map((value, i) => ((xs[i] ?? 0) <= limitHz ? value : null));
  // One point is in both, so that the dotted part begins where the other ends.
  const beyond = lossDb.map((value, i) => ((xs[i + 1] ?? Infinity) > limitHz ? value : null));
  const series: SweepSeries[] = [{ id: "loss", label: `at ${celsius ?? "20 °C"}`, look: 1, values: within(lossDb) }];
  if (celsius !== null) series.push({ id: "reference", label: "at 20 °C", look: 5, values: within(referenceDb) });
  if ((xs.at(-1) ?? 0) > limitHz) series.push({ id: "beyond", label: "beyond the data", look: 3, values: beyond });
  return series;
}

function Chart({ curve, result: { spot, line, whole } }: { curve: Curve; result: AttenuationResult }) {
  const { frequenciesHz: xs, lossDb, referenceDb } = curve;
  const { temperatureC } = spot.temperature;
  const celsius = temperatureC === 20 ? null : `${significantDigits(temperatureC, 3)} °C`;
  const [first, last] = [xs[0] ?? 1, xs.at(-1) ?? 2];
  const rows = xs.map((x, i) => [
    short(x),
    digits(lossDb[i], 3),
    ...(celsius === null ? [] : [digits(referenceDb[i], 3)]),
  ]);
  return (
    <ChartFrame
      title="Loss of the length over frequency"
      note={`dB, of ${line.label}`}
      summary={`Loss rises from ${inWords(decibels(lossDb[0]))} at ${short(first)} to ${inWords(decibels(lossDb.at(-1)))} at ${short(last)}; at ${inWords(frequency(spot.frequency))} it is ${inWords(decibels(whole.lossDb))}`}
      figures={{
        head: ["Frequency", `dB at ${celsius ?? "20 °C"}`, ...(celsius === null ? [] : ["dB at 20 °C"])],
        rows: rows.filter((_, i) => i % everyRow === 0),
      }}
    >
      <SweepPlot
        kind="log"
        xs={xs}
        series={seriesOf(curve, line.entry?.limits.maxFrequencyHz ?? Infinity, celsius)}
        xDomain={[first, last]}
        yDomain={roundedFromZero([...lossDb, ...referenceDb])}
        xUnit=""
        formatX={short}
        formatY={(value) => withoutTrailingZeros(significantDigits(value, 3))}
        mark={spot.frequency}
      />
    </ChartFrame>
  );
}
